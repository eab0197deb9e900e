package plumbray.imaging.measure;

import java.util.Optional;
import java.util.TreeSet;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.RowSensitivity;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.EstimateLayout;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.measure.HeightReading.Flag;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.ray.StraightRay;

/**
 * Reads heights from image points through a fitted sight. The standard deviation follows from the
 * covariance of all that was estimated, and from the pointing where its standard deviation is
 * given.
 */
public final class HeightReader {

  /** Below this part of the straight-line slope the row hardly tells the height. */
  private static final double WEAK_SLOPE = 0.05;

  private final SightOptics optics;
  private final Camera camera;
  private final StraightRay straight;
  private final Estimates estimates;
  private final EstimateLayout layout;

  /**
   * A reader.
   *
   * @param sight the sight, all quantities held at their estimates
   * @param estimates what was estimated
   * @param distancesM distances at which points will be read besides those in use in the sight, m
   */
  public HeightReader(Sight sight, Estimates estimates, double[] distancesM) {
    TreeSet<Double> all = new TreeSet<>();
    for (double d : SightOptics.distancesInUse(sight)) {
      all.add(d);
    }
    for (double d : distancesM) {
      all.add(d);
    }
    optics =
        SightOptics.of(
            sight, estimates.names(), all.stream().mapToDouble(Double::doubleValue).toArray());
    camera = optics.camera();
    straight = optics.straight();
    this.estimates = estimates;
    layout = EstimateLayout.of(sight, estimates.names());
  }

  /**
   * Reads one point.
   *
   * @param u column, px
   * @param v row, px
   * @param distanceM distance of the thing along the sight line, one of those given, m
   * @param pointingPx standard deviation of the row, px; 0 to leave it out
   */
  public HeightReading read(double u, double v, double distanceM, double pointingPx) {
    if (!(u >= -0.5 && u <= camera.widthPx() - 0.5 && v >= -0.5 && v <= camera.heightPx() - 0.5)) {
      return HeightReading.none(Flag.OUTSIDE);
    }
    double[] direction = new double[2];
    camera.direction(u, v, direction);
    double alpha = direction[0];
    SightMapping mapping = optics.mapping(distanceM);
    Optional<Branch> branch = mapping.branchAt(alpha);
    if (branch.isEmpty()) {
      return HeightReading.none(Flag.GROUND);
    }
    double away = distanceM / Math.cos(direction[1]);
    double elevation =
        branch.get().elevationM(alpha) + (away - distanceM) * branch.get().pathSlope(alpha);
    double uncorrected = straight.elevationM(alpha, away);
    double[] pixel = new double[2];
    camera.pixel(straight.apparentRad(elevation, away), direction[1], pixel);
    return new HeightReading(
        Optional.of(branch.get().sense()),
        elevation - optics.sight().path().ground().elevationM(away),
        elevation,
        sigmaM(branch.get(), direction, pointingPx),
        uncorrected,
        elevation - uncorrected,
        pixel[0],
        pixel[1],
        flag(branch.get(), alpha, distanceM));
  }

  private static Flag flag(Branch branch, double alpha, double distanceM) {
    if (Math.abs(branch.slopeMPerRad(alpha)) < WEAK_SLOPE * distanceM) {
      return Flag.NEAR_VANISHING_LINE;
    }
    return branch.sense() == Sense.INVERTED ? Flag.INVERTED : Flag.OK;
  }

  private double sigmaM(Branch branch, double[] direction, double pointingPx) {
    double alpha = direction[0];
    double slope = branch.slopeMPerRad(alpha);
    RowSensitivity row = camera.rowSensitivity(alpha, direction[1]);
    double byRow = slope / row.dvdElevation();
    double[] derivatives = new double[layout.size()];
    for (int i = 0; i < derivatives.length; i++) {
      int index = layout.sensitivityIndex(i);
      derivatives[i] =
          index >= 0
              ? branch.sensitivity(alpha, index)
              : -byRow * rowDerivative(row, layout.name(i));
    }
    double pointing = byRow * pointingPx;
    return Math.sqrt(estimates.variance(derivatives) + pointing * pointing);
  }

  private double rowDerivative(RowSensitivity row, String name) {
    return switch (name) {
      case "camera.pitchRad" -> row.dvdPitch();
      case "camera.rollRad" -> row.dvdRoll();
      case "camera.focalLengthM" -> row.dvdFocalPx() / optics.sight().camera().pixelPitchM();
      default -> 0.0;
    };
  }
}
