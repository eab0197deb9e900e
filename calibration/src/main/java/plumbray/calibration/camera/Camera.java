package plumbray.calibration.camera;

/**
 * A camera with square pixels, radial distortion, pitch and roll.
 *
 * <p>The geometry and its signs are described at {@link Projection}. For loops over pixels take
 * {@link #projection()} once.
 *
 * @param widthPx columns of the picture, at least 1
 * @param heightPx rows of the picture, at least 1
 * @param focalPx focal length in pixels, above 0
 * @param principalU column of the principal point, px
 * @param principalV row of the principal point, px
 * @param k1 radial distortion of the third order, dimensionless, radius in focal lengths
 * @param k2 radial distortion of the fifth order, dimensionless, radius in focal lengths
 * @param pitchRad elevation of the optical axis, above -pi/2 and below pi/2
 * @param rollRad turn of the camera about its axis, above -pi/2 and below pi/2; positive makes the
 *     right-hand side of the picture look lower
 */
public record Camera(
    int widthPx,
    int heightPx,
    double focalPx,
    double principalU,
    double principalV,
    double k1,
    double k2,
    double pitchRad,
    double rollRad) {

  /** Checks the ranges, and that the distortion can be undone all over the picture. */
  public Camera {
    require(widthPx >= 1, "widthPx", widthPx + " px", "at least 1 px (columns of the picture)");
    require(heightPx >= 1, "heightPx", heightPx + " px", "at least 1 px (rows of the picture)");
    require(
        focalPx > 0 && Double.isFinite(focalPx),
        "focalPx",
        focalPx + " px",
        "above 0 px (focal length in pixels)");
    requireFinite("principalU", principalU, "px");
    requireFinite("principalV", principalV, "px");
    requireFinite("k1", k1, "(dimensionless)");
    requireFinite("k2", k2, "(dimensionless)");
    requireTilt("pitchRad", pitchRad, "elevation of the axis");
    requireTilt("rollRad", rollRad, "turn about the axis");
    double farthest =
        Math.hypot(
                Math.max(principalU, widthPx - 1 - principalU),
                Math.max(principalV, heightPx - 1 - principalV))
            / focalPx;
    double reach = new RadialDistortion(k1, k2).foldDistortedRadius();
    require(
        farthest < reach,
        "radial distortion (k1, k2)",
        "(%s, %s)".formatted(k1, k2),
        "such that the picture reaches less than %s focal lengths from the principal point, it reaches %s (beyond that the lens model folds over)"
            .formatted(reach, farthest));
  }

  private static void require(boolean holds, String name, String found, String limit) {
    if (!holds) {
      throw new IllegalArgumentException(
          "%s is %s, must be %s; correct the camera".formatted(name, found, limit));
    }
  }

  private static void requireFinite(String name, double value, String unit) {
    require(Double.isFinite(value), name, value + " " + unit, "finite (part of the camera)");
  }

  private static void requireTilt(String name, double value, String what) {
    require(
        Math.abs(value) < Math.PI / 2,
        name,
        value + " rad",
        "above -pi/2 and below pi/2 rad (%s)".formatted(what));
  }

  /**
   * The working form for loops over pixels.
   *
   * @return the projection of this camera
   */
  public Projection projection() {
    return new Projection(this);
  }

  /**
   * The direction in which a pixel looks.
   *
   * @param u column, px
   * @param v row, px
   * @return the direction
   * @throws IllegalArgumentException when the pixel is so far outside the picture that the
   *     distortion cannot be undone
   */
  public Direction direction(double u, double v) {
    double[] out = new double[2];
    direction(u, v, out);
    if (Double.isNaN(out[0])) {
      throw new IllegalArgumentException(
          "pixel is (%s, %s) px, must be where the distortion can be undone (a pixel that looks somewhere); stay near the picture"
              .formatted(u, v));
    }
    return new Direction(out[0], out[1]);
  }

  /**
   * The direction in which a pixel looks, see {@link Projection#direction}.
   *
   * @param u column, px
   * @param v row, px
   * @param out2 receives elevation and azimuth, rad, or NaN
   */
  public void direction(double u, double v, double[] out2) {
    projection().direction(u, v, out2);
  }

  /**
   * The pixel in which a direction is seen.
   *
   * @param direction where to look
   * @return the pixel, perhaps outside the picture
   * @throws IllegalArgumentException when the direction is not in front of the camera
   */
  public PixelPoint pixel(Direction direction) {
    return pixel(direction.elevationRad(), direction.azimuthRad());
  }

  /**
   * The pixel in which a direction is seen.
   *
   * @param elevationRad angle above the horizontal, rad
   * @param azimuthRad angle to the right of the axis, rad
   * @return the pixel, perhaps outside the picture
   * @throws IllegalArgumentException when the direction is not in front of the camera
   */
  public PixelPoint pixel(double elevationRad, double azimuthRad) {
    double[] out = new double[2];
    pixel(elevationRad, azimuthRad, out);
    if (Double.isNaN(out[0])) {
      throw new IllegalArgumentException(
          "direction is (%s, %s) rad, must be in front of the camera (where the lens model holds); choose a direction nearer to the axis"
              .formatted(elevationRad, azimuthRad));
    }
    return new PixelPoint(out[0], out[1]);
  }

  /**
   * The pixel in which a direction is seen, see {@link Projection#pixel}.
   *
   * @param elevationRad angle above the horizontal, rad
   * @param azimuthRad angle to the right of the axis, rad
   * @param out2 receives u and v, px, or NaN
   */
  public void pixel(double elevationRad, double azimuthRad, double[] out2) {
    projection().pixel(elevationRad, azimuthRad, out2);
  }

  /**
   * The row of a direction with its derivatives, see {@link Projection#rowSensitivity}.
   *
   * @param elevationRad angle above the horizontal, rad
   * @param azimuthRad angle to the right of the axis, rad
   * @return row and derivatives
   */
  public RowSensitivity rowSensitivity(double elevationRad, double azimuthRad) {
    return projection().rowSensitivity(elevationRad, azimuthRad);
  }

  /**
   * The row at the principal column in which an elevation is seen, see {@link Projection#rowAt}.
   *
   * @param elevationRad angle above the horizontal, rad
   * @return row, px, or NaN
   */
  public double rowAt(double elevationRad) {
    return projection().rowAt(elevationRad);
  }

  /**
   * The angle that one pixel spans at the principal point.
   *
   * @return angle, rad per px
   */
  public double radPerPx() {
    return 1 / focalPx;
  }
}
