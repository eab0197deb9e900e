package plumbray.imaging.reading;

import java.util.Arrays;
import plumbray.calibration.sight.ImageBox;
import plumbray.imaging.photo.GreyPlane;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PixelBox;

/**
 * Brightness along a staff: for each row, a robust mean over the columns of its box, taken along
 * the line of equal elevation through the middle column.
 */
public final class StaffStrip {

  private static final double OUTLIER = 3.5;
  private static final double MAD_TO_SIGMA = 1.4826;

  /** Shears below this many pixels over half the box are not worth an interpolation. */
  private static final double NO_SHEAR_PX = 0.02;

  private final int firstRow;
  private final double columnPx;
  private final double shear;
  private final double[] brightness;
  private final double[] sigma;

  private StaffStrip(
      int firstRow, double columnPx, double shear, double[] brightness, double[] sigma) {
    this.firstRow = firstRow;
    this.columnPx = columnPx;
    this.shear = shear;
    this.brightness = brightness;
    this.sigma = sigma;
  }

  /** A dark strip at the same column that reaches farther up and down. */
  StaffStrip widened(int rowsAround) {
    double[] nothing = new double[brightness.length + 2 * rowsAround];
    return new StaffStrip(firstRow - rowsAround, columnPx, shear, nothing, nothing);
  }

  /**
   * Reads a strip.
   *
   * @param photo the photo
   * @param box where the bars are, px; must lie inside the photo
   * @param shear rows by which a line of equal elevation falls a column to the right
   */
  public static StaffStrip read(Photo photo, ImageBox box, double shear) {
    int left = (int) Math.ceil(box.u0());
    int right = Math.max(left, (int) Math.floor(box.u1()));
    double column = 0.5 * (left + right);
    int reach = (int) Math.ceil(Math.abs(shear) * 0.5 * (right - left)) + 2;
    int top = Math.max(0, (int) Math.ceil(box.v0()) - reach);
    int bottom = Math.min(photo.height() - 1, (int) Math.floor(box.v1()) + reach);
    GreyPlane plane =
        photo.linearLuminance(new PixelBox(left, top, right - left + 1, bottom - top + 1));
    int firstRow = Math.max(top, (int) Math.ceil(box.v0()));
    int lastRow = Math.min(bottom, (int) Math.floor(box.v1()));
    int rows = lastRow - firstRow + 1;
    double[] brightness = new double[rows];
    double[] sigma = new double[rows];
    double[] line = new double[plane.width()];
    boolean level = Math.abs(shear) * 0.5 * plane.width() < NO_SHEAR_PX;
    for (int i = 0; i < rows; i++) {
      for (int c = 0; c < line.length; c++) {
        double row = firstRow + i - top + (level ? 0.0 : shear * (left + c - column));
        line[c] = level ? plane.at(c, firstRow + i - top) : interpolated(plane, c, row);
      }
      robustMean(line, i, brightness, sigma);
    }
    return new StaffStrip(firstRow, column, shear, brightness, floored(sigma));
  }

  /** Cubic interpolation (Keys, a = -0.5) down a column. */
  private static double interpolated(GreyPlane plane, int column, double row) {
    int at = (int) Math.floor(row);
    double s = row - at;
    double sum = 0.0;
    double[] weights = {
      s * (-0.5 + s * (1.0 - 0.5 * s)),
      1.0 + s * s * (-2.5 + 1.5 * s),
      s * (0.5 + s * (2.0 - 1.5 * s)),
      s * s * (-0.5 + 0.5 * s)
    };
    for (int k = 0; k < 4; k++) {
      int y = Math.max(0, Math.min(plane.height() - 1, at - 1 + k));
      sum += weights[k] * plane.at(column, y);
    }
    return sum;
  }

  private static void robustMean(double[] line, int row, double[] mean, double[] sigma) {
    double[] sorted = line.clone();
    Arrays.sort(sorted);
    double median = median(sorted);
    double[] deviations = new double[line.length];
    for (int i = 0; i < line.length; i++) {
      deviations[i] = Math.abs(line[i] - median);
    }
    Arrays.sort(deviations);
    double scale = MAD_TO_SIGMA * median(deviations);
    double sum = 0.0;
    double squares = 0.0;
    int kept = 0;
    for (double x : line) {
      if (Math.abs(x - median) <= OUTLIER * scale || scale == 0.0 && x == median) {
        sum += x - median;
        squares += (x - median) * (x - median);
        kept++;
      }
    }
    double offset = sum / kept;
    mean[row] = median + offset;
    double variance = Math.max(0.0, squares / kept - offset * offset);
    sigma[row] = Math.sqrt(variance / Math.max(1, kept - 1));
  }

  /**
   * Single rows may look noiseless by chance; no row counts as better than half the typical one.
   */
  private static double[] floored(double[] sigma) {
    double[] sorted = sigma.clone();
    Arrays.sort(sorted);
    double floor = Math.max(0.5 * median(sorted), 1e-5);
    return Arrays.stream(sigma).map(s -> Math.max(s, floor)).toArray();
  }

  private static double median(double[] sorted) {
    int n = sorted.length;
    return 0.5 * (sorted[(n - 1) / 2] + sorted[n / 2]);
  }

  /** Row of the first value, px. */
  public int firstRow() {
    return firstRow;
  }

  /** How many rows there are. */
  public int rows() {
    return brightness.length;
  }

  /** Column at which the strip's rows count, px. */
  public double columnPx() {
    return columnPx;
  }

  /** Rows by which a line of equal elevation falls a column to the right. */
  public double shear() {
    return shear;
  }

  /** Brightness of value {@code i}, linear light 0 to 1. */
  public double brightness(int i) {
    return brightness[i];
  }

  /** Standard deviation of value {@code i} as the scatter over the columns gives it. */
  public double sigma(int i) {
    return sigma[i];
  }

  /** A copy of the brightness. */
  public double[] brightness() {
    return brightness.clone();
  }
}
