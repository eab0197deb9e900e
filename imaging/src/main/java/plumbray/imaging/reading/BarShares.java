package plumbray.imaging.reading;

/** For each row, which share of it shows bars, and which share of it bright less dark ones. */
public final class BarShares {

  private final int firstRow;
  private final double[] staff;
  private final double[] sign;

  BarShares(int firstRow, int rows) {
    this.firstRow = firstRow;
    staff = new double[rows];
    sign = new double[rows];
  }

  void add(double from, double to, boolean bar, boolean dark) {
    if (!bar) {
      return;
    }
    int first = Math.max(0, (int) Math.floor(from + 0.5 - firstRow));
    int last = Math.min(staff.length - 1, (int) Math.floor(to + 0.5 - firstRow));
    for (int i = first; i <= last; i++) {
      double low = Math.max(from, firstRow + i - 0.5);
      double high = Math.min(to, firstRow + i + 0.5);
      double share = Math.max(0.0, high - low);
      staff[i] += share;
      sign[i] += dark ? -share : share;
    }
  }

  /** First row, px. */
  public int firstRow() {
    return firstRow;
  }

  /** Number of rows. */
  public int rows() {
    return staff.length;
  }

  /** Share of a row that shows bars, 0 to 1. */
  public double staff(int i) {
    return staff[i];
  }

  /** Share that shows bright bars less share that shows dark ones, -1 to 1. */
  public double sign(int i) {
    return sign[i];
  }
}
