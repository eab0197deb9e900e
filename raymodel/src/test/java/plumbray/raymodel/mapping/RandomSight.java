package plumbray.raymodel.mapping;

import java.util.Arrays;
import java.util.Random;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.air.AirState;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.TabulatedMedium;

/** A sight drawn at random: every family in turn, level and rolling ground, hot and cold. */
record RandomSight(
    ProfileFamily family,
    double[] values,
    AirState air,
    SightPath path,
    double cameraHeightM,
    double lowestRad,
    double highestRad,
    double[] distancesM) {

  static RandomSight of(long seed) {
    return new Draw(seed).sight();
  }

  Medium medium() {
    return new TabulatedMedium(
        AirColumn.of(air, cameraHeightM, family.profile(values, Stability.DYER)));
  }

  RayFan fan(double toleranceRad) {
    return RayFan.trace(
        medium(),
        path,
        new FanRequest(cameraHeightM, lowestRad, highestRad, distancesM, toleranceRad, true));
  }

  @Override
  public String toString() {
    return family
        + Arrays.toString(values)
        + " from "
        + cameraHeightM
        + " m to "
        + Arrays.toString(distancesM);
  }

  private static final class Draw {

    private static final ProfileFamily[] FAMILIES = ProfileFamily.values();

    private final Random random;
    private final ProfileFamily family;

    Draw(long seed) {
      random = new Random(seed);
      family = FAMILIES[(int) (seed % FAMILIES.length)];
    }

    RandomSight sight() {
      double[] values = values();
      double height = spread(0.3, 10);
      double far = spread(80, 6000);
      AirState air = new AirState(between(263, 313), 100_000, 0.3, 430, 550e-9);
      GroundProfile ground = ground(far);
      double blocked = random.nextInt(3) == 0 ? spread(0.002, 0.05) : 0.0;
      double middle = between(-0.004, 0.002);
      double half = spread(0.002, 0.015);
      double[] distances =
          random.nextBoolean() ? new double[] {far} : new double[] {0.4 * far, 0.7 * far, far};
      SightPath path = new SightPath(6_371_000, ground, Math.min(blocked, 0.5 * height));
      return new RandomSight(
          family, values, air, path, height, middle - half, middle + half, distances);
    }

    private double[] values() {
      return switch (family) {
        case UNIFORM -> new double[] {between(-1, 0.5)};
        case EXPONENTIAL -> new double[] {between(-20, 40), spread(0.005, 3), between(-0.3, 0.1)};
        case TWO_SCALE ->
            new double[] {
              between(-5, 30),
              spread(0.003, 0.1),
              between(-3, 15),
              spread(0.05, 2),
              between(-0.2, 0.1)
            };
        case LOGARITHMIC -> new double[] {between(-4, 2.5), spread(1e-4, 0.05), between(-0.2, 0.1)};
        case POWER ->
            new double[] {
              between(-4, 4), between(-0.6, 0.5), spread(1e-3, 0.1), between(-0.1, 0.1)
            };
        case SIMILARITY ->
            new double[] {
              between(-2, 0.5),
              random.nextBoolean() ? -spread(0.5, 100) : spread(5, 100),
              spread(1e-4, 0.05)
            };
        case STEP ->
            new double[] {between(-8, 8), between(0.3, 12), spread(0.05, 3), between(-0.05, 0.03)};
      };
    }

    private GroundProfile ground(double farM) {
      int pieces = random.nextInt(5);
      double[] x = new double[pieces + 1];
      double[] y = new double[pieces + 1];
      for (int i = 1; i <= pieces; i++) {
        double run = farM * between(0.05, 0.4);
        x[i] = x[i - 1] + run;
        y[i] = y[i - 1] + run * between(-0.003, 0.003);
      }
      return new GroundProfile(x, y);
    }

    private double spread(double low, double high) {
      return low * Math.pow(high / low, random.nextDouble());
    }

    private double between(double low, double high) {
      return low + (high - low) * random.nextDouble();
    }
  }
}
