package plumbray.published;

import java.util.function.DoubleUnaryOperator;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.TemperatureProfile;
import plumbray.raymodel.ray.Medium;

/**
 * An index given by formulas of the height.
 *
 * @param refractivity n - 1
 * @param gradient d ln n/dz, 1/m
 * @param curvature d2 ln n/dz2, 1/m^2
 * @param scaleM see {@link Medium#verticalScaleM}
 */
record GivenIndex(
    DoubleUnaryOperator refractivity,
    DoubleUnaryOperator gradient,
    DoubleUnaryOperator curvature,
    DoubleUnaryOperator scaleM)
    implements Medium {

  /** So large that the level surface bends by less than 1e-12 m over a kilometre. */
  private static final double FLAT_M = 1e18;

  /** Level ground that is not curved. */
  static final SightPath FLAT = new SightPath(FLAT_M, GroundProfile.level(), 0.0);

  /** n^2 = q(z), with the first two derivatives of q. */
  static GivenIndex squared(
      DoubleUnaryOperator q, DoubleUnaryOperator q1, DoubleUnaryOperator q2, double scaleM) {
    return new GivenIndex(
        z -> (q.applyAsDouble(z) - 1.0) / (Math.sqrt(q.applyAsDouble(z)) + 1.0),
        z -> 0.5 * q1.applyAsDouble(z) / q.applyAsDouble(z),
        z -> {
          double slope = q1.applyAsDouble(z) / q.applyAsDouble(z);
          return 0.5 * (q2.applyAsDouble(z) / q.applyAsDouble(z) - slope * slope);
        },
        z -> scaleM);
  }

  /** n = n0 (R/r)^k with r = R + z: refraction coefficient k everywhere on a sphere of radius R. */
  static GivenIndex powerOfRadius(double k, double radiusM) {
    return new GivenIndex(
        z -> 1.00027 * Math.exp(-k * Math.log1p(z / radiusM)) - 1.0,
        z -> -k / (radiusM + z),
        z -> k / ((radiusM + z) * (radiusM + z)),
        z -> 1e4);
  }

  /** n - 1 = c p/T with c p held constant and T = offset + shape: no hydrostatics. */
  static GivenIndex constantPressure(
      double refractivityTimesK, double offsetK, TemperatureProfile shape) {
    double[] t = new double[3 + 2 * shape.parameterCount()];
    return new GivenIndex(
        z -> refractivityTimesK / temperature(shape, offsetK, z, t),
        z -> {
          double temp = temperature(shape, offsetK, z, t);
          double n1 = refractivityTimesK / temp;
          return -n1 / (1.0 + n1) * t[1] / temp;
        },
        z -> {
          double temp = temperature(shape, offsetK, z, t);
          double n1 = refractivityTimesK / temp;
          double slope = t[1] / temp;
          double g = n1 / (1.0 + n1) * slope;
          return n1 / (1.0 + n1) * (2.0 * slope * slope - t[2] / temp) - g * g;
        },
        shape::verticalScaleM);
  }

  private static double temperature(
      TemperatureProfile shape, double offsetK, double z, double[] t) {
    shape.evaluate(z, t);
    return offsetK + t[0];
  }

  @Override
  public int parameterCount() {
    return 0;
  }

  @Override
  public void evaluate(double heightM, double[] out) {
    out[0] = refractivity.applyAsDouble(heightM);
    out[1] = gradient.applyAsDouble(heightM);
    out[2] = curvature.applyAsDouble(heightM);
  }

  @Override
  public double verticalScaleM(double heightM) {
    return scaleM.applyAsDouble(heightM);
  }
}
