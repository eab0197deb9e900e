package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.StaffTarget;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;

/** A staff and the strip of the photo in which it is seen. */
public final class StaffScene {

  /** Share of a strip's row that must be bars, or lie this near to one, for the row to count. */
  private static final double BORDER_PX = 6.0;

  /** Rows to either side of the ground's edge that show it. */
  public static final double GROUND_BORDER_PX = 8.0;

  /** Number of the edge where the ground begins. */
  public static final int GROUND_EDGE = StripEvent.LOWER_END;

  private final String name;
  private final StaffBars bars;
  private final StaffStrip strip;
  private final StaffPlace place;

  /** A staff, {@code index} being its place among the sight's references. */
  public StaffScene(int index, Reference reference, StaffTarget target, StaffStrip strip) {
    name = "references[" + index + "]";
    bars = new StaffBars(target);
    this.strip = strip;
    place = new StaffPlace(index, reference.distanceM());
  }

  String name() {
    return name;
  }

  StaffBars bars() {
    return bars;
  }

  /** The strip. */
  public StaffStrip strip() {
    return strip;
  }

  /** Indices of all of the strip's values. */
  public int[] allRows() {
    return IntStream.range(0, strip.rows()).toArray();
  }

  /** Height of a bar of average size, m. */
  public double meanBarM() {
    int last = bars.edgeCount() - 1;
    return (bars.edgeM(last) - bars.edgeM(0)) / last;
  }

  StaffPlace place() {
    return place;
  }

  /** Index of the reference. */
  public int reference() {
    return place.reference();
  }

  double azimuthRad(Camera camera) {
    double[] direction = new double[2];
    camera.direction(strip.columnPx(), strip.firstRow() + 0.5 * (strip.rows() - 1), direction);
    return direction[1];
  }

  /** The edges that a sight shows within the strip, by rising row. */
  public List<EdgeImage> edges(TracedSight sight) {
    List<EdgeImage> seen = new ArrayList<>();
    for (StripEvent event : StripEvents.of(bars, strip, sight, place, new int[1])) {
      if (event.branch().isPresent()
          && event.row() >= strip.firstRow()
          && event.row() <= strip.firstRow() + strip.rows() - 1) {
        Branch branch = event.branch().get();
        seen.add(
            new EdgeImage(
                event.edge(),
                bars.edgeM(event.edge()),
                event.image(),
                branch.sense(),
                event.row(),
                step(event),
                Math.abs(branch.slopeMPerRad(event.apparentRad())) / place.distanceM()));
      }
    }
    return seen;
  }

  /**
   * The edges of the ground that cut off inverted images, within the strip, as a sight predicts
   * them; as edges of number {@link #GROUND_EDGE}.
   */
  public List<EdgeImage> groundEdges(TracedSight sight) {
    List<Branch> branches = sight.mapping(place.distanceM()).branches();
    List<EdgeImage> ends = new ArrayList<>();
    for (StripEvent event : StripEvents.of(bars, strip, sight, place, new int[1])) {
      if (event.edge() == GROUND_EDGE
          && event.row() >= strip.firstRow()
          && event.row() <= strip.firstRow() + strip.rows() - 1) {
        Sense sense = branches.get(branches.size() - 1 - event.image()).sense();
        if (sense == Sense.INVERTED) {
          ends.add(
              new EdgeImage(event.edge(), Double.NaN, event.image(), sense, event.row(), 0, 1));
        }
      }
    }
    return ends;
  }

  /**
   * Derivatives, by the estimated quantities, of the row in which the ground cuts off an image.
   *
   * @return whether they are known
   */
  public boolean groundEdgeDerivatives(TracedSight sight, int image, double[] out) {
    return StripEvents.of(bars, strip, sight, place, new int[1]).stream()
        .filter(e -> e.edge() == GROUND_EDGE && e.image() == image)
        .anyMatch(e -> sight.endDerivatives(e.apparentRad(), azimuthRad(sight.camera()), out));
  }

  private int step(StripEvent event) {
    if (!bars.isBar(event.above()) || !bars.isBar(event.below())) {
      return 0;
    }
    return bars.isDark(event.below()) ? -1 : 1;
  }

  /**
   * The staff's edges as points, where the strip shows edges of the right kind in the right order.
   *
   * @param sight the sight
   * @param relabel what the seen edges are taken to be
   * @param reachPx how far from where the sight puts it an edge may be before it is left out, px
   * @param sigmaPx standard deviation to give the points, px
   */
  public List<PointMark> matched(
      TracedSight sight, Relabel relabel, double reachPx, double sigmaPx) {
    List<StripEdges.Edge> seen = StripEdges.of(strip);
    List<EdgeImage> wanted = edges(sight);
    int[] partners = EdgeAlignment.partners(wanted, seen, reachPx);
    List<PointMark> marks = new ArrayList<>();
    for (int i = 0; i < partners.length; i++) {
      int edge = relabel.of(i, wanted.get(i));
      if (partners[i] >= 0 && edge >= 0 && edge < bars.edgeCount()) {
        boolean upright = wanted.get(i).sense() == Sense.UPRIGHT;
        marks.add(
            new PointMark(
                bars.edgeM(edge),
                new PixelPoint(strip.columnPx(), seen.get(partners[i]).row()),
                sigmaPx,
                upright ? SenseWanted.UPRIGHT : SenseWanted.INVERTED));
      }
    }
    return marks;
  }

  /**
   * The staff's edges as points where the strip alone, without any idea of the air, tells which
   * edge is which; the best ways to read it, best first, none where it does not tell.
   *
   * @param nominalMPerPx metres a row where rays are straight
   * @param sigmaPx standard deviation to give the points, px
   */
  public List<List<PointMark>> trails(double nominalMPerPx, double sigmaPx) {
    List<StripEdges.Edge> seen = StripEdges.of(strip);
    return EdgeTrail.of(bars, seen, nominalMPerPx).stream()
        .map(trail -> trail.stream().map(step -> mark(step, seen, sigmaPx)).toList())
        .toList();
  }

  private PointMark mark(EdgeTrail.Step step, List<StripEdges.Edge> seen, double sigmaPx) {
    return new PointMark(
        bars.edgeM(step.edge()),
        new PixelPoint(strip.columnPx(), seen.get(step.seen()).row()),
        sigmaPx,
        step.upright() ? SenseWanted.UPRIGHT : SenseWanted.INVERTED);
  }

  /** Indices of the strip's values that show bars, or lie next to some, through a sight. */
  public int[] rowsInUse(TracedSight sight) {
    return rowsInUse(sight, List.of(), GROUND_BORDER_PX);
  }

  /**
   * Indices of the strip's values that show bars, or lie next to some, through a sight; those near
   * the ground's edges too where these were found.
   *
   * @param found edges of the ground that were found
   * @param reachPx how near to one, px
   */
  public int[] rowsInUse(TracedSight sight, List<GroundEdge> found, double reachPx) {
    int[] top = new int[1];
    List<StripEvent> events = StripEvents.of(bars, strip, sight, place, top);
    boolean[] use = new boolean[strip.rows()];
    int what = top[0];
    double from = strip.firstRow();
    for (StripEvent event : events) {
      mark(use, what, from, event.row());
      what = event.below();
      from = event.row();
    }
    mark(use, what, from, strip.firstRow() + strip.rows());
    events.stream()
        .filter(e -> e.branch().isEmpty() && e.edge() != StripEvent.APART)
        .filter(
            e ->
                e.edge() != GROUND_EDGE
                    || found.stream().noneMatch(ground -> ground.image() == e.image()))
        .forEach(e -> set(use, e.row(), GROUND_BORDER_PX, false));
    found.forEach(ground -> set(use, ground.row(), reachPx, true));
    return IntStream.range(0, use.length).filter(i -> use[i]).toArray();
  }

  /** What is next to the ground's edge counts only where the edge itself was found. */
  private void set(boolean[] use, double row, double reachPx, boolean value) {
    int first = (int) Math.max(0, Math.ceil(row - reachPx - strip.firstRow()));
    int last = (int) Math.min(use.length - 1, Math.floor(row + reachPx - strip.firstRow()));
    for (int i = first; i <= last; i++) {
      use[i] = value;
    }
  }

  private void mark(boolean[] use, int what, double from, double to) {
    if (bars.isBar(what)) {
      int first = (int) Math.max(0, Math.ceil(from - BORDER_PX - strip.firstRow()));
      int last = (int) Math.min(use.length - 1, Math.floor(to + BORDER_PX - strip.firstRow()));
      for (int i = first; i <= last; i++) {
        use[i] = true;
      }
    }
  }

  /**
   * The pattern that a sight shows: for each row of the strip the share of bright less dark bars.
   */
  public BarShares shares(TracedSight sight, int rowsAround) {
    int[] top = new int[1];
    StaffStrip wide = strip.widened(rowsAround);
    List<StripEvent> events = StripEvents.of(bars, wide, sight, place, top);
    BarShares shares = new BarShares(wide.firstRow(), wide.rows());
    int what = top[0];
    double from = wide.firstRow() - 0.5;
    for (StripEvent event : events) {
      shares.add(from, event.row(), bars.isBar(what), bars.isBar(what) && bars.isDark(what));
      what = event.below();
      from = event.row();
    }
    shares.add(
        from,
        wide.firstRow() + wide.rows() - 0.5,
        bars.isBar(what),
        bars.isBar(what) && bars.isDark(what));
    return shares;
  }
}
