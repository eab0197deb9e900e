package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.camera.Camera;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;
import plumbray.raymodel.mapping.SightMapping;

/** All edges of a staff in all images, down a strip, as a sight predicts them. */
final class StripEvents {

  private static final double MARGIN_PX = 40.0;

  /** Well above the rows that show the ground's edge. */
  private static final double APART_PX = 20.0;

  private final StaffBars bars;
  private final double columnPx;
  private final double shear;
  private final double topRow;
  private final double bottomRow;
  private final List<StripEvent> events = new ArrayList<>();
  private Camera camera;
  private double azimuthRad;
  private double beyondM;
  private double footM;
  private int current;

  private StripEvents(StaffBars bars, StaffStrip strip) {
    this.bars = bars;
    columnPx = strip.columnPx();
    shear = strip.shear();
    topRow = strip.firstRow() - MARGIN_PX;
    bottomRow = strip.firstRow() + strip.rows() - 1 + MARGIN_PX;
  }

  /** The events of a strip, by rising row; {@code what[0]} receives what is seen at the top. */
  static List<StripEvent> of(
      StaffBars bars, StaffStrip strip, TracedSight sight, StaffPlace place, int[] what) {
    StripEvents walk = new StripEvents(bars, strip);
    walk.run(sight, place, what);
    return walk.events;
  }

  private void run(TracedSight sight, StaffPlace place, int[] what) {
    camera = sight.camera();
    double[] direction = new double[2];
    double middle = 0.5 * (topRow + bottomRow);
    camera.direction(columnPx, middle, direction);
    azimuthRad = direction[1];
    beyondM = place.distanceM() * (1.0 / Math.cos(azimuthRad) - 1.0);
    footM = sight.footElevationM(place.reference());
    camera.direction(columnPx, topRow, direction);
    double top = direction[0];
    camera.direction(columnPx, bottomRow, direction);
    double bottom = direction[0];
    SightMapping mapping = sight.mapping(place.distanceM());
    List<Branch> branches = mapping.branches();
    current = StaffBars.GROUND;
    boolean begun = false;
    for (int i = branches.size() - 1; i >= 0; i--) {
      Branch branch = branches.get(i);
      if (branch.lowestRad() >= top) {
        continue;
      }
      if (branch.highestRad() <= bottom) {
        break;
      }
      double from = Math.min(top, branch.highestRad());
      double to = Math.max(bottom, branch.lowestRad());
      int seen = bars.at(elevation(branch, from) - footM);
      if (!begun && branch.highestRad() >= top) {
        what[0] = seen;
        current = seen;
      } else if (!touches(branches, i)) {
        if (!begun) {
          what[0] = StaffBars.GROUND;
        }
        end(StripEvent.UPPER_END, from, branches.size() - 1 - i, seen);
      }
      begun = true;
      cross(branch, from, to, branches.size() - 1 - i);
      if (to > bottom && !touches(branches, i - 1)) {
        end(StripEvent.LOWER_END, to, branches.size() - 1 - i, StaffBars.GROUND);
      }
    }
    if (!begun) {
      what[0] = StaffBars.GROUND;
    }
  }

  /** Whether branch {@code i} and the next higher one meet. */
  private static boolean touches(List<Branch> branches, int i) {
    return i >= 0
        && i + 1 < branches.size()
        && branches.get(i).highestRad() == branches.get(i + 1).lowestRad();
  }

  private double elevation(Branch branch, double apparentRad) {
    return branch.elevationM(apparentRad) + beyondM * branch.pathSlope(apparentRad);
  }

  /** Adds the edges between two directions of a branch, going down. */
  private void cross(Branch branch, double from, double to, int image) {
    double start = elevation(branch, from) - footM;
    double end = elevation(branch, to) - footM;
    boolean upright = branch.sense() == Sense.UPRIGHT;
    int n = bars.edgeCount();
    for (int k = 0; k < n; k++) {
      int edge = upright ? n - 1 - k : k;
      double height = bars.edgeM(edge);
      boolean inside = upright ? height <= start && height > end : height >= start && height < end;
      if (inside) {
        double apparent = apparent(branch, footM + height);
        int next = upright ? edge - 1 : edge;
        add(apparent, edge, Optional.of(branch), image, next);
      }
    }
  }

  private double apparent(Branch branch, double elevationM) {
    double apparent = branch.apparentRad(elevationM);
    for (int i = 0; i < 2; i++) {
      apparent = branch.apparentRad(elevationM - beyondM * branch.pathSlope(apparent));
    }
    return apparent;
  }

  private void end(int end, double apparentRad, int image, int next) {
    double[] pixel = new double[2];
    camera.pixel(apparentRad, azimuthRad, pixel);
    double row = pixel[1] - shear * (pixel[0] - columnPx) - APART_PX;
    boolean last = events.isEmpty() || events.get(events.size() - 1).row() < row;
    if (end == StripEvent.LOWER_END && !bars.isBar(current) && last) {
      // what is seen next to the ground need not look as what is next to the bars
      events.add(
          new StripEvent(
              row, StripEvent.APART, Optional.empty(), image, Double.NaN, current, current));
    }
    add(apparentRad, end, Optional.empty(), image, next);
  }

  private void add(double apparentRad, int edge, Optional<Branch> branch, int image, int next) {
    double[] pixel = new double[2];
    camera.pixel(apparentRad, azimuthRad, pixel);
    double row = pixel[1] - shear * (pixel[0] - columnPx);
    events.add(new StripEvent(row, edge, branch, image, apparentRad, current, next));
    current = next;
  }
}
