package plumbray.calibration.estimate;

/**
 * Linear least squares by Householder reflections (Businger and Golub 1965): the rows are worked up
 * in place to an upper triangle, without forming normal equations.
 */
final class Triangle {
  private Triangle() {}

  /**
   * Reduces rows {@code [A | b]} so that the first {@code columns} rows hold the triangle and the
   * rotated right-hand side; lengths of differences {@code A p + b} stay the same up to a constant.
   *
   * @param rows at least one row of {@code columns + 1} numbers; overwritten
   * @param columns number of columns of A
   */
  static void reduce(double[][] rows, int columns) {
    for (int k = 0; k < Math.min(columns, rows.length); k++) {
      double length = length(rows, k);
      if (length == 0) {
        continue;
      }
      double head = rows[k][k] > 0 ? -length : length;
      double pivot = rows[k][k] - head;
      for (int j = k + 1; j <= columns; j++) {
        reflect(rows, k, j, -head * pivot, pivot);
      }
      rows[k][k] = head;
      for (int i = k + 1; i < rows.length; i++) {
        rows[i][k] = 0;
      }
    }
  }

  private static double length(double[][] rows, int k) {
    double largest = 0;
    for (int i = k; i < rows.length; i++) {
      largest = Math.max(largest, Math.abs(rows[i][k]));
    }
    if (largest == 0) {
      return 0;
    }
    double sum = 0;
    for (int i = k; i < rows.length; i++) {
      double part = rows[i][k] / largest;
      sum += part * part;
    }
    return largest * Math.sqrt(sum);
  }

  /** Reflects column j with the vector that starts with the pivot and goes on below row k. */
  private static void reflect(double[][] rows, int k, int j, double halfSquare, double pivot) {
    double product = pivot * rows[k][j];
    for (int i = k + 1; i < rows.length; i++) {
      product += rows[i][k] * rows[i][j];
    }
    double factor = product / halfSquare;
    rows[k][j] -= factor * pivot;
    for (int i = k + 1; i < rows.length; i++) {
      rows[i][j] -= factor * rows[i][k];
    }
  }

  /**
   * The p that makes {@code |A p + b|} least.
   *
   * @param rows rows {@code [A | b]}, at least as many as columns; overwritten
   * @param columns number of columns of A
   * @return p; 0 in components that no row depends on
   */
  static double[] solve(double[][] rows, int columns) {
    reduce(rows, columns);
    double[] p = new double[columns];
    for (int k = columns - 1; k >= 0; k--) {
      double sum = -rows[k][columns];
      for (int j = k + 1; j < columns; j++) {
        sum -= rows[k][j] * p[j];
      }
      p[k] = rows[k][k] == 0 ? 0 : sum / rows[k][k];
    }
    return p;
  }
}
