package plumbray.imaging.fit;

import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.RowSensitivity;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.reading.TracedSight;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.GrazingRay;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.ray.RayTracer;

/** A sight traced to its references' distances, for one evaluation of a fit. */
final class FitTrace implements TracedSight {

  /** Local errors of the integration, as a part of what the mapping tolerates. */
  private static final double TRACE_SHARE = 1e-3;

  /** Mappings no better than this are for looking around, and need few rays. */
  private static final double ROUGH_PX = 0.1;

  private static final int ROUGH_RAYS = 400;
  private static final int FINE_RAYS = 4000;

  private final Sight sight;
  private final Camera camera;
  private final EstimateLayout layout;
  private final RayFan fan;

  private FitTrace(Sight sight, Camera camera, EstimateLayout layout, RayFan fan) {
    this.sight = sight;
    this.camera = camera;
    this.layout = layout;
    this.fan = fan;
  }

  /**
   * Traces.
   *
   * @param sight the sight at the present values
   * @param estimated names of the estimated quantities
   * @param range lowest and highest apparent elevation that matter, rad
   * @param tolerancePx how good the mappings must be, px
   */
  static FitTrace of(Sight sight, List<String> estimated, double[] range, double tolerancePx) {
    Camera camera = sight.camera().camera();
    TreeSet<Double> distances = new TreeSet<>();
    sight.references().stream().map(Reference::distanceM).forEach(distances::add);
    double farthest = distances.last();
    FanRequest request =
        new FanRequest(
            sight.camera().heightM().value(),
            range[0],
            range[1],
            distances.stream().mapToDouble(Double::doubleValue).toArray(),
            tolerancePx * camera.radPerPx(),
            tolerancePx < ROUGH_PX ? FINE_RAYS : ROUGH_RAYS,
            !estimated.isEmpty());
    RayFan fan =
        RayFan.trace(
            SightOptics.air(sight, estimated),
            sight.path().path(),
            request,
            Math.max(
                RayTracer.DEFAULT_TOLERANCE_M, TRACE_SHARE * request.toleranceRad() * farthest));
    return new FitTrace(sight, camera, EstimateLayout.of(sight, estimated), fan);
  }

  Sight sight() {
    return sight;
  }

  @Override
  public Camera camera() {
    return camera;
  }

  @Override
  public SightMapping mapping(double distanceM) {
    return fan.mapping(distanceM);
  }

  @Override
  public double footElevationM(int reference) {
    Reference r = sight.references().get(reference);
    return sight.path().ground().elevationM(r.distanceM()) + r.footM().value();
  }

  @Override
  public int estimateCount() {
    return layout.size();
  }

  @Override
  public void rowDerivatives(int reference, Place place, double[] out) {
    double elevationRad = place.elevationRad();
    Branch branch = place.branch();
    RowSensitivity row = camera.rowSensitivity(elevationRad, place.azimuthRad());
    double slope = branch.slopeMPerRad(elevationRad);
    double least = place.leastSlopeShare() * sight.references().get(reference).distanceM();
    double sign = branch.sense() == Sense.UPRIGHT ? 1.0 : -1.0;
    double perM = row.dvdElevation() / (sign * Math.max(least, Math.abs(slope)));
    String foot = "references[" + reference + "].footM";
    for (int i = 0; i < layout.size(); i++) {
      int index = layout.sensitivityIndex(i);
      if (index >= 0) {
        out[i] = -perM * branch.sensitivity(elevationRad, index);
      } else {
        out[i] = layout.name(i).equals(foot) ? perM : byCamera(layout.name(i), row);
      }
    }
  }

  @Override
  public boolean endDerivatives(double apparentRad, double azimuthRad, double[] out) {
    Optional<GrazingRay> ray = fan.grazingRay(apparentRad);
    if (ray.isEmpty()) {
      return false;
    }
    RowSensitivity row = camera.rowSensitivity(apparentRad, azimuthRad);
    for (int i = 0; i < layout.size(); i++) {
      int index = layout.sensitivityIndex(i);
      if (index >= 0) {
        out[i] = row.dvdElevation() * ray.get().byQuantity()[index];
      } else if (layout.name(i).equals("path.blockedBelowM")) {
        out[i] = row.dvdElevation() * ray.get().byBlockedHeight();
      } else {
        out[i] = byCamera(layout.name(i), row);
      }
    }
    return true;
  }

  /** Derivative of a row by a quantity of the camera's attitude or focal length. */
  private double byCamera(String name, RowSensitivity row) {
    return switch (name) {
      case "camera.pitchRad" -> row.dvdPitch();
      case "camera.rollRad" -> row.dvdRoll();
      case "camera.focalLengthM" -> row.dvdFocalPx() / sight.camera().pixelPitchM();
      default -> 0.0;
    };
  }
}
