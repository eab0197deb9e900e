package plumbray.imaging.measure;

import java.util.Optional;
import plumbray.raymodel.mapping.Sense;

/**
 * What an image point shows. Numbers are NaN where there is none.
 *
 * @param sense which way up the image is at the point; empty where it shows no height
 * @param heightM height above the local ground, m
 * @param elevationM elevation above the level surface through the camera's foot, m
 * @param sigmaM standard deviation of both, m
 * @param uncorrectedElevationM elevation that a ray of the redrawn picture's curvature would give,
 *     m
 * @param correctionM elevation less uncorrected elevation, m
 * @param rectifiedU column in the redrawn picture, px
 * @param rectifiedV row in the redrawn picture, px
 * @param flag whether there is anything to mind
 */
public record HeightReading(
    Optional<Sense> sense,
    double heightM,
    double elevationM,
    double sigmaM,
    double uncorrectedElevationM,
    double correctionM,
    double rectifiedU,
    double rectifiedV,
    Flag flag) {

  /** What to mind about a reading. */
  public enum Flag {
    /** Nothing. */
    OK("ok"),
    /** The point lies in the inverted image. */
    INVERTED("inverted"),
    /** The point is so near the vanishing line that its height is hardly determined by its row. */
    NEAR_VANISHING_LINE("near-vanishing-line"),
    /** The point shows the ground this side of the distance. */
    GROUND("ground"),
    /** The point is outside the picture. */
    OUTSIDE("outside");

    private final String key;

    Flag(String key) {
      this.key = key;
    }

    /** The word used in result files. */
    public String key() {
      return key;
    }
  }

  static HeightReading none(Flag flag) {
    double nan = Double.NaN;
    return new HeightReading(Optional.empty(), nan, nan, nan, nan, nan, nan, nan, flag);
  }
}
