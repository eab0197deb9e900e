package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.reading.PointObservation;
import plumbray.imaging.reading.StaffScene;

/**
 * Looks for starts: for each profile of a coarse grid the staffs' pattern is traced once, and slid
 * along the strips; a change of pitch moves it as a whole.
 */
final class StartSearch {

  private static final double TOLERANCE_PX = 0.3;
  private static final double PRIOR_REACH = 4.0;
  private static final double POINT_SPREAD_PX = 1.5;
  private static final double POINT_CAP = 25.0;

  private final Sight sight;
  private final References references;
  private final Camera camera;
  private final int reachRows;
  private final int step;

  StartSearch(Sight sight, References references) {
    this.sight = sight;
    this.references = references;
    camera = sight.camera().camera();
    reachRows = reachRows();
    step = step();
  }

  /**
   * A start.
   *
   * @param profile values of the profile, in its family's order
   * @param pitchShiftRad what to add to the pitch, rad
   * @param score smaller is better
   */
  record Start(double[] profile, double pitchShiftRad, double score) {}

  /** The best starts, best first, at most {@code count}. */
  List<Start> best(int count) {
    List<Start> starts = new ArrayList<>();
    for (double[] values : FamilyStarts.of(sight.profile())) {
      try {
        starts.addAll(slide(values));
      } catch (IllegalArgumentException impossible) {
        // a profile that air cannot have is no start
        continue;
      }
    }
    starts.sort(Comparator.comparingDouble(Start::score));
    return starts.subList(0, Math.min(count, starts.size()));
  }

  private int reachRows() {
    Quantity pitch = sight.camera().pitchRad();
    if (!pitch.estimated()) {
      return 0;
    }
    double reach =
        pitch.hasPrior() ? PRIOR_REACH * pitch.sigma() : camera.heightPx() * camera.radPerPx();
    double bounded =
        Math.max(
            Math.min(reach, pitch.value() - pitch.lowest()),
            Math.min(reach, pitch.highest() - pitch.value()));
    return (int) Math.ceil(Math.min(bounded / camera.radPerPx(), 2.0 * camera.heightPx()));
  }

  /** Rows per step of the slide: coarse for long strips, but fine enough to see the bars. */
  private int step() {
    int wanted = 1 + reachRows / 600;
    double finest = 12.0;
    for (StaffScene staff : references.staffs()) {
      wanted = Math.max(wanted, 1 + staff.strip().rows() / 400);
      double distance = sight.references().get(staff.reference()).distanceM();
      finest = Math.min(finest, 0.3 * staff.meanBarM() / distance / camera.radPerPx());
    }
    return (int) Math.max(1, Math.min(wanted, finest));
  }

  private List<Start> slide(double[] values) {
    FitTrace trace = FitTrace.of(at(values), List.of(), range(), TOLERANCE_PX);
    int steps = reachRows / step;
    double[] score = new double[2 * steps + 1];
    for (StaffScene staff : references.staffs()) {
      StripSlide slide = new StripSlide(staff, trace, steps, step);
      for (int i = 0; i < score.length; i++) {
        score[i] += slide.score(i - steps);
      }
    }
    for (PointObservation points : references.points()) {
      addPoints(points, trace, score, steps);
    }
    Quantity pitch = sight.camera().pitchRad();
    for (int i = 0; i < score.length; i++) {
      double shift = (i - steps) * step * camera.radPerPx();
      double at = pitch.value() + shift;
      if (at < pitch.lowest() || at > pitch.highest()) {
        score[i] = Double.POSITIVE_INFINITY;
      } else if (pitch.hasPrior()) {
        score[i] += shift * shift / (pitch.sigma() * pitch.sigma());
      }
    }
    return twoBest(values, score, steps);
  }

  private List<Start> twoBest(double[] values, double[] score, int steps) {
    int first = lowest(score, -1);
    int second = lowest(score, first);
    List<Start> found = new ArrayList<>();
    for (int i : new int[] {first, second}) {
      if (i >= 0 && Double.isFinite(score[i])) {
        found.add(new Start(values, (i - steps) * step * camera.radPerPx(), score[i]));
      }
    }
    return found;
  }

  /** Index of the lowest score that is not next to {@code not}. */
  private static int lowest(double[] score, int not) {
    int best = -1;
    for (int i = 0; i < score.length; i++) {
      boolean free = not < 0 || Math.abs(i - not) > 3;
      if (free && (best < 0 || score[i] < score[best])) {
        best = i;
      }
    }
    return best;
  }

  private Sight at(double[] values) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    int i = 0;
    for (Map.Entry<String, Quantity> e : sight.profile().quantities().entrySet()) {
      quantities.put(e.getKey(), Quantity.held(values[i++]));
    }
    return sight.withProfile(
        new ProfileSetup(sight.profile().family(), quantities, sight.profile().stability()));
  }

  private double[] range() {
    double[] range = SightOptics.elevationRange(camera);
    double reach = (reachRows + 100) * camera.radPerPx();
    return new double[] {Math.max(-1.5, range[0] - reach), Math.min(1.5, range[1] + reach)};
  }

  private void addPoints(PointObservation points, FitTrace trace, double[] score, int steps) {
    List<PointMark> marks = points.marks();
    List<Optional<PointObservation.Seen>> seen = points.seen(trace);
    for (int m = 0; m < marks.size(); m++) {
      double variance =
          marks.get(m).sigmaPx() * marks.get(m).sigmaPx()
              + POINT_SPREAD_PX * POINT_SPREAD_PX
              + step * step / 3.0;
      for (int i = 0; i < score.length; i++) {
        double add = POINT_CAP;
        if (seen.get(m).isPresent()) {
          double miss =
              marks.get(m).pixel().v() - seen.get(m).get().row() - (i - steps) * (double) step;
          add = Math.min(POINT_CAP, miss * miss / variance);
        }
        score[i] += add;
      }
    }
  }
}
