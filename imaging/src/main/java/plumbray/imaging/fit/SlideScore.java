package plumbray.imaging.fit;

import java.util.ArrayList;
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
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * Scores profiles by how well the references fit once the picture is slid up or down: the staffs'
 * pattern is traced once a profile and moved along the strips, as a change of pitch does.
 */
final class SlideScore {

  private static final double TOLERANCE_PX = 0.3;
  private static final double PRIOR_REACH = 4.0;
  private static final double POINT_SPREAD_PX = 1.5;
  private static final double POINT_CAP = 25.0;

  /** A point on a tracked edge may stray this far before it counts no more, in its spread. */
  private final double pointCap;

  private final Sight sight;
  private final References references;
  private final Camera camera;
  private final int reachRows;
  private final int coarseStep;

  SlideScore(Sight sight, References references) {
    this(sight, references, POINT_CAP);
  }

  SlideScore(Sight sight, References references, double pointCap) {
    this.sight = sight;
    this.references = references;
    this.pointCap = pointCap;
    camera = sight.camera().camera();
    reachRows = reachRows();
    coarseStep = step();
  }

  /**
   * A start.
   *
   * @param profile the profile, all quantities held
   * @param pitchShiftRad what to add to the pitch, rad
   * @param score smaller is better
   */
  record Start(ProfileSetup profile, double pitchShiftRad, double score) {}

  /**
   * Shifts to try.
   *
   * @param centre shift in the middle, in steps
   * @param steps how many steps to either side
   * @param step rows a step
   */
  record Slide(int centre, int steps, int step) {

    int shift(int i) {
      return centre + i - steps;
    }
  }

  /** All shifts that the pitch may make, coarsely. */
  Slide everywhere() {
    return new Slide(0, reachRows / coarseStep, coarseStep);
  }

  /** What the logarithm of the unexplained share of all strips is multiplied with in a score. */
  double weight() {
    return references.staffs().stream()
        .mapToDouble(s -> s.strip().rows() / StripSlide.DEPENDENT_ROWS)
        .sum();
  }

  /** A bar and a little more, rows; a dozen where there are no bars. */
  int barRows() {
    double rows = 12.0;
    for (StaffScene staff : references.staffs()) {
      double distance = sight.references().get(staff.reference()).distanceM();
      rows = Math.max(rows, 1.3 * staff.meanBarM() / distance / camera.radPerPx());
    }
    return (int) Math.min(60.0, rows);
  }

  /** Shifts near one. */
  Slide near(double pitchShiftRad, int rows) {
    int centre = (int) Math.round(pitchShiftRad / camera.radPerPx());
    return new Slide(centre, reachRows == 0 ? 0 : rows + 2 * coarseStep, 1);
  }

  /** The profile of a family at values of its own, all held. */
  ProfileSetup profile(ProfileFamily family, double[] values) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    int i = 0;
    for (ProfileParameter p : family.parameters()) {
      quantities.put(p.key(), Quantity.held(values[i++]));
    }
    return new ProfileSetup(Optional.of(family), quantities, sight.profile().stability());
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

  /** The best start of a profile within each of some slides; none where air cannot be so. */
  List<Start> starts(ProfileSetup profile, List<Slide> slides) {
    FitTrace trace;
    try {
      trace = FitTrace.of(sight.withProfile(profile), List.of(), range(slides), TOLERANCE_PX);
    } catch (IllegalArgumentException impossible) {
      return List.of();
    }
    List<Start> found = new ArrayList<>();
    for (Slide slide : slides) {
      best(profile, trace, slide).ifPresent(found::add);
    }
    return found;
  }

  private Optional<Start> best(ProfileSetup profile, FitTrace trace, Slide slide) {
    double[] score = new double[2 * slide.steps() + 1];
    for (StaffScene staff : references.staffs()) {
      int around = Math.abs(slide.centre()) + slide.steps();
      StripSlide strip = new StripSlide(staff, trace, around, slide.step());
      for (int i = 0; i < score.length; i++) {
        score[i] += strip.score(slide.shift(i));
      }
    }
    for (PointObservation points : references.points()) {
      addPoints(points, trace, score, slide);
    }
    addPitch(score, slide);
    int best = 0;
    for (int i = 1; i < score.length; i++) {
      best = score[i] < score[best] ? i : best;
    }
    double shift = slide.shift(best) * slide.step() * camera.radPerPx();
    return Double.isFinite(score[best])
        ? Optional.of(new Start(profile, shift, score[best]))
        : Optional.empty();
  }

  private void addPitch(double[] score, Slide slide) {
    Quantity pitch = sight.camera().pitchRad();
    for (int i = 0; i < score.length; i++) {
      double shift = slide.shift(i) * slide.step() * camera.radPerPx();
      double at = pitch.value() + shift;
      if (at < pitch.lowest() || at > pitch.highest()) {
        score[i] = Double.POSITIVE_INFINITY;
      } else if (pitch.hasPrior()) {
        score[i] += shift * shift / (pitch.sigma() * pitch.sigma());
      }
    }
  }

  private double[] range(List<Slide> slides) {
    double[] range = SightOptics.elevationRange(camera);
    int reach = 100;
    for (Slide slide : slides) {
      reach = Math.max(reach, 100 + (Math.abs(slide.centre()) + slide.steps()) * slide.step());
    }
    double rad = reach * camera.radPerPx();
    return new double[] {Math.max(-1.5, range[0] - rad), Math.min(1.5, range[1] + rad)};
  }

  private void addPoints(PointObservation points, FitTrace trace, double[] score, Slide slide) {
    List<PointMark> marks = points.marks();
    List<Optional<PointObservation.Seen>> seen = points.seen(trace);
    for (int m = 0; m < marks.size(); m++) {
      double variance =
          marks.get(m).sigmaPx() * marks.get(m).sigmaPx()
              + POINT_SPREAD_PX * POINT_SPREAD_PX
              + slide.step() * slide.step() / 3.0;
      for (int i = 0; i < score.length; i++) {
        double add = pointCap;
        if (seen.get(m).isPresent()) {
          double shift = slide.shift(i) * (double) slide.step();
          double miss = marks.get(m).pixel().v() - seen.get(m).get().row() - shift;
          add = Math.min(pointCap, miss * miss / variance);
        }
        score[i] += add;
      }
    }
  }
}
