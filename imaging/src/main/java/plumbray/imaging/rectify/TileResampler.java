package plumbray.imaging.rectify;

import java.util.Arrays;
import plumbray.imaging.photo.Photo;

/**
 * The sums of {@link Resampler} for many neighbouring pixels at once, where their sources lie side
 * by side, in single precision: loops over samples with nothing else in them, which run at the
 * speed of the processor's vector units. Not for photos with alpha. One per thread.
 */
final class TileResampler {
  /** Source columns that the taps of a tile may spread over, beyond one for each pixel. */
  private static final int COLUMNS_MOST = 8;

  /** Source rows that the taps of a tile may spread over. */
  private static final int ROWS_MOST = 48;

  /**
   * Where sources keep their distance to within this, px, all pixels of a tile share the weights of
   * the middle one: far below the hundredth of a pixel that the map is good for.
   */
  private static final double STILL = 2e-4;

  private final int channels;
  private final int width;
  private final FloatRows rows;
  private final float[][] across = new float[COLUMNS_MOST][];
  private final float[][] down = new float[ROWS_MOST][];
  private final float[] line;
  private final float[] sum;
  private final CubicKernel kernel = new CubicKernel();

  TileResampler(Photo photo) {
    channels = photo.channels();
    width = photo.width();
    rows = new FloatRows(photo);
    line = new float[RowReader.TILE * channels];
    sum = new float[RowReader.TILE * channels];
  }

  /**
   * Writes the samples of the output pixels from {@code from} to before {@code to}, all of which
   * are shown; false, with nothing written, where their sources are too far apart.
   */
  boolean sample(RowMap map, int from, int to, float[] into) {
    int leftmost = Integer.MAX_VALUE;
    int rightmost = Integer.MIN_VALUE;
    double top = Double.POSITIVE_INFINITY;
    double bottom = Double.NEGATIVE_INFINITY;
    for (int x = from; x < to; x++) {
      int column = (int) Math.ceil(map.u[x] - 2) - x;
      leftmost = Math.min(leftmost, column);
      rightmost = Math.max(rightmost, column);
      double reach = 2 * Math.max(1, map.stretch[x]);
      top = Math.min(top, map.v[x] - reach);
      bottom = Math.max(bottom, map.v[x] + reach);
    }
    int columns = rightmost - leftmost + 5;
    int firstRow = (int) Math.ceil(top);
    int rowCount = (int) Math.floor(bottom) - firstRow + 1;
    boolean near =
        columns <= COLUMNS_MOST
            && rowCount <= ROWS_MOST
            && from + leftmost >= -FloatRows.RIM
            && to + leftmost + columns < width + FloatRows.RIM;
    if (near) {
      placeAcross(map, from, to, leftmost, columns);
      placeDown(map, from, to, firstRow, rowCount);
      add(from + leftmost, columns, firstRow, rowCount, (to - from) * channels);
      System.arraycopy(sum, 0, into, from * channels, (to - from) * channels);
    }
    return near;
  }

  private void placeAcross(RowMap map, int from, int to, int leftmost, int columns) {
    clear(across, columns);
    int last = to - 1;
    int middle = (from + last) / 2;
    if (isStill(map.u[from] - from, map.u[middle] - middle, map.u[last] - last)) {
      kernel.place(map.u[middle], 1);
      put(across, kernel.first() - middle - leftmost, 0, to - from);
      return;
    }
    for (int x = from; x < to; x++) {
      kernel.place(map.u[x], 1);
      put(across, kernel.first() - x - leftmost, x - from, x - from + 1);
    }
  }

  private void placeDown(RowMap map, int from, int to, int firstRow, int rowCount) {
    clear(down, rowCount);
    int last = to - 1;
    int middle = (from + last) / 2;
    boolean still =
        isStill(map.v[from], map.v[middle], map.v[last])
            && isStill(map.stretch[from], map.stretch[middle], map.stretch[last]);
    if (still) {
      kernel.place(map.v[middle], map.stretch[middle]);
      put(down, kernel.first() - firstRow, 0, to - from);
      return;
    }
    for (int x = from; x < to; x++) {
      kernel.place(map.v[x], map.stretch[x]);
      put(down, kernel.first() - firstRow, x - from, x - from + 1);
    }
  }

  private static boolean isStill(double first, double middle, double last) {
    return Math.abs(first - middle) < STILL && Math.abs(last - middle) < STILL;
  }

  private void clear(float[][] weights, int count) {
    for (int i = 0; i < count; i++) {
      if (weights[i] == null) {
        weights[i] = new float[RowReader.TILE * channels];
      }
      Arrays.fill(weights[i], 0f);
    }
  }

  /** Gives the kernel's weights to the pixels {@code from} to before {@code to} of the tile. */
  private void put(float[][] weights, int firstTap, int from, int to) {
    for (int i = 0; i < kernel.count(); i++) {
      Arrays.fill(weights[firstTap + i], from * channels, to * channels, (float) kernel.weight(i));
    }
  }

  private void add(int firstColumn, int columns, int firstRow, int rowCount, int samples) {
    Arrays.fill(sum, 0f);
    for (int j = 0; j < rowCount; j++) {
      float[] source = rows.row(firstRow + j);
      Arrays.fill(line, 0f);
      for (int i = 0; i < columns; i++) {
        int start = (firstColumn + i + FloatRows.RIM) * channels;
        addProducts(across[i], source, start, line, samples);
      }
      addProducts(down[j], line, 0, sum, samples);
    }
  }

  private static void addProducts(
      float[] weights, float[] values, int start, float[] into, int count) {
    for (int k = 0; k < count; k++) {
      into[k] += weights[k] * values[start + k];
    }
  }
}
