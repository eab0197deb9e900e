/** Heights and elevations from image points, with their standard deviations. */
package plumbray.imaging.measure;
