package plumbray.raymodel.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.raymodel.diagnosis.Bend.Curving;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.ray.PathAir;

/** The weighted distribution of heights along a ray, against integrals done by hand. */
class FeltHeightsTest {

  /** Curved by less than 1e-9 m over the path. */
  private static final SightPath FLAT = new SightPath(1e15, GroundProfile.level(), 0.0);

  private static final double REACH_M = 800.0;
  private static final double CAMERA_M = 2.0;

  /** Heights are searched to 1e-7 m, and the tracer keeps 1e-9 m a step. */
  private static final double SEARCHED_M = 1e-6;

  private static FeltHeights straight(double endM) {
    return FeltHeights.of(
        new RayFollower(PathAir.uniform(new KnownAir.EvenSlope(0.0)), FLAT, CAMERA_M, REACH_M)
            .follow(Math.atan((endM - CAMERA_M) / REACH_M)));
  }

  /**
   * With z = z0 + (z1 - z0) u, u from 0 to 1, and the weight 2 (1 - u): the mean is z0 + (z1 -
   * z0)/3, and 1 - (1 - u)^2 of the weight is felt before u.
   */
  @ParameterizedTest
  @ValueSource(doubles = {5.0, 0.5})
  void alongAStraightLineTheyAreAsIntegratedByHand(double endM) {
    FeltHeights felt = straight(endM);
    double rise = endM - CAMERA_M;
    assertThat(felt.meanM()).isCloseTo(CAMERA_M + rise / 3.0, within(SEARCHED_M));
    for (double u : new double[] {0.1, 0.37, 0.8}) {
      double height = CAMERA_M + rise * u;
      double before = 1.0 - (1.0 - u) * (1.0 - u);
      double below = rise > 0.0 ? before : 1.0 - before;
      assertThat(felt.shareBelow(height)).isCloseTo(below, within(SEARCHED_M));
      assertThat(felt.quantileM(below)).isCloseTo(height, within(SEARCHED_M));
    }
  }

  @Test
  void nothingLiesBelowTheLowestAndAllBelowTheHighest() {
    FeltHeights felt = straight(5.0);
    assertThat(felt.shareBelow(CAMERA_M - 0.01)).isZero();
    assertThat(felt.shareBelow(5.01)).isCloseTo(1.0, within(1e-12));
    assertThat(felt.quantileM(0.0)).isCloseTo(CAMERA_M, within(SEARCHED_M));
    assertThat(felt.quantileM(1.0)).isCloseTo(5.0, within(SEARCHED_M));
  }

  /** Half of the way at the camera holds 3/4 of the weight: 1 - (1/2)^2. */
  @Test
  void theNearHalfOfTheWayHoldsThreeQuartersOfTheWeight() {
    double half = 0.5 * REACH_M;
    assertThat(FeltHeights.share(List.of(new Bend(0.0, half, Curving.CONVEX)), REACH_M))
        .isCloseTo(0.75, within(1e-12));
    assertThat(FeltHeights.share(List.of(), REACH_M)).isZero();
  }

  /**
   * Why the weight is D - s: the displacement of the end from a straight ray is the integral of (D
   * - s) k/R, for rays a few milliradians steep to some 1e-5; the trapezoids over 240 places miss
   * less than 1e-3.
   */
  @Test
  void bendingWeightedWithTheLeverArmIsTheDisplacement() {
    PathAir air = PathAir.uniform(KnownAir.column(ProfileFamily.EXPONENTIAL, 10.0, 0.3, -0.0098));
    RayPath ray = new RayFollower(air, SightPath.level(), CAMERA_M, REACH_M).follow(-1.5e-3);
    double[] x = ray.distancesM();
    double[] k = ray.coefficients();
    double sum = 0.0;
    for (int i = 1; i < x.length; i++) {
      sum += 0.5 * (x[i] - x[i - 1]) * ((REACH_M - x[i]) * k[i] + (REACH_M - x[i - 1]) * k[i - 1]);
    }
    double mean = sum / (0.5 * REACH_M * REACH_M);
    assertThat(mean).isLessThan(-0.5);
    assertThat(ray.meanCoefficient()).isCloseTo(mean, within(1e-3 * Math.abs(mean)));
  }
}
