package plumbray.imaging.reading;

import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.LUDecomposition;

/**
 * The brightness of a strip as events, levels and a point spread make it.
 *
 * <p>Levels enter linearly and are taken at their best for every set of events (variable
 * projection, Golub and Pereyra 1973, in Kaufman's form): dark and bright bars each have a level
 * and a slope along the strip, and every stretch between or beyond the bars a level of its own.
 */
final class StripModel {

  private static final double RANK = 1e-8;
  private static final int BAR_COLUMNS = 4;

  private final StaffBars bars;
  private final StaffStrip strip;
  private final int[] used;
  private final double[] noiseFactors;
  private final List<StripEvent> events;
  private final double[] rows;
  private final EdgeSpread spread;
  private final int[] columnOf;
  private final double[][] basis;
  private final double[][] orthonormal;
  private final int rank;
  private final double[] levels;

  /**
   * A model.
   *
   * @param bars the staff
   * @param strip what was observed
   * @param used indices of the strip's values that count
   * @param noiseFactors factors on the strip's standard deviations, one a value of the strip
   * @param scene events with their displaced rows, what is seen at the top, and the point spread
   */
  StripModel(StaffBars bars, StaffStrip strip, int[] used, double[] noiseFactors, Scene scene) {
    this.bars = bars;
    this.strip = strip;
    this.used = used;
    this.noiseFactors = noiseFactors;
    this.events = scene.events();
    this.rows = scene.rows();
    this.spread = new EdgeSpread(scene.spreadPx());
    columnOf = columns(scene.top());
    basis = basis();
    orthonormal = new double[basis.length][];
    rank = orthonormalize();
    levels = solveLevels();
  }

  /**
   * What a sight predicts.
   *
   * @param events the events
   * @param rows their rows, with what shimmer added, px
   * @param top what is seen at the top of the strip
   * @param spreadPx standard deviation of the point spread, px
   */
  record Scene(List<StripEvent> events, double[] rows, int top, double spreadPx) {}

  /** Basis column of the level of each stretch: 0 dark, 2 bright (each with a slope), 4 and on. */
  private int[] columns(int top) {
    int[] columns = new int[events.size() + 1];
    int next = BAR_COLUMNS;
    int before = Integer.MIN_VALUE;
    for (int s = 0; s < columns.length; s++) {
      int what = s == 0 ? top : events.get(s - 1).below();
      if (bars.isBar(what)) {
        columns[s] = bars.isDark(what) ? 0 : 2;
      } else {
        boolean apart = s > 0 && events.get(s - 1).edge() == StripEvent.APART;
        columns[s] = what == before && !apart ? next - 1 : next++;
      }
      before = bars.isBar(what) ? Integer.MIN_VALUE : what;
    }
    return columns;
  }

  private double along(int i) {
    return 2.0 * i / Math.max(1, strip.rows() - 1) - 1.0;
  }

  private double weight(int i) {
    return 1.0 / (strip.sigma(i) * noiseFactors[i]);
  }

  private double[][] basis() {
    int width = BAR_COLUMNS;
    for (int c : columnOf) {
      width = Math.max(width, c + 1);
    }
    double[][] b = new double[width][used.length];
    for (int r = 0; r < used.length; r++) {
      double row = strip.firstRow() + used[r];
      double shareAbove = 1.0;
      for (int s = 0; s < columnOf.length; s++) {
        double shareBelow = s < rows.length ? spread.share(row - rows[s]) : 0.0;
        add(b, columnOf[s], r, shareAbove - shareBelow);
        shareAbove = shareBelow;
        if (shareBelow == 0.0 && s < rows.length && laterAllBelow(s, row)) {
          break;
        }
      }
    }
    return b;
  }

  private boolean laterAllBelow(int s, double row) {
    return rows[s] - row > 20.0 * spread.reachPx();
  }

  private void add(double[][] b, int column, int r, double share) {
    if (share == 0.0) {
      return;
    }
    double w = share * weight(used[r]);
    b[column][r] += w;
    if (column < BAR_COLUMNS) {
      b[column + 1][r] += w * along(used[r]);
    }
  }

  private int orthonormalize() {
    int count = 0;
    for (int c = 0; c < basis.length; c++) {
      double[] q = basis[c].clone();
      double before = norm(q);
      for (int pass = 0; pass < 2; pass++) {
        project(q, count);
      }
      double after = norm(q);
      if (after > RANK * Math.max(before, 1e-300) && after > 0.0) {
        for (int r = 0; r < q.length; r++) {
          q[r] /= after;
        }
        orthonormal[count++] = q;
      }
    }
    return count;
  }

  private static double norm(double[] x) {
    double sum = 0.0;
    for (double v : x) {
      sum += v * v;
    }
    return Math.sqrt(sum);
  }

  /** Takes out of x what the first {@code count} orthonormal columns explain. */
  private void project(double[] x, int count) {
    for (int c = 0; c < count; c++) {
      double[] q = orthonormal[c];
      double dot = 0.0;
      for (int r = 0; r < x.length; r++) {
        dot += q[r] * x[r];
      }
      for (int r = 0; r < x.length; r++) {
        x[r] -= dot * q[r];
      }
    }
  }

  /** Levels by least squares: normal equations of few columns, with a trace of damping. */
  private double[] solveLevels() {
    int n = basis.length;
    double[][] a = new double[n][n];
    double[] b = new double[n];
    double[] data = weightedData();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        a[i][j] = dot(basis[i], basis[j]);
      }
      a[i][i] = a[i][i] * (1.0 + 1e-12) + 1e-12;
      b[i] = dot(basis[i], data);
    }
    return new LUDecomposition(new Array2DRowRealMatrix(a, false), 0.0)
        .getSolver()
        .solve(new ArrayRealVector(b, false))
        .toArray();
  }

  private double[] weightedData() {
    double[] data = new double[used.length];
    for (int r = 0; r < data.length; r++) {
      data[r] = strip.brightness(used[r]) * weight(used[r]);
    }
    return data;
  }

  private static double dot(double[] x, double[] y) {
    double sum = 0.0;
    for (int i = 0; i < x.length; i++) {
      sum += x[i] * y[i];
    }
    return sum;
  }

  /** Residuals, observed less predicted, in standard deviations. */
  double[] residuals() {
    double[] r = weightedData();
    project(r, rank);
    project(r, rank);
    return r;
  }

  /** Predicted brightness of the values in use. */
  double[] predicted() {
    double[] p = new double[used.length];
    for (int r = 0; r < p.length; r++) {
      for (int c = 0; c < basis.length; c++) {
        p[r] += basis[c][r] * levels[c];
      }
      p[r] /= weight(used[r]);
    }
    return p;
  }

  /** Level of the bright bars less that of the dark ones, in the middle of the strip. */
  double contrast() {
    return levels[2] - levels[0];
  }

  private double level(int stretch, int i) {
    int c = columnOf[stretch];
    return levels[c] + (c < BAR_COLUMNS ? levels[c + 1] * along(i) : 0.0);
  }

  /** Derivatives of the residuals by the row of event {@code e}, levels following, per px. */
  double[] byEventRow(int e) {
    double[] d = new double[used.length];
    for (int r = 0; r < d.length; r++) {
      double slope = spread.slope(strip.firstRow() + used[r] - rows[e]);
      if (slope != 0.0) {
        double step = level(e + 1, used[r]) - level(e, used[r]);
        d[r] = slope * step * weight(used[r]);
      }
    }
    return d;
  }

  /** Derivatives of the residuals by the point spread, levels following, per px. */
  double[] bySpread() {
    double[] d = new double[used.length];
    for (int e = 0; e < rows.length; e++) {
      for (int r = 0; r < d.length; r++) {
        double by = spread.bySpread(strip.firstRow() + used[r] - rows[e]);
        if (by != 0.0) {
          d[r] -= by * (level(e + 1, used[r]) - level(e, used[r])) * weight(used[r]);
        }
      }
    }
    project(d, rank);
    return d;
  }

  /** Lets the levels follow: takes out of derivatives what a change of levels would explain. */
  double[] levelsFollowing(double[] derivatives) {
    project(derivatives, rank);
    return derivatives;
  }
}
