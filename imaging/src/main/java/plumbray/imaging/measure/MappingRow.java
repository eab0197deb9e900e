package plumbray.imaging.measure;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.RowSensitivity;
import plumbray.imaging.fit.EstimateLayout;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.MappingRay;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.ray.StraightRay;

/**
 * One traced ray that arrives: where it is seen at the principal column, what it shows, and where
 * that belongs in the redrawn picture.
 *
 * @param distanceM distance of what it shows, m
 * @param apparentRad apparent elevation, rad
 * @param rowPx row in the photo, px
 * @param heightM height above the ground there, m
 * @param elevationM elevation above the level surface through the camera's foot, m
 * @param straightRad apparent elevation that the redrawn picture's rays would give it, rad
 * @param rectifiedRowPx row in the redrawn picture, px
 * @param shiftPx {@code rectifiedRowPx - rowPx}: positive where it belongs lower than it is seen,
 *     px
 * @param sigmaShiftPx standard deviation of the shift at that row of the photo, px
 * @param sense which way up the image is there
 * @param slopeMPerRad d elevation / d apparent elevation, m/rad
 * @param run counts the runs of neighbouring rays at that distance, from 1: between two runs no ray
 *     arrives, and nothing may be interpolated
 */
public record MappingRow(
    double distanceM,
    double apparentRad,
    double rowPx,
    double heightM,
    double elevationM,
    double straightRad,
    double rectifiedRowPx,
    double shiftPx,
    double sigmaShiftPx,
    Sense sense,
    double slopeMPerRad,
    int run) {

  /**
   * The rows of all distances in use, by distance and rising apparent elevation.
   *
   * @param optics the sight's optics, traced with the sensitivities of all estimates
   * @param estimates what was estimated; {@link Estimates#none()} where all is held
   */
  public static List<MappingRow> of(SightOptics optics, Estimates estimates) {
    List<MappingRow> rows = new ArrayList<>();
    for (SightMapping mapping : optics.mappings()) {
      Tracer tracer = new Tracer(optics, estimates, mapping);
      for (int i = 0; i < mapping.runs().size(); i++) {
        int run = i + 1;
        mapping.runs().get(i).forEach(ray -> rows.add(tracer.row(ray, run)));
      }
    }
    return rows;
  }

  /** Makes the rows of one distance. */
  private static final class Tracer {
    /** Step of the differences of the closed-form straight ray, in parts of the distance. */
    private static final double STEP = 1e-4;

    private final SightOptics optics;
    private final Camera camera;
    private final StraightRay straight;
    private final SightMapping mapping;
    private final Estimates estimates;
    private final EstimateLayout layout;
    private final double distanceM;

    Tracer(SightOptics optics, Estimates estimates, SightMapping mapping) {
      this.optics = optics;
      this.mapping = mapping;
      this.estimates = estimates;
      camera = optics.camera();
      straight = optics.straight();
      layout = EstimateLayout.of(optics.sight(), estimates.names());
      distanceM = mapping.distanceM();
    }

    MappingRow row(MappingRay ray, int run) {
      double straightRad = straight.apparentRad(ray.elevationM(), distanceM);
      double rowPx = camera.rowAt(ray.apparentRad());
      double rectifiedRowPx = camera.rowAt(straightRad);
      return new MappingRow(
          distanceM,
          ray.apparentRad(),
          rowPx,
          ray.elevationM() - mapping.groundM(),
          ray.elevationM(),
          straightRad,
          rectifiedRowPx,
          rectifiedRowPx - rowPx,
          sigmaShiftPx(ray, straightRad),
          ray.sense(),
          ray.slopeMPerRad(),
          run);
    }

    private double sigmaShiftPx(MappingRay ray, double straightRad) {
      RowSensitivity seen = camera.rowSensitivity(ray.apparentRad(), 0.0);
      RowSensitivity redrawn = camera.rowSensitivity(straightRad, 0.0);
      double[] derivatives = new double[layout.size()];
      for (int i = 0; i < derivatives.length; i++) {
        String name = layout.name(i);
        int index = layout.sensitivityIndex(i);
        // The row of the photo is fixed, so a camera that looks elsewhere follows another ray.
        double ofElevation =
            index >= 0
                ? ray.sensitivities()[index]
                : -ray.slopeMPerRad() * ofCamera(seen, name) / seen.dvdElevation();
        double ofStraight = ofElevation * straightPerElevation(ray.elevationM());
        if (index == 0) {
          ofStraight += straightPerCameraHeight(ray.elevationM());
        }
        derivatives[i] = redrawn.dvdElevation() * ofStraight + ofCamera(redrawn, name);
      }
      return Math.sqrt(estimates.variance(derivatives));
    }

    private double ofCamera(RowSensitivity row, String name) {
      return switch (name) {
        case "camera.pitchRad" -> row.dvdPitch();
        case "camera.rollRad" -> row.dvdRoll();
        case "camera.focalLengthM" -> row.dvdFocalPx() / optics.sight().camera().pixelPitchM();
        default -> 0.0;
      };
    }

    private double straightPerElevation(double elevationM) {
      double step = STEP * distanceM;
      return (straight.apparentRad(elevationM + step, distanceM)
              - straight.apparentRad(elevationM - step, distanceM))
          / (2.0 * step);
    }

    private double straightPerCameraHeight(double elevationM) {
      double step = STEP * distanceM;
      return (fromHeight(step).apparentRad(elevationM, distanceM)
              - fromHeight(-step).apparentRad(elevationM, distanceM))
          / (2.0 * step);
    }

    private StraightRay fromHeight(double offsetM) {
      return new StraightRay(
          straight.cameraHeightM() + offsetM,
          straight.earthRadiusM(),
          straight.refractionCoefficient());
    }
  }
}
