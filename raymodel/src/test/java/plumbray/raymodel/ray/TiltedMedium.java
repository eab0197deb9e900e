package plumbray.raymodel.ray;

/**
 * Over a flat level surface n^2 = n0^2 + 2 (p x + q z): its gradient is the same everywhere, so
 * that with d(sigma) = ds/n every ray is the parabola x = n1 sigma cos a + p sigma^2/2, z = h + n1
 * sigma sin a + q sigma^2/2, n1 the index at the camera. Textbook case of the ray equation Q'' =
 * grad(n^2)/2 (as a thrown body's), derived here. Parameters: p and q, 1/m.
 */
record TiltedMedium(double squareAtOrigin, double p, double q) implements VaryingMedium {

  /** Elevation after {@code x}, m. */
  double elevationM(double h, double a, double x) {
    double n1 = Math.sqrt(squareAtOrigin + 2.0 * q * h);
    double c = n1 * Math.cos(a);
    double sigma = 2.0 * x / (c + Math.sqrt(c * c + 2.0 * p * x));
    return h + n1 * Math.sin(a) * sigma + 0.5 * q * sigma * sigma;
  }

  @Override
  public int parameterCount() {
    return 2;
  }

  @Override
  public double verticalScaleM(double distanceM, double heightM) {
    return 1e3;
  }

  @Override
  public double horizontalScaleM() {
    return 50.0;
  }

  @Override
  public void evaluate(double x, double z, double[] out, double[] along) {
    double square = squareAtOrigin + 2.0 * (p * x + q * z);
    double fourth = square * square;
    out[0] = Math.sqrt(square) - 1.0;
    out[1] = q / square;
    out[2] = -2.0 * q * q / fourth;
    out[3] = x / square;
    out[4] = -2.0 * q * x / fourth;
    out[5] = z / square;
    out[6] = 1.0 / square - 2.0 * q * z / fourth;
    along[0] = p / square;
    along[1] = -2.0 * p * q / fourth;
    along[2] = -2.0 * p * p / fourth;
    along[3] = 1.0 / square - 2.0 * p * x / fourth;
    along[4] = -2.0 * p * z / fourth;
  }
}
