package plumbray.benchmark;

import java.util.stream.IntStream;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/**
 * Sun-heated ground: exponential profile, 25 K of excess, seen from 1.5 m.
 *
 * @param scaleHeightM its scale height, m
 */
record HotGround(double scaleHeightM) {

  static final double CAMERA_M = 1.5;
  static final double REACH_M = 1000.0;

  /** Angles from which no ray meets the ground, over any of the scale heights. */
  static final double LOWEST_RAD = -6e-3;

  static final double HIGHEST_RAD = 3e-3;
  static final int RAYS = 400;

  /** The air with derivatives by so many of: excess, scale, gradient, temperature, pressure, RH. */
  AirColumn air(int parameters) {
    return AirColumn.of(
        new AirState(303.15, 100_800.0, 0.3, 430.0, 550e-9),
        CAMERA_M,
        ProfileFamily.EXPONENTIAL.profile(
            new double[] {25.0, scaleHeightM, -0.0098}, Stability.DYER),
        IntStream.range(0, parameters).toArray());
  }

  static double angleRad(int ray) {
    return LOWEST_RAD + (HIGHEST_RAD - LOWEST_RAD) * ray / (RAYS - 1);
  }
}
