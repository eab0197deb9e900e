package plumbray.imaging.rectify;

import java.util.Arrays;
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

  /** Row by row, as the mask lies in memory. */
  private boolean findNextRuns() {
    int[] from = ends.clone();
    Arrays.fill(starts, -1);
    Arrays.fill(ends, mask.heightPx());
    boolean found = false;
    for (int y = 0; y < mask.heightPx(); y++) {
      for (int x = 0; x < starts.length; x++) {
        boolean never = mask.at(x, y) == MaskPlane.NEVER_VISIBLE;
        if (never && starts[x] < 0 && y >= from[x]) {
          starts[x] = y;
          found = true;
        } else if (!never && starts[x] >= 0 && ends[x] == mask.heightPx()) {
          ends[x] = y;
        }
      }
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
    int channels = shape.channels();
    double[] first = new double[shape.rowSamples()];
    double[] last = new double[shape.rowSamples()];
    for (int c = 0; c < channels; c++) {
      double mean = above.mean(c, below.mean(c, 0.5 * shape.highestSample()));
      for (int x = 0; x < starts.length; x++) {
        first[x * channels + c] = above.tone(x, c, below.tone(x, c, mean));
        last[x * channels + c] = below.tone(x, c, first[x * channels + c]);
      }
    }
    for (int y = 0; y < mask.heightPx(); y++) {
      for (int x = 0; x < starts.length; x++) {
        if (starts[x] >= 0 && y >= starts[x] && y < ends[x]) {
          paintPixel(x, y, first, last);
        }
      }
    }
  }

  private void paintPixel(int x, int y, double[] first, double[] last) {
    double share = (y - starts[x] + 0.5) / (ends[x] - starts[x]);
    int at = x * shape.channels();
    for (int c = 0; c < shape.channels(); c++) {
      double tone = first[at + c] + share * (last[at + c] - first[at + c]);
      picture.sample(x, y, c, (int) (tone + 0.5));
    }
  }
}
