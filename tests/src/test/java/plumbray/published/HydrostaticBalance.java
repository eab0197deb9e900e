package plumbray.published;

import static plumbray.published.PublishedCheck.Kind.COMPUTED;
import static plumbray.published.PublishedCheck.Kind.MEMORY;
import static plumbray.published.PublishedCheck.Kind.PRACTICE;

import java.util.List;
import java.util.function.DoubleSupplier;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.air.VapourPressure;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** Pressure by height, and the lapse rate at which rays are straight. */
final class HydrostaticBalance {

  private static final double FOOT_K = 288.15;
  private static final double FOOT_PA = 101_325.0;
  private static final double STANDARD_LAPSE = -0.0065;

  /** Customary g = 9.81 instead of 9.80665 and R = 287.058 instead of 287.053 make 1.2e-5. */
  private static final double CUSTOMARY_CONSTANTS = 2e-5;

  /** Ciddor's compressibility bends the ideal gas by less than 0.4 % at the ground. */
  private static final double REAL_GAS = 4e-3 * 0.034163;

  private HydrostaticBalance() {}

  static List<PublishedCheck> checks() {
    Topic topic = new Topic("hydrostatics").in("K/m");
    topic.from("g/R_d with g = 9.80665 m/s2, R_d = 287.053 J/(kg K)", COMPUTED);
    topic.check("lapse rate of constant density", 0.034163, 5e-7, AIR_CONSTANT);
    topic.check("lapse rate of straight rays", 0.034163, REAL_GAS, HydrostaticBalance::straight);
    topic.from("g/R_d with g = 9.81 m/s2, R_d = 287.058 J/(kg K)", PRACTICE);
    topic.check("customary constants", 0.034174, CUSTOMARY_CONSTANTS, AIR_CONSTANT);
    topic.in("Pa").from("US Standard Atmosphere (1976), by geopotential height", MEMORY);
    topic.check("1000 m", 89874.6, 0.1, () -> standard(0.0).pressurePa(1000));
    topic.check("5000 m", 54019.9, 0.1, () -> standard(0.0).pressurePa(5000));
    topic.in("K").from("T/(1 - 0.378 e/p)", COMPUTED);
    topic.check(
        "virtual temperature at 303.15 K, 1000 hPa, vapour 20 hPa",
        305.4593,
        1e-3,
        HydrostaticBalance::virtualTemperature);
    return topic.checks();
  }

  private static final DoubleSupplier AIR_CONSTANT = () -> AirColumn.AUTOCONVECTIVE_K_PER_M;

  private static AirColumn standard(double humidity) {
    return column(new AirState(FOOT_K, FOOT_PA, humidity, 400.0, 550e-9), STANDARD_LAPSE);
  }

  private static AirColumn column(AirState air, double gradient) {
    return AirColumn.of(
        air, 0.0, ProfileFamily.UNIFORM.profile(new double[] {gradient}, Stability.DYER));
  }

  /** The lapse rate at which d ln n/dz is zero, by bisection. */
  private static double straight() {
    AirState air = new AirState(FOOT_K, FOOT_PA, 0.0, 400.0, 550e-9);
    double low = 0.03;
    double high = 0.04;
    for (int i = 0; i < 50; i++) {
      double lapse = 0.5 * (low + high);
      if (column(air, -lapse).logIndexGradientPerM(0.0) < 0.0) {
        low = lapse;
      } else {
        high = lapse;
      }
    }
    return low;
  }

  private static double virtualTemperature() {
    double full = VapourPressure.moleFraction(303.15, 1e5, 1.0);
    AirColumn moist = column(new AirState(303.15, 1e5, 0.02 / full, 400.0, 550e-9), 0.0);
    double step = 10.0;
    double logSlope = Math.log(moist.pressurePa(step) / moist.pressurePa(-step)) / (2.0 * step);
    return -AirColumn.AUTOCONVECTIVE_K_PER_M / logSlope;
  }
}
