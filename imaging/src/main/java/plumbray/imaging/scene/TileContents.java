package plumbray.imaging.scene;

import java.util.ArrayList;
import java.util.List;

/** Which things can be seen in a tile, so that most pixels are drawn with a single sample. */
final class TileContents {
  private final SeenScene seen;
  private final List<Layer> layers = new ArrayList<>();
  private final List<Layer.Placed> things = new ArrayList<>();
  private boolean even;
  private int firstNode;
  private int lastNode;
  private double leastTan;
  private double greatestTan;

  TileContents(SeenScene seen) {
    this.seen = seen;
  }

  int count() {
    return things.size();
  }

  Layer layer(int i) {
    return layers.get(i);
  }

  Layer.Placed thing(int i) {
    return things.get(i);
  }

  /** Whether the tile shows one surface only. */
  boolean isEven() {
    return even;
  }

  /**
   * Finds what can be seen.
   *
   * @param tile the tile
   * @param reachRad how far beyond its corners it is sampled (rad)
   */
  void find(Tile tile, double reachRad) {
    layers.clear();
    things.clear();
    firstNode = (int) seen.table().position(tile.lowestRad() - reachRad);
    lastNode = 1 + (int) seen.table().position(tile.highestRad() + reachRad);
    leastTan = tile.leastTanAzimuth() - 2 * reachRad;
    greatestTan = tile.greatestTanAzimuth() + 2 * reachRad;
    for (Layer layer : seen.layers()) {
      if (addThings(layer)) {
        even = things.size() == 1;
        return;
      }
    }
    even = things.isEmpty() && isBackdropEven();
  }

  /** Adds what the layer may show; true where it fills the tile, so that nothing farther shows. */
  private boolean addThings(Layer layer) {
    Extent box = box(layer.sheet());
    if (box == null) {
      return false;
    }
    boolean whole = isWhole(layer.sheet());
    for (Layer.Placed placed : layer.things()) {
      if (placed.extent().meets(box)) {
        layers.add(layer);
        things.add(placed);
        if (whole && placed.thing().shape().fills(box.loweredBy(placed.zeroM()))) {
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
    double aside = Math.max(Math.abs(leastTan), Math.abs(greatestTan));
    double fartherM = steepest * distanceM * (Math.sqrt(1 + aside * aside) - 1);
    return new Extent(
        distanceM * leastTan, distanceM * greatestTan, lowest - fartherM, highest + fartherM);
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
    double leftM = leastTan * (leastTan < 0 ? farthestM : nearestM);
    double rightM = greatestTan * (greatestTan > 0 ? farthestM : nearestM);
    double aside = Math.max(Math.abs(leastTan), Math.abs(greatestTan));
    Extent box = new Extent(leftM, rightM, nearestM / Math.sqrt(1 + aside * aside), farthestM);
    for (Backdrop.Patch patch : seen.scene().backdrop().ground().patches()) {
      Extent area = new Extent(patch.leftM(), patch.rightM(), patch.fromM(), patch.toM());
      if (area.meets(box) && !area.holds(box)) {
        return false;
      }
    }
    return true;
  }
}
