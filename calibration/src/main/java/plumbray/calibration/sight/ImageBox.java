package plumbray.calibration.sight;

import plumbray.calibration.sight.Checks.Named;

/**
 * An upright rectangle of the picture; the centre of the top-left pixel is (0, 0).
 *
 * @param u0 left edge, px
 * @param v0 upper edge, px
 * @param u1 right edge, px, above u0
 * @param v1 lower edge, px, above v0
 */
public record ImageBox(double u0, double v0, double u1, double v1) {

  /** Checks that the box is one. */
  public ImageBox {
    Checks.finite(u0, new Named("u0", "px", "left edge of the box"));
    Checks.finite(v0, new Named("v0", "px", "upper edge of the box"));
    Checks.above(u1, u0, new Named("u1", "px", "right edge of the box"));
    Checks.above(v1, v0, new Named("v1", "px", "lower edge of the box"));
  }
}
