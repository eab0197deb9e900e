package plumbray.imaging.rectify;

/** Sums of samples for every column, to be averaged over neighbouring columns. */
final class EdgeTones {
  private final int channels;
  private final double[] sums;
  private final double[] counts;
  private final double[] totals;
  private double total;

  EdgeTones(int channels, int columns) {
    this.channels = channels;
    this.sums = new double[columns * channels];
    this.counts = new double[columns];
    this.totals = new double[channels];
  }

  void add(int column, int channel, double value) {
    sums[column * channels + channel] += value;
    totals[channel] += value;
  }

  /** Counts one sample of each channel. */
  void count(int column) {
    counts[column]++;
    total++;
  }

  /** The sums over columns up to {@code reach} away on either side. */
  EdgeTones blurred(int reach) {
    EdgeTones result = new EdgeTones(channels, counts.length);
    for (int c = 0; c < channels; c++) {
      slide(sums, result.sums, c, channels, reach);
    }
    slide(counts, result.counts, 0, 1, reach);
    System.arraycopy(totals, 0, result.totals, 0, channels);
    result.total = total;
    return result;
  }

  /** Sums of whole numbers: adding and taking away leaves no rounding behind. */
  private void slide(double[] from, double[] into, int offset, int step, int reach) {
    double sum = 0;
    for (int x = -reach; x < counts.length; x++) {
      if (x + reach < counts.length) {
        sum += from[(x + reach) * step + offset];
      }
      if (x - reach - 1 >= 0) {
        sum -= from[(x - reach - 1) * step + offset];
      }
      if (x >= 0) {
        into[x * step + offset] = sum;
      }
    }
  }

  /** Mean of the samples around a column, or {@code otherwise} where there are none. */
  double tone(int column, int channel, double otherwise) {
    return counts[column] > 0 ? sums[column * channels + channel] / counts[column] : otherwise;
  }

  /** Mean over all columns, or {@code otherwise} where there are no samples at all. */
  double mean(int channel, double otherwise) {
    return total > 0 ? totals[channel] / total : otherwise;
  }
}
