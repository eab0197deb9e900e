/**
 * Draws the photo that a sight would give of a described scene: every pixel's ray is followed
 * through the air to what it meets first.
 *
 * <p>Lateral positions are to the right of the sight line, heights above the local ground,
 * elevations above the level surface through the camera's foot. A thing at distance D fills the
 * upright surface across the sight line there: a direction of azimuth a meets it after D / cos a,
 * at the lateral position D tan a. The origin of pixels is the centre of the top-left one.
 */
package plumbray.imaging.scene;
