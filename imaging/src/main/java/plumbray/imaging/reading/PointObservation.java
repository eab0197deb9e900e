package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/**
 * Points of known height, pointed at in the picture: one residual each, the row observed less the
 * row predicted, over its standard deviation.
 *
 * <p>A mark whose height no ray brings is compared with the end of the image nearest to it in
 * height, and the height that is missing counts too, so that an adjustment can find its way back.
 */
public final class PointObservation implements ReferenceObservation {

  private static final double LEAST_SLOPE_SHARE = 0.01;

  /** Interpolation of the inverse may leave this much. */
  private static final double HIDDEN_PX = 1e-3;

  private final int reference;
  private final double distanceM;
  private final List<PointMark> marks;

  /** The marks of one reference, {@code index} being its place among the sight's references. */
  public PointObservation(int index, Reference reference, PointTarget target) {
    this.reference = index;
    this.distanceM = reference.distanceM();
    this.marks = List.copyOf(target.marks());
  }

  @Override
  public int count() {
    return marks.size();
  }

  @Override
  public List<Parameter> ownParameters() {
    return List.of();
  }

  @Override
  public void evaluate(TracedSight sight, double[] own, Rows into) {
    double[] byEstimate = new double[sight.estimateCount()];
    for (int i = 0; i < marks.size(); i++) {
      PointMark mark = marks.get(i);
      Optional<Seen> seen = seen(sight, mark);
      if (seen.isEmpty()) {
        into.set(i, Double.NaN);
        continue;
      }
      into.set(i, (mark.pixel().v() - seen.get().row()) / mark.sigmaPx());
      if (into.wantsJacobian()) {
        Seen at = seen.get();
        double least = at.hidden() ? 1.0 : LEAST_SLOPE_SHARE;
        sight.rowDerivatives(
            reference,
            new TracedSight.Place(at.branch(), at.apparentRad(), at.azimuthRad(), least),
            byEstimate);
        for (int k = 0; k < byEstimate.length; k++) {
          into.derivatives(i)[k] = -byEstimate[k] / mark.sigmaPx();
        }
      }
    }
  }

  /**
   * A mark as a sight shows it.
   *
   * @param branch the image
   * @param row row, px
   * @param apparentRad apparent elevation, rad
   * @param azimuthRad azimuth, rad
   * @param hidden whether no ray brings the mark, and the row is that of the image's end moved on
   *     by the height that is missing
   */
  public record Seen(
      Branch branch, double row, double apparentRad, double azimuthRad, boolean hidden) {}

  /** All marks as a sight shows them; empty entries where no ray arrives at all. */
  public List<Optional<Seen>> seen(TracedSight sight) {
    List<Optional<Seen>> all = new ArrayList<>();
    for (PointMark mark : marks) {
      all.add(seen(sight, mark));
    }
    return all;
  }

  /** The marks. */
  public List<PointMark> marks() {
    return marks;
  }

  private Optional<Seen> seen(TracedSight sight, PointMark mark) {
    Camera camera = sight.camera();
    double[] scratch = new double[2];
    camera.direction(mark.pixel().u(), mark.pixel().v(), scratch);
    double azimuth = scratch[1];
    double elevation = sight.footElevationM(reference) + mark.heightM();
    double beyond = distanceM * (1.0 / Math.cos(azimuth) - 1.0);
    SightMapping mapping = sight.mapping(distanceM);
    Seen best = null;
    double bestMiss = Double.POSITIVE_INFINITY;
    for (Branch branch : mapping.branches()) {
      if (!wanted(branch.sense(), mark.sense())) {
        continue;
      }
      double apparent = branch.apparentRad(elevation);
      apparent = branch.apparentRad(elevation - beyond * branch.pathSlope(apparent));
      double missing =
          elevation - branch.elevationM(apparent) - beyond * branch.pathSlope(apparent);
      camera.pixel(apparent, azimuth, scratch);
      double missingRows = missing / distanceM / camera.radPerPx();
      double row = scratch[1] - (branch.sense() == Sense.UPRIGHT ? missingRows : -missingRows);
      double miss = Math.abs(mark.pixel().v() - row) + Math.abs(missingRows);
      if (miss < bestMiss) {
        bestMiss = miss;
        best = new Seen(branch, row, apparent, azimuth, Math.abs(missingRows) > HIDDEN_PX);
      }
    }
    return Optional.ofNullable(best);
  }

  private static boolean wanted(Sense sense, SenseWanted wanted) {
    return switch (wanted) {
      case ANY -> true;
      case UPRIGHT -> sense == Sense.UPRIGHT;
      case INVERTED -> sense == Sense.INVERTED;
    };
  }
}
