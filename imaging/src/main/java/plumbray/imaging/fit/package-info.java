/**
 * Fitting a sight to what a photo or a list of points shows: starts, adjustment, choice of the
 * profile family, verdict. Also the optics of a sight whose quantities are all known. SI and
 * radians; rows in pixels, downwards.
 */
package plumbray.imaging.fit;
