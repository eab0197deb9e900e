package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.estimate.Observation;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.reading.PointObservation;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.StaffObservation;

/**
 * All references of a sight as one observation. Parameters: the sight's estimated quantities, then
 * each reference's own.
 */
final class SightObservation implements Observation {

  /** How good mappings are for a first look, px. */
  static final double ROUGH_PX = 0.02;

  /** How good mappings are for the last word: well below what a staff tells, px. */
  static final double FINE_PX = 0.001;

  private static final double MARGIN_PX = 60.0;

  private final SightParameters parameters;
  private final List<ReferenceObservation> references;
  private final double tolerancePx;

  SightObservation(
      SightParameters parameters, List<ReferenceObservation> references, double tolerancePx) {
    this.parameters = parameters;
    this.tolerancePx = tolerancePx;
    this.references = List.copyOf(references);
  }

  /** The sight's parameters and then the references' own. */
  List<Parameter> allParameters() {
    List<Parameter> all = new ArrayList<>();
    parameters.parameters().forEach(p -> all.add(WeakPriors.on(p)));
    references.forEach(r -> all.addAll(r.ownParameters()));
    return all;
  }

  SightParameters sightParameters() {
    return parameters;
  }

  List<ReferenceObservation> references() {
    return references;
  }

  @Override
  public int count() {
    return references.stream().mapToInt(ReferenceObservation::count).sum();
  }

  @Override
  public void evaluate(double[] values, double[] residuals, double[][] jacobian) {
    FitTrace trace;
    try {
      trace = trace(values, jacobian != null);
    } catch (IllegalArgumentException impossible) {
      // the adjustment asks what these values would give; nothing, and it keeps away
      Arrays.fill(residuals, Double.NaN);
      return;
    }
    if (jacobian != null) {
      for (double[] row : jacobian) {
        Arrays.fill(row, 0.0);
      }
    }
    int row = 0;
    int own = parameters.parameters().size();
    for (ReferenceObservation reference : references) {
      int count = reference.ownParameters().size();
      reference.evaluate(
          trace,
          Arrays.copyOfRange(values, own, own + count),
          new ReferenceObservation.Rows(residuals, jacobian, row, own));
      row += reference.count();
      own += count;
    }
  }

  /** The sight traced at a set of values. */
  FitTrace trace(double[] values, boolean derivatives) {
    int n = parameters.parameters().size();
    Sight sight = parameters.sightAt(Arrays.copyOf(values, n));
    return FitTrace.of(
        sight,
        derivatives ? parameters.names() : List.of(),
        range(sight.camera().camera()),
        tolerancePx);
  }

  /** A reference's own values among all. */
  double[] own(double[] values, int reference) {
    int at = parameters.parameters().size();
    for (int i = 0; i < reference; i++) {
      at += references.get(i).ownParameters().size();
    }
    return Arrays.copyOfRange(values, at, at + references.get(reference).ownParameters().size());
  }

  /**
   * Apparent elevations that the references' strips span; all of the picture's where points count.
   */
  private double[] range(Camera camera) {
    double[] range = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
    double[] direction = new double[2];
    for (ReferenceObservation reference : references) {
      if (reference instanceof PointObservation) {
        double[] all = SightOptics.elevationRange(camera);
        range[0] = Math.min(range[0], all[0]);
        range[1] = Math.max(range[1], all[1]);
      } else if (reference instanceof StaffObservation staff) {
        double column = staff.scene().strip().columnPx();
        double top = staff.scene().strip().firstRow() - MARGIN_PX;
        double bottom = top + staff.scene().strip().rows() + 2.0 * MARGIN_PX;
        for (double row : new double[] {top, bottom}) {
          camera.direction(column, row, direction);
          range[0] = Math.min(range[0], direction[0]);
          range[1] = Math.max(range[1], direction[0]);
        }
      }
    }
    return range;
  }
}
