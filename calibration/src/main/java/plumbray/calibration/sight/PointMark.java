package plumbray.calibration.sight;

import java.util.Objects;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.sight.Checks.Named;

/**
 * A mark of known height and where it is seen.
 *
 * @param heightM height above the reference's foot, m
 * @param pixel where the mark is seen
 * @param sigmaPx standard deviation of the pointing in each coordinate, px, above 0
 * @param sense which image of the mark was pointed at
 */
public record PointMark(double heightM, PixelPoint pixel, double sigmaPx, SenseWanted sense) {

  /** Checks the height and the pointing's standard deviation. */
  public PointMark {
    Objects.requireNonNull(pixel, "pixel");
    Objects.requireNonNull(sense, "sense");
    Checks.finite(heightM, new Named("heightM", "m", "height of the mark above the foot"));
    Checks.above(sigmaPx, 0, new Named("sigmaPx", "px", "standard deviation of the pointing"));
  }
}
