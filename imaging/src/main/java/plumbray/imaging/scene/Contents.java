package plumbray.imaging.scene;

import java.util.ArrayList;
import java.util.List;

/** Which things can be seen in a window, so that most pixels are drawn with a single sample. */
final class Contents {
  private final SeenScene seen;
  private final List<Placed> things = new ArrayList<>();
  private boolean even;
  private Window window;
  private int firstNode;
  private int lastNode;

  Contents(SeenScene seen) {
    this.seen = seen;
  }

  /** What can be seen, nearest first. */
  List<Placed> things() {
    return things;
  }

  /** Whether the window shows one surface only. */
  boolean isEven() {
    return even;
  }

  /**
   * Finds what can be seen.
   *
   * @param candidates the things that may be, nearest first
   * @param where the directions
   */
  void find(List<Placed> candidates, Window where) {
    things.clear();
    window = where;
    firstNode = (int) seen.table().position(where.lowestRad());
    lastNode = 1 + (int) seen.table().position(where.highestRad());
    even = findThings(candidates) ? things.size() == 1 : things.isEmpty() && isBackdropEven();
  }

  /** Lists the things down to one that fills the window, and says whether there is such a one. */
  private boolean findThings(List<Placed> candidates) {
    ElevationTable.Sheet sheet = null;
    Extent box = null;
    boolean whole = false;
    for (int i = 0; i < candidates.size(); i++) {
      Placed placed = candidates.get(i);
      if (placed.sheet() != sheet) {
        sheet = placed.sheet();
        box = box(sheet);
        whole = isWhole(sheet);
      }
      if (box != null && placed.mayMeet(box)) {
        things.add(placed);
        if (whole && placed.fills(box)) {
          return true;
        }
      }
    }
    return false;
  }

  private boolean isWhole(ElevationTable.Sheet sheet) {
    for (int i = firstNode; i <= lastNode; i++) {
      if (Double.isNaN(sheet.elevationM()[i])) {
        return false;
      }
    }
    return true;
  }

  private Extent box(ElevationTable.Sheet sheet) {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    double steepest = 0;
    for (int i = firstNode; i <= lastNode; i++) {
      double elevationM = sheet.elevationM()[i];
      if (!Double.isNaN(elevationM)) {
        lowest = Math.min(lowest, elevationM);
        highest = Math.max(highest, elevationM);
        steepest = Math.max(steepest, Math.abs(sheet.pathSlope()[i]));
      }
    }
    if (lowest > highest) {
      return null;
    }
    double distanceM = sheet.distanceM();
    double aside = window.widestTan();
    double fartherM = steepest * distanceM * (Math.sqrt(1 + aside * aside) - 1);
    return new Extent(
        distanceM * window.leastTan(),
        distanceM * window.greatestTan(),
        lowest - fartherM,
        highest + fartherM);
  }

  private boolean isBackdropEven() {
    boolean ground = seen.table().groundAtNode(firstNode);
    double nearest = 0;
    double farthest = Double.POSITIVE_INFINITY;
    for (int i = firstNode; i <= lastNode; i++) {
      if (seen.table().groundAtNode(i) != ground) {
        return false;
      }
      double inverse = seen.table().inverseGroundPerM(i);
      nearest = Math.max(nearest, inverse);
      farthest = Math.min(farthest, inverse);
    }
    return !ground || isGroundEven(1 / nearest, 1 / farthest);
  }

  private boolean isGroundEven(double nearestM, double farthestM) {
    double left = window.leastTan();
    double right = window.greatestTan();
    double aside = window.widestTan();
    Extent box =
        new Extent(
            left * (left < 0 ? farthestM : nearestM),
            right * (right > 0 ? farthestM : nearestM),
            nearestM / Math.sqrt(1 + aside * aside),
            farthestM);
    for (Backdrop.Patch patch : seen.scene().backdrop().ground().patches()) {
      Extent area = new Extent(patch.leftM(), patch.rightM(), patch.fromM(), patch.toM());
      if (area.meets(box) && !area.holds(box)) {
        return false;
      }
    }
    return true;
  }
}
