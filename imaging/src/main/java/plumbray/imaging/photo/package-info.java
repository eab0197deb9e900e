/**
 * Photos: files in and out, samples, the little metadata that is kept, and linear-light luminance.
 *
 * <p>Pixel (0, 0) is the top-left pixel, x runs to the right and y down, as the picture is meant to
 * be looked at: a stored orientation is undone on reading. Samples are unsigned 8 or 16 bit
 * integers, interleaved as grey, grey + alpha, red green blue, or red green blue + alpha; alpha is
 * never premultiplied. Values are taken from and given to rasters untouched, so that no colour
 * conversion of a graphics library stands between a file and its samples.
 */
package plumbray.imaging.photo;
