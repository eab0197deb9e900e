package plumbray.raymodel.ray;

import java.util.Arrays;

/**
 * Position, direction and their derivatives along one ray, and one Nystrom step of them all.
 *
 * <p>Component 0 is the ray itself; component j > 0 is the derivative by quantity j - 1 (apparent
 * elevation, camera height, parameters of the medium). Arrays: u and X of the component, their
 * rates by sigma, and forces by stage.
 */
final class RayState {

  /** Steps keep below the air's scales: one whose error turns out too large is a step wasted. */
  private static final double OF_SCALE = 0.7;

  private final LocalAir local;
  private final double earthRadiusM;

  /** 1/earthRadiusM: a product is ready much sooner than a quotient. */
  private final double curvature;

  final int components;

  /** As the local air fills them. */
  private final double[] air;

  private final double[] along;

  double[] u;
  double[] x;
  double[] uRate;
  double[] xRate;
  private double[] uNew;
  private double[] xNew;
  private double[] uRateNew;
  private double[] xRateNew;
  private final double[][] uForce;
  private final double[][] xForce;
  private double groundSlope;
  private double groundIntercept;

  /** Whether nothing pulls the ray along the path here, so that X grows evenly with sigma. */
  private boolean coasting;

  RayState(PathAir pathAir, double earthRadiusM, boolean withSensitivities) {
    local = new LocalAir(pathAir);
    air = local.air;
    along = local.along;
    this.earthRadiusM = earthRadiusM;
    curvature = 1.0 / earthRadiusM;
    components = withSensitivities ? 3 + pathAir.parameterCount() : 1;
    u = new double[components];
    x = new double[components];
    uRate = new double[components];
    xRate = new double[components];
    uNew = new double[components];
    xNew = new double[components];
    uRateNew = new double[components];
    xRateNew = new double[components];
    uForce = new double[NystromPair.STAGES][components];
    xForce = new double[NystromPair.STAGES][components];
  }

  /**
   * Ground y = intercept + slope x and the air just after {@code fromM} hold from here on; forces
   * are evaluated afresh. A neighbouring ray comes to the bend sooner or later than this one and
   * feels the other force for that while, which is a jump in the derivatives' rates. Where only the
   * air changes there is none: blends join smoothly.
   */
  void enterSegment(double fromM, double slope, double intercept) {
    double before = xForce[0][0];
    groundSlope = slope;
    groundIntercept = intercept;
    enterAir(fromM);
    force(0, u, x);
    if (x[0] > 0.0) {
      double jump = (xForce[0][0] - before) / xRate[0];
      for (int j = 1; j < components; j++) {
        xRate[j] += jump * x[j];
      }
    }
  }

  private void enterAir(double fromM) {
    local.enter(fromM, groundSlope, groundIntercept);
    coasting = !local.varies() && groundSlope == 0.0;
    if (coasting) {
      for (double[] stage : xForce) {
        Arrays.fill(stage, 0.0);
      }
    }
  }

  /** Puts the ray at the camera. */
  void start(double cameraHeightM, double apparentRad) {
    Arrays.fill(u, 0.0);
    Arrays.fill(x, 0.0);
    groundSlope = 0.0;
    groundIntercept = 0.0;
    enterAir(0.0);
    local.evaluate(0.0, cameraHeightM);
    double scale = 1.0 + cameraHeightM / earthRadiusM;
    double m = (1.0 + air[0]) * scale;
    double cos = Math.cos(apparentRad);
    double sin = Math.sin(apparentRad);
    u[0] = earthRadiusM * Math.log1p(cameraHeightM / earthRadiusM);
    uRate[0] = m * sin;
    xRate[0] = m * cos;
    if (components == 1) {
      return;
    }
    uRate[1] = m * cos;
    xRate[1] = -m * sin;
    u[2] = 1.0 / scale;
    scaleRates(2, air[1] + 1.0 / (earthRadiusM * scale));
    for (int j = 3; j < components; j++) {
      scaleRates(j, air[2 * j - 3]);
    }
  }

  private void scaleRates(int j, double logIndexDerivative) {
    uRate[j] = uRate[0] * logIndexDerivative;
    xRate[j] = xRate[0] * logIndexDerivative;
  }

  /** Tries a step of {@code h} in sigma and returns the larger of its two error estimates, m. */
  double attempt(double h, double slopeLengthM) {
    for (int stage = 1; stage < NystromPair.STAGES; stage++) {
      double[] a = NystromPair.A[stage];
      double ch = NystromPair.C[stage] * h;
      advance(u, uRate, uForce, a, ch, h * h, uNew);
      if (!coasting) {
        advance(x, xRate, xForce, a, ch, h * h, xNew);
      } else if (stage == NystromPair.STAGES - 1) {
        coast(ch);
      }
      force(stage, uNew, xNew);
    }
    advance(uRate, uForce, h, uRateNew);
    if (coasting) {
      System.arraycopy(xRate, 0, xRateNew, 0, components);
    } else {
      advance(xRate, xForce, h, xRateNew);
    }
    return errorM(h, slopeLengthM);
  }

  /** Position of a stage, or of the step's end: from + ch rate + hh sum of a forces. */
  private void advance(
      double[] from,
      double[] rate,
      double[][] forces,
      double[] a,
      double ch,
      double hh,
      double[] to) {
    NystromPair.weightedSum(forces, a, components, to);
    for (int j = 0; j < components; j++) {
      to[j] = from[j] + ch * rate[j] + hh * to[j];
    }
  }

  private void coast(double ch) {
    for (int j = 0; j < components; j++) {
      xNew[j] = x[j] + ch * xRate[j];
    }
  }

  private void advance(double[] rate, double[][] forces, double h, double[] to) {
    NystromPair.weightedSum(forces, NystromPair.SLOPE, components, to);
    for (int j = 0; j < components; j++) {
      to[j] = rate[j] + h * to[j];
    }
  }

  private double errorM(double h, double slopeLengthM) {
    double position = 0.0;
    double slope = 0.0;
    for (int s = 0; s < NystromPair.STAGES; s++) {
      position += NystromPair.POSITION_ERROR[s] * uForce[s][0];
      slope += NystromPair.SLOPE_ERROR[s] * uForce[s][0];
    }
    double error = Math.max(Math.abs(position) * h * h, Math.abs(slope) * h * slopeLengthM);
    return local.varies() ? Math.max(error, alongErrorM(h)) : error;
  }

  private double alongErrorM(double h) {
    double position = 0.0;
    for (int s = 0; s < NystromPair.STAGES; s++) {
      position += NystromPair.POSITION_ERROR[s] * xForce[s][0];
    }
    return Math.abs(position) * h * h;
  }

  /** Takes the step that was tried last. */
  void accept() {
    double[] swap = u;
    u = uNew;
    uNew = swap;
    swap = x;
    x = xNew;
    xNew = swap;
    swap = uRate;
    uRate = uRateNew;
    uRateNew = swap;
    swap = xRate;
    xRate = xRateNew;
    xRateNew = swap;
    int last = NystromPair.STAGES - 1;
    swap = uForce[0];
    uForce[0] = uForce[last];
    uForce[last] = swap;
    swap = xForce[0];
    xForce[0] = xForce[last];
    xForce[last] = swap;
  }

  /** Goes back to before the step that was taken last; another can be tried from there. */
  void takeBack() {
    accept();
  }

  /** Distance at which the step that was tried last ends, m. */
  double triedDistanceM() {
    return xNew[0];
  }

  /** Height above the ground, m, at the end of the step accepted last or at the start. */
  double heightM() {
    return elevationM() - groundIntercept - groundSlope * x[0];
  }

  /** Fills value, first and second derivative by sigma of the height above the ground. */
  void clearance(double[] out) {
    double b = 1.0 + elevationM() * curvature;
    out[0] = heightM();
    out[1] = b * uRate[0] - groundSlope * xRate[0];
    out[2] = b * (uForce[0][0] + uRate[0] * uRate[0] * curvature) - groundSlope * xForce[0][0];
  }

  /** Elevation above the level surface, m. */
  double elevationM() {
    return elevationM(u[0]);
  }

  private double elevationM(double uM) {
    double e = uM * curvature;
    double ee = e * e;
    return Math.abs(e) < 1e-3
        ? uM + uM * e * (0.5 + e * (1.0 / 6) + ee * (1.0 / 24 + e * (1.0 / 120)))
        : earthRadiusM * Math.expm1(e);
  }

  /** dy/dx of the ray. */
  double pathSlope() {
    return (1.0 + elevationM() * curvature) * uRate[0] / xRate[0];
  }

  /** Derivative of the elevation at fixed distance by quantity {@code j - 1}. */
  double sensitivity(int j) {
    double b = 1.0 + elevationM() * curvature;
    return b * (u[j] - uRate[0] / xRate[0] * x[j]);
  }

  /** Largest step, in sigma, that stays within the air's scales. */
  double largestStep() {
    double heightM = heightM();
    double scale = local.verticalScaleM(x[0], heightM);
    double bySlope = scale / Math.abs(uRate[0] - groundSlope * xRate[0]);
    double byBend = Math.sqrt(2.0 * scale / Math.abs(uForce[0][0]));
    double byDistance = local.horizontalScaleM() / xRate[0];
    return OF_SCALE * Math.min(byDistance, Math.min(bySlope, byBend));
  }

  private void force(int stage, double[] atU, double[] atX) {
    double y = elevationM(atU[0]);
    double b = 1.0 + y * curvature;
    local.evaluate(atX[0], y - groundIntercept - groundSlope * atX[0]);
    double n = 1.0 + air[0];
    double m2 = n * n * b * b;
    double logU = air[1] * b + curvature;
    double logX = along[0] - air[1] * groundSlope;
    uForce[stage][0] = m2 * logU;
    if (coasting) {
      upForces(uForce[stage], atU, b, m2, logU);
    } else {
      xForce[stage][0] = m2 * logX;
      bothForces(stage, atU, atX, b, m2);
    }
  }

  /** Forces on the derivatives where ln m depends on u alone. */
  private void upForces(double[] fu, double[] atU, double b, double m2, double logU) {
    double logUu = air[2] * b * b + air[1] * b * curvature;
    double byU = 2.0 * logU * logU + logUu;
    for (int j = 1; j < Math.min(3, components); j++) {
      fu[j] = m2 * byU * atU[j];
    }
    for (int j = 3; j < components; j++) {
      fu[j] = m2 * (byU * atU[j] + 2.0 * logU * air[2 * j - 3] + b * air[2 * j - 2]);
    }
  }

  /** Forces on the derivatives; ln m = ln n(x, y - G(x)) + u/R has slopes in both directions. */
  private void bothForces(int stage, double[] atU, double[] atX, double b, double m2) {
    double s = groundSlope;
    double logU = air[1] * b + curvature;
    double logX = along[0] - air[1] * s;
    double logUu = air[2] * b * b + air[1] * b * curvature;
    double logUx = b * (along[1] - air[2] * s);
    double logXx = along[2] + s * (air[2] * s - 2.0 * along[1]);
    double[] fu = uForce[stage];
    double[] fx = xForce[stage];
    for (int j = 1; j < components; j++) {
      double byIndex = 0.0;
      double byGradient = 0.0;
      double byAlong = 0.0;
      if (j > 2) {
        byIndex = air[2 * j - 3];
        byGradient = air[2 * j - 2];
        byAlong = along[j];
      }
      double log = logU * atU[j] + logX * atX[j] + byIndex;
      fu[j] = m2 * (2.0 * log * logU + logUu * atU[j] + logUx * atX[j] + byGradient * b);
      fx[j] = m2 * (2.0 * log * logX + logUx * atU[j] + logXx * atX[j] + byAlong - byGradient * s);
    }
  }
}
