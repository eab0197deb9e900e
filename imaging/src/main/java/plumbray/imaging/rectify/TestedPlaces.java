package plumbray.imaging.rectify;

import java.util.Arrays;

/**
 * The places at which outlines were asked about since the last {@link #clear}, as one box for each
 * region: an outline that does not cut the box gives one answer all over it.
 */
final class TestedPlaces {
  /** Room around the box, px, for what the map does between the places. */
  private static final double ROOM_PX = 1;

  private final double[][] boxes;

  TestedPlaces(int regions) {
    boxes = new double[regions][4];
    clear();
  }

  void clear() {
    for (double[] box : boxes) {
      Arrays.fill(box, Double.NaN);
    }
  }

  void add(int region, double u, double v) {
    double[] box = boxes[region];
    boolean fresh = Double.isNaN(box[0]);
    box[0] = fresh ? u - ROOM_PX : Math.min(box[0], u - ROOM_PX);
    box[1] = fresh ? v - ROOM_PX : Math.min(box[1], v - ROOM_PX);
    box[2] = fresh ? u + ROOM_PX : Math.max(box[2], u + ROOM_PX);
    box[3] = fresh ? v + ROOM_PX : Math.max(box[3], v + ROOM_PX);
  }

  /** Whether the outline may answer differently at places of the region. */
  boolean isCut(int region, Outline outline) {
    return !Double.isNaN(boxes[region][0]) && outline.cuts(boxes[region]);
  }
}
