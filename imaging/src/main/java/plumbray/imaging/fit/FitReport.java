package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.estimate.Solution;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.PointObservation;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StripLook;
import plumbray.raymodel.profile.ProfileFamily;

/** Makes a result of an adjustment. */
final class FitReport {

  private FitReport() {}

  static FitResult of(Sight sight, Adjusted adjusted, List<Alternative> alternatives) {
    Verdict verdict = new Verdict(sight, adjusted);
    if (verdict.error().isPresent()) {
      return FitResult.failed(sight, verdict.error().get());
    }
    SightParameters parameters = adjusted.observation().sightParameters();
    Solution solution = adjusted.solution();
    int n = parameters.parameters().size();
    double[] values = Arrays.copyOf(solution.values(), n);
    List<ReferenceReading> readings = readings(sight, adjusted);
    boolean anyStaff =
        adjusted.observation().references().stream().anyMatch(StaffObservation.class::isInstance);
    return new FitResult(
        verdict.status(),
        Optional.empty(),
        verdict.warnings(),
        sight,
        parameters.heldAt(values),
        Estimates.of(
            parameters.names(), values, covariance(parameters.parameters(), solution, anyStaff)),
        residuals(readings, solution),
        alternatives,
        readings,
        anyStaff ? adjusted.found().shimmer().sigmaPx() : 0.0);
  }

  /**
   * Covariance of the sight's quantities. Where only points were given and fit worse than they
   * should, the sigmas grow accordingly. A quantity that ended at a bound is not certain: it counts
   * as evenly spread between its bounds.
   */
  private static double[][] covariance(
      List<Parameter> parameters, Solution solution, boolean anyStaff) {
    double factor =
        anyStaff || solution.degreesOfFreedom() < 1
            ? 1.0
            : Math.max(1.0, solution.cost() / solution.degreesOfFreedom());
    int n = parameters.size();
    double[][] covariance = new double[n][n];
    double[][] all = solution.covariance();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        covariance[i][j] = all[i][j] * factor;
      }
      Parameter p = parameters.get(i);
      double width = p.highest() - p.lowest();
      if (solution.atBound().contains(p.name()) && Double.isFinite(width)) {
        covariance[i][i] = width * width / 12.0;
      }
    }
    return covariance;
  }

  private static Residuals residuals(List<ReferenceReading> readings, Solution solution) {
    int count = 0;
    double sum = 0.0;
    for (ReferenceReading reading : readings) {
      for (RowResidual row : reading.rows()) {
        sum += row.residualPx() * row.residualPx();
        count++;
      }
    }
    return new Residuals(
        count, Math.sqrt(sum / count), solution.cost(), solution.degreesOfFreedom());
  }

  static Alternative alternative(
      ProfileFamily family, double criterion, Sight sight, Adjusted adjusted) {
    double rms = residuals(readings(sight, adjusted), adjusted.solution()).rmsPx();
    return new Alternative(family, criterion, rms, new Verdict(sight, adjusted).status());
  }

  private static List<ReferenceReading> readings(Sight sight, Adjusted adjusted) {
    double[] values = adjusted.solution().values();
    FitTrace trace = adjusted.observation().trace(values, false);
    List<ReferenceObservation> references = adjusted.observation().references();
    List<ReferenceReading> readings = new ArrayList<>();
    int points = 0;
    int own = adjusted.observation().sightParameters().parameters().size();
    for (int r = 0; r < references.size(); r++) {
      if (references.get(r) instanceof StaffObservation staff) {
        readings.add(staff(sight, staff, trace, adjusted, r, own));
      } else if (references.get(r) instanceof PointObservation marks) {
        readings.add(points(pointName(sight, points++), marks, trace));
      }
      own += references.get(r).ownParameters().size();
    }
    return readings;
  }

  private static String pointName(Sight sight, int nth) {
    return sight.references().stream()
        .filter(r -> r.kind() instanceof PointTarget)
        .skip(nth)
        .findFirst()
        .orElseThrow()
        .name();
  }

  private static ReferenceReading staff(
      Sight sight,
      StaffObservation staff,
      FitTrace trace,
      Adjusted adjusted,
      int index,
      int firstOwn) {
    double[] own = adjusted.observation().own(adjusted.solution().values(), index);
    double[] sigmas = adjusted.solution().sigmas();
    List<RowResidual> rows = new ArrayList<>();
    List<EdgeImage> now = staff.scene().edges(trace);
    for (int d = 0; d < staff.edges().size(); d++) {
      EdgeImage edge = staff.edges().get(d);
      int at = d;
      now.stream()
          .filter(e -> e.edge() == edge.edge() && e.image() == edge.image())
          .findFirst()
          .ifPresent(
              e ->
                  rows.add(
                      new RowResidual(
                          e.heightM(),
                          e.sense(),
                          e.row() + own[1 + at],
                          e.row(),
                          sigmas[firstOwn + 1 + at])));
    }
    StripLook look = staff.look(trace, own);
    double[] observed = filled(staff.scene().strip().rows());
    double[] predicted = observed.clone();
    for (int i = 0; i < look.used().length; i++) {
      observed[look.used()[i]] = staff.scene().strip().brightness(look.used()[i]);
      predicted[look.used()[i]] = look.predicted()[i];
    }
    return new ReferenceReading(
        sight.references().get(staff.scene().reference()).name(),
        rows,
        Optional.of(
            new ReferenceReading.Strip(staff.scene().strip().firstRow(), observed, predicted)));
  }

  private static double[] filled(int n) {
    double[] a = new double[n];
    Arrays.fill(a, Double.NaN);
    return a;
  }

  private static ReferenceReading points(String name, PointObservation marks, FitTrace trace) {
    List<RowResidual> rows = new ArrayList<>();
    List<Optional<PointObservation.Seen>> seen = marks.seen(trace);
    for (int i = 0; i < seen.size(); i++) {
      if (seen.get(i).isPresent()) {
        PointMark mark = marks.marks().get(i);
        rows.add(
            new RowResidual(
                mark.heightM(),
                seen.get(i).get().branch().sense(),
                mark.pixel().v(),
                seen.get(i).get().row(),
                mark.sigmaPx()));
      }
    }
    return new ReferenceReading(name, rows, Optional.empty());
  }
}
