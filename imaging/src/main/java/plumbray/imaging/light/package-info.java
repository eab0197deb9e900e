/**
 * From encoded samples to light: tone curves, of sRGB and of ICC profiles, and luminance.
 *
 * <p>Light is relative to white, 0 to 1; encoded values too.
 */
package plumbray.imaging.light;
