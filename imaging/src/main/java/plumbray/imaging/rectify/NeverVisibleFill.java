package plumbray.imaging.rectify;

import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

/**
 * Fills what no ray brings with the tone of what was restored above and below it, going over from
 * one to the other. The tones are averaged over many columns, so that nothing looks like detail.
 */
final class NeverVisibleFill {
  /** Columns averaged on either side. */
  private static final int BLUR_PX = 48;

  /** Restored rows averaged above and below. */
  private static final int EDGE_ROWS = 6;

  private final MaskPlane mask;
  private final PhotoBuilder picture;
  private final PhotoShape shape;

  /** For each column, first row of the run being filled, and the row after its last; -1: none. */
  private final int[] starts;

  private final int[] ends;

  NeverVisibleFill(MaskPlane mask, PhotoBuilder picture, PhotoShape shape) {
    this.mask = mask;
    this.picture = picture;
    this.shape = shape;
    this.starts = new int[mask.widthPx()];
    this.ends = new int[mask.widthPx()];
  }

  /** Fills the first run of every column, then the second, and so on while there are any. */
  void fill() {
    while (findNextRuns()) {
      EdgeTones above = new EdgeTones(shape.channels(), mask.widthPx());
      EdgeTones below = new EdgeTones(shape.channels(), mask.widthPx());
      for (int x = 0; x < starts.length; x++) {
        if (starts[x] >= 0) {
          gather(above, x, starts[x] - 1, -1);
          gather(below, x, ends[x], 1);
        }
      }
      paint(above.blurred(BLUR_PX), below.blurred(BLUR_PX));
    }
  }

  private boolean findNextRuns() {
    boolean found = false;
    for (int x = 0; x < starts.length; x++) {
      int y = ends[x];
      while (y < mask.heightPx() && mask.at(x, y) != MaskPlane.NEVER_VISIBLE) {
        y++;
      }
      starts[x] = y < mask.heightPx() ? y : -1;
      while (y < mask.heightPx() && mask.at(x, y) == MaskPlane.NEVER_VISIBLE) {
        y++;
      }
      ends[x] = y;
      found |= starts[x] >= 0;
    }
    return found;
  }

  /** Takes in the nearest restored rows above (step -1) or below (step 1), a few at most. */
  private void gather(EdgeTones tones, int x, int firstRow, int step) {
    int taken = 0;
    for (int y = firstRow; y >= 0 && y < mask.heightPx() && taken < EDGE_ROWS; y += step) {
      int code = mask.at(x, y);
      if (code == MaskPlane.UPRIGHT || code == MaskPlane.INVERTED) {
        take(tones, x, y);
        taken++;
      } else if (taken > 0) {
        return;
      }
    }
  }

  private void take(EdgeTones tones, int x, int y) {
    for (int c = 0; c < shape.channels(); c++) {
      tones.add(x, c, picture.sample(x, y, c));
    }
    tones.count(x);
  }

  private void paint(EdgeTones above, EdgeTones below) {
    for (int x = 0; x < starts.length; x++) {
      if (starts[x] >= 0) {
        paintRun(x, above, below);
      }
    }
  }

  private void paintRun(int x, EdgeTones above, EdgeTones below) {
    int rows = ends[x] - starts[x];
    for (int c = 0; c < shape.channels(); c++) {
      double middle = above.mean(c, below.mean(c, 0.5 * shape.highestSample()));
      double first = above.tone(x, c, below.tone(x, c, middle));
      double last = below.tone(x, c, first);
      for (int i = 0; i < rows; i++) {
        double share = (i + 0.5) / rows;
        long value = Math.round(first + share * (last - first));
        picture.sample(x, starts[x] + i, c, (int) value);
      }
    }
  }
}
