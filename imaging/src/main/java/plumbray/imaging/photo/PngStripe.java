package plumbray.imaging.photo;

import java.util.Arrays;
import java.util.zip.Adler32;
import java.util.zip.Deflater;

/**
 * Some rows of a PNG, filtered and packed by themselves, so that many can be worked on at a time.
 *
 * <p>Noise makes a photograph's rows differ everywhere: looking for repetitions (the first half of
 * Deflate, RFC 1951) finds little there, takes most of the time, and what it finds by chance costs
 * more than it saves. So what is mostly not zero after filtering is packed by Huffman's codes
 * alone; drawings, masks and clipped skies are mostly zero, and repetitions are looked for.
 */
final class PngStripe {
  /** Share of zeros from which repetitions are worth looking for. */
  private static final double FLAT = 0.6;

  private static final int QUICK = 1;
  private static final int THOROUGH = 9;
  private static final PngFilter[] QUICK_FILTERS = {
    PngFilter.UP, PngFilter.SUB, PngFilter.AVERAGE, PngFilter.PAETH
  };

  private final PngRows rows;
  private final int firstRow;
  private final int lastRow;

  /** Rows from the first up to the last, which is not part of it. */
  PngStripe(PngRows rows, int firstRow, int lastRow) {
    this.rows = rows;
    this.firstRow = firstRow;
    this.lastRow = lastRow;
  }

  /**
   * A packed stripe: raw Deflate data.
   *
   * @param bytes the data at the start of an array
   * @param length how much of the array it is
   * @param checksum Adler-32 of what was packed
   * @param unpacked length of what was packed
   */
  record Packed(byte[] bytes, int length, long checksum, long unpacked) {}

  Packed pack(PackingEffort effort, boolean last) {
    byte[] filtered = effort == PackingEffort.FAST ? filtered(best(middle())) : filteredRowByRow();
    Adler32 checksum = new Adler32();
    checksum.update(filtered);
    Packed packed;
    if (effort == PackingEffort.FAST) {
      boolean flat = zeros(filtered) > FLAT * filtered.length;
      int strategy = flat ? Deflater.DEFAULT_STRATEGY : Deflater.HUFFMAN_ONLY;
      packed = deflated(filtered, QUICK, strategy, last);
    } else {
      Packed plain = deflated(filtered, QUICK, Deflater.HUFFMAN_ONLY, last);
      Packed repeated = deflated(filtered, THOROUGH, Deflater.FILTERED, last);
      packed = plain.length() <= repeated.length() ? plain : repeated;
    }
    return new Packed(packed.bytes(), packed.length(), checksum.getValue(), filtered.length);
  }

  private int middle() {
    return (firstRow + lastRow) / 2;
  }

  /** The filter that leaves least of one row, as a sum of distances from zero. */
  private PngFilter best(int row) {
    byte[] pair = rows.pair(row, new byte[2 * rows.rowBytes()]);
    byte[] trial = new byte[1 + rows.rowBytes()];
    PngFilter best = PngFilter.UP;
    long least = Long.MAX_VALUE;
    for (PngFilter filter : QUICK_FILTERS) {
      filter.apply(pair, rows.rowBytes(), rows.pixelBytes(), trial, 0);
      long left = distance(trial, 1);
      if (left < least) {
        least = left;
        best = filter;
      }
    }
    return best;
  }

  private byte[] filtered(PngFilter filter) {
    byte[] filtered = new byte[(lastRow - firstRow) * (1 + rows.rowBytes())];
    byte[] pair = new byte[2 * rows.rowBytes()];
    for (int y = firstRow; y < lastRow; y++) {
      int at = (y - firstRow) * (1 + rows.rowBytes());
      filter.apply(rows.pair(y, pair), rows.rowBytes(), rows.pixelBytes(), filtered, at);
    }
    return filtered;
  }

  private byte[] filteredRowByRow() {
    byte[] filtered = new byte[(lastRow - firstRow) * (1 + rows.rowBytes())];
    byte[] pair = new byte[2 * rows.rowBytes()];
    for (int y = firstRow; y < lastRow; y++) {
      int at = (y - firstRow) * (1 + rows.rowBytes());
      best(y).apply(rows.pair(y, pair), rows.rowBytes(), rows.pixelBytes(), filtered, at);
    }
    return filtered;
  }

  private static long distance(byte[] filtered, int from) {
    long sum = 0;
    for (int i = from; i < filtered.length; i++) {
      sum += Math.abs(filtered[i]);
    }
    return sum;
  }

  private static int zeros(byte[] filtered) {
    int count = 0;
    for (byte b : filtered) {
      count += b == 0 ? 1 : 0;
    }
    return count;
  }

  /** Raw data that ends at a byte's end, so that the next stripe's can follow. */
  private static Packed deflated(byte[] filtered, int level, int strategy, boolean last) {
    Deflater deflater = new Deflater(level, true);
    deflater.setStrategy(strategy);
    deflater.setInput(filtered);
    if (last) {
      deflater.finish();
    }
    byte[] into = new byte[filtered.length + (filtered.length >> 6) + 1024];
    int flush = last ? Deflater.NO_FLUSH : Deflater.SYNC_FLUSH;
    int length = 0;
    // The first call may only take in the strategy; what is complete gives nothing more.
    for (boolean first = true; ; first = false) {
      if (length == into.length) {
        into = Arrays.copyOf(into, into.length * 2);
      }
      int count = deflater.deflate(into, length, into.length - length, flush);
      length += count;
      if (count == 0 && !first) {
        break;
      }
    }
    deflater.end();
    return new Packed(into, length, 0, filtered.length);
  }
}
