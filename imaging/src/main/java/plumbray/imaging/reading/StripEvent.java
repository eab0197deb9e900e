package plumbray.imaging.reading;

import java.util.Optional;
import plumbray.raymodel.mapping.Branch;

/**
 * A place along a strip, going down, where what is seen changes.
 *
 * @param row row, px, at the strip's column
 * @param edge index of the staff's edge; {@link #LOWER_END} or {@link #UPPER_END} where an image
 *     ends in the ground, {@link #APART} shortly before
 * @param branch image in which the edge is seen; empty for the end of an image
 * @param image number of the image, counted downwards from the top of the fan
 * @param apparentRad apparent elevation, rad
 * @param above what is seen above: see {@link StaffBars}
 * @param below what is seen below
 */
record StripEvent(
    double row,
    int edge,
    Optional<Branch> branch,
    int image,
    double apparentRad,
    int above,
    int below) {

  /** The lower end of an image: the ground in front of it begins. */
  static final int LOWER_END = -1;

  /** The upper end of an image. */
  static final int UPPER_END = -2;

  /** A place above the ground's edge from which on what is no bar counts by itself. */
  static final int APART = -3;
}
