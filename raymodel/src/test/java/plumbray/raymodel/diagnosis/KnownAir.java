package plumbray.raymodel.diagnosis;

import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.Medium;

/** Air of which something can be said without tracing. */
final class KnownAir {

  static final double TEMPERATURE_K = 300.0;
  static final double PRESSURE_PA = 100_000.0;
  static final double REFERENCE_M = 1.5;

  private KnownAir() {}

  /** Dry air at 300 K and 1000 hPa at 1.5 m. */
  static AirColumn column(ProfileFamily family, double... values) {
    AirState state = new AirState(TEMPERATURE_K, PRESSURE_PA, 0.0, 430.0, 550e-9);
    return AirColumn.of(state, REFERENCE_M, family.profile(values, Stability.DYER));
  }

  /** n = exp(-k ln(1 + z/R)), n proportional to r^-k: the refraction coefficient is k. */
  record RadialPower(double k, double radiusM) implements Medium {
    @Override
    public int parameterCount() {
      return 0;
    }

    @Override
    public void evaluate(double heightM, double[] out) {
      double r = radiusM + heightM;
      out[0] = Math.expm1(-k * Math.log1p(heightM / radiusM));
      out[1] = -k / r;
      out[2] = k / (r * r);
    }

    @Override
    public double verticalScaleM(double heightM) {
      return 1e4;
    }
  }

  /** d ln n/dz is the same at all heights. */
  record EvenSlope(double slopePerM) implements Medium {
    @Override
    public int parameterCount() {
      return 0;
    }

    @Override
    public void evaluate(double heightM, double[] out) {
      out[0] = Math.expm1(slopePerM * heightM);
      out[1] = slopePerM;
      out[2] = 0.0;
    }

    @Override
    public double verticalScaleM(double heightM) {
      return 1e4;
    }
  }
}
