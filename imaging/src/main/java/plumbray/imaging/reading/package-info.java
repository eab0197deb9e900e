/**
 * Reading references: what a staff or a set of points looks like through a given sight, and how far
 * that is from what the photo shows. Rows run downwards, in pixels; a strip is the brightness along
 * a staff at one column, linear light from 0 to 1.
 */
package plumbray.imaging.reading;
