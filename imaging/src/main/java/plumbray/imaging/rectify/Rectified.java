package plumbray.imaging.rectify;

import plumbray.imaging.photo.Photo;

/**
 * A redrawn photo.
 *
 * @param picture the picture, of the photo's shape
 * @param mask what each of its pixels rests on
 */
public record Rectified(Photo picture, MaskPlane mask) {}
