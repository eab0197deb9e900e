package plumbray.calibration.camera;

/**
 * The working form of a {@link Camera}: sines, cosines and the reach of the distortion computed
 * once, for use in loops over pixels.
 *
 * <p>A pixel looks along {@code (x, y, 1)} of the camera frame with {@code x_d = (u - cu) / f},
 * {@code y_d = (v - cv) / f} and the radial distortion undone. With roll rho and pitch tau,
 *
 * <pre>
 * x' = x cos rho - y sin rho        up      = sin tau - y' cos tau
 * y' = x sin rho + y cos rho        forward = cos tau + y' sin tau,  right = x'
 * elevation = atan2(up, hypot(forward, right)),  azimuth = atan2(right, forward)
 * </pre>
 *
 * <p>The way back is the transposed rotation, divided by the depth along the axis.
 */
public final class Projection {
  private final double focalPx;
  private final double principalU;
  private final double principalV;
  private final RadialDistortion distortion;
  private final double sinPitch;
  private final double cosPitch;
  private final double sinRoll;
  private final double cosRoll;

  Projection(Camera camera) {
    focalPx = camera.focalPx();
    principalU = camera.principalU();
    principalV = camera.principalV();
    distortion = new RadialDistortion(camera.k1(), camera.k2());
    sinPitch = Math.sin(camera.pitchRad());
    cosPitch = Math.cos(camera.pitchRad());
    sinRoll = Math.sin(camera.rollRad());
    cosRoll = Math.cos(camera.rollRad());
  }

  /**
   * The direction in which a pixel looks.
   *
   * @param u column, px
   * @param v row, px
   * @param out2 receives elevation and azimuth, rad; both NaN where the distortion cannot be undone
   */
  public void direction(double u, double v, double[] out2) {
    double xd = (u - principalU) / focalPx;
    double yd = (v - principalV) / focalPx;
    double undo = distortion.undoFactor(Math.sqrt(xd * xd + yd * yd));
    double x = xd * undo;
    double y = yd * undo;
    double right = x * cosRoll - y * sinRoll;
    double down = x * sinRoll + y * cosRoll;
    double up = sinPitch - down * cosPitch;
    double forward = cosPitch + down * sinPitch;
    out2[0] = Math.atan2(up, Math.sqrt(forward * forward + right * right));
    out2[1] = Math.atan2(right, forward);
  }

  /**
   * The pixel in which a direction is seen; it may lie outside the picture.
   *
   * @param elevationRad angle above the horizontal, rad
   * @param azimuthRad angle to the right of the axis, rad
   * @param out2 receives u and v, px; both NaN for a direction behind the camera or so far off the
   *     axis that the distortion folds over
   */
  public void pixel(double elevationRad, double azimuthRad, double[] out2) {
    double level = Math.cos(elevationRad) * Math.cos(azimuthRad);
    double up = Math.sin(elevationRad);
    double depth = level * cosPitch + up * sinPitch;
    double right = Math.cos(elevationRad) * Math.sin(azimuthRad) / depth;
    double down = (level * sinPitch - up * cosPitch) / depth;
    double x = right * cosRoll + down * sinRoll;
    double y = down * cosRoll - right * sinRoll;
    double factor = depth > 0 ? imagedFactor(x * x + y * y) : Double.NaN;
    out2[0] = principalU + focalPx * x * factor;
    out2[1] = principalV + focalPx * y * factor;
  }

  /**
   * The row in which a direction is seen, with its derivatives.
   *
   * @param elevationRad angle above the horizontal, rad
   * @param azimuthRad angle to the right of the axis, rad
   * @return row and derivatives, all NaN where {@link #pixel} answers NaN
   */
  public RowSensitivity rowSensitivity(double elevationRad, double azimuthRad) {
    double sinA = Math.sin(elevationRad);
    double cosA = Math.cos(elevationRad);
    double cosAz = Math.cos(azimuthRad);
    double sinAz = Math.sin(azimuthRad);
    double depth = cosA * cosAz * cosPitch + sinA * sinPitch;
    if (!(depth > 0)) {
      return new RowSensitivity(Double.NaN, Double.NaN, Double.NaN, Double.NaN, Double.NaN);
    }
    double right = cosA * sinAz / depth;
    double down = (cosA * cosAz * sinPitch - sinA * cosPitch) / depth;
    double depthSlope = (cosA * sinPitch - sinA * cosAz * cosPitch) / depth;
    double rightSlope = -sinA * sinAz / depth - right * depthSlope;
    double downSlope = (-sinA * cosAz * sinPitch - cosA * cosPitch) / depth - down * depthSlope;
    double x = right * cosRoll + down * sinRoll;
    double y = down * cosRoll - right * sinRoll;
    double factor = imagedFactor(x * x + y * y);
    return new RowSensitivity(
        principalV + focalPx * y * factor,
        rowChange(x, y, rightSlope, downSlope),
        rowChange(x, y, right * down, 1 + down * down),
        -focalPx * x * factor,
        y * factor);
  }

  /** Change of the row, px, when right and down of the unrolled frame change as given. */
  private double rowChange(double x, double y, double rightChange, double downChange) {
    double xChange = rightChange * cosRoll + downChange * sinRoll;
    double yChange = downChange * cosRoll - rightChange * sinRoll;
    double s = x * x + y * y;
    double squareChange = 2 * (x * xChange + y * yChange);
    return focalPx * (imagedFactor(s) * yChange + y * distortion.factorSlope(s) * squareChange);
  }

  private double imagedFactor(double s) {
    double fold = distortion.foldRadius();
    return s < fold * fold ? distortion.factor(s) : Double.NaN;
  }

  /**
   * The row at the principal column in which an elevation is seen.
   *
   * <p>Along that column, {@code y = tan phi} with {@code sin elevation = sin tau cos phi - cos rho
   * cos tau sin phi}, solved in closed form. A steep or strongly rolled camera may show an
   * elevation twice in that column; the row at which the elevation falls downwards is answered.
   *
   * @param elevationRad angle above the horizontal, rad
   * @return row, px; NaN when the column never shows that elevation
   */
  public double rowAt(double elevationRad) {
    double cosine = cosRoll * cosPitch;
    double reach = Math.hypot(cosine, sinPitch);
    double phi = Math.atan2(sinPitch, cosine) - Math.asin(Math.sin(elevationRad) / reach);
    if (!(Math.abs(phi) < Math.PI / 2)) {
      return Double.NaN;
    }
    double y = Math.tan(phi);
    return principalV + focalPx * y * imagedFactor(y * y);
  }
}
