package plumbray.raymodel.ray;

import plumbray.raymodel.path.SightPath;

/**
 * Another way to the same rays: the equations in elevation y and t = dy/(horizontal way), with the
 * distance x along the level surface as the variable, by the classical fourth-order method in fixed
 * steps: dy/dx = (1 + y/R) t, dt/dx = (1 + t^2) (1/R + (1 + y/R) L_y - t L_x), L = ln n, with L_y =
 * dL/dz and L_x = dL/dx at fixed z less G'(x) dL/dz over ground G(x); n - 1 is thinned by exp(-k
 * G(x)), k the air's lapse. Derived from Fermat's principle.
 */
final class CartesianRay {

  private final VaryingMedium air;
  private final SightPath path;
  private final double[] out;
  private final double[] along;

  CartesianRay(VaryingMedium air, SightPath path) {
    this.air = air;
    this.path = path;
    out = new double[3 + 2 * air.parameterCount()];
    along = new double[3 + air.parameterCount()];
  }

  /** Elevation at {@code toM}; steps end at multiples of {@code stepM}, and so should bends. */
  double elevationM(double heightM, double apparentRad, double toM, double stepM) {
    double y = heightM;
    double t = Math.tan(apparentRad);
    long steps = Math.round(toM / stepM);
    for (long i = 0; i < steps; i++) {
      double x = i * stepM;
      double[] next = step(x, y, t, stepM);
      y = next[0];
      t = next[1];
    }
    return y;
  }

  /** Elevation and t after one step, which must not pass a bend of the ground. */
  double[] step(double x, double y, double t, double stepM) {
    double groundSlope = path.ground().slope(x + 0.5 * stepM);
    double ground = path.ground().elevationM(x) - groundSlope * x;
    double h = 0.5 * stepM;
    double[] a = rates(x, y, t, ground, groundSlope);
    double[] b = rates(x + h, y + h * a[0], t + h * a[1], ground, groundSlope);
    double[] c = rates(x + h, y + h * b[0], t + h * b[1], ground, groundSlope);
    double[] d = rates(x + stepM, y + stepM * c[0], t + stepM * c[1], ground, groundSlope);
    return new double[] {
      y + stepM / 6.0 * (a[0] + 2.0 * b[0] + 2.0 * c[0] + d[0]),
      t + stepM / 6.0 * (a[1] + 2.0 * b[1] + 2.0 * c[1] + d[1])
    };
  }

  private double[] rates(double x, double y, double t, double ground, double groundSlope) {
    double radius = path.earthRadiusM();
    double b = 1.0 + y / radius;
    double groundM = ground + groundSlope * x;
    air.evaluate(x, y - groundM, out, along);
    double lapse = air.lapse()[0];
    double thin = Math.exp(-lapse * groundM);
    double n = 1.0 + out[0] * thin;
    double byZ = thin * (1.0 + out[0]) * out[1] / n;
    double byX = (thin * (1.0 + out[0]) * along[0] - lapse * groundSlope * out[0] * thin) / n;
    double atElevation = byX - groundSlope * byZ;
    return new double[] {b * t, (1.0 + t * t) * (1.0 / radius + b * byZ - t * atElevation)};
  }
}
