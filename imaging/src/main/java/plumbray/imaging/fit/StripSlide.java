package plumbray.imaging.fit;

import plumbray.imaging.reading.BarShares;
import plumbray.imaging.reading.StaffScene;
import plumbray.imaging.reading.StaffStrip;

/**
 * One staff's pattern slid along its strip. The score of a shift is n ln(unexplained/total
 * variance): bars are explained by two levels that may drift along the strip, each stretch without
 * bars by its mean.
 */
final class StripSlide {

  /** Share of a row that must show bars for the row to count as bars. */
  private static final double BAR_ROW = 0.5;

  /** Rows of a strip are not independent; one in so many counts. */
  static final double DEPENDENT_ROWS = 4.0;

  private static final int TERMS = 4;
  private static final double LEAST_SHARE = 1e-6;

  private final double[] observed;
  private final double[] staff;
  private final double[] sign;
  private final int around;
  private final double total;
  private final double weight;

  StripSlide(StaffScene scene, FitTrace trace, int around, int step) {
    this.around = around;
    StaffStrip strip = scene.strip();
    int n = strip.rows() / step;
    observed = new double[n];
    for (int i = 0; i < n * step; i++) {
      observed[i / step] += strip.brightness(i) / step;
    }
    BarShares shares = scene.shares(trace, around * step);
    staff = new double[n + 2 * around];
    sign = new double[n + 2 * around];
    for (int i = 0; i < staff.length * step && i < shares.rows(); i++) {
      staff[i / step] += shares.staff(i) / step;
      sign[i / step] += shares.sign(i) / step;
    }
    double[] run = new double[3];
    for (double x : observed) {
      gather(run, x);
    }
    total = unexplained(run);
    weight = n * step / DEPENDENT_ROWS;
  }

  /** Score of a shift downwards by so many steps. */
  double score(int shift) {
    double unexplained = 0.0;
    double[] run = new double[3];
    double[] bars = new double[3];
    double[][] normal = new double[TERMS][TERMS + 1];
    for (int i = 0; i < observed.length; i++) {
      int at = i + around - shift;
      if (staff[at] > BAR_ROW) {
        unexplained += unexplained(run);
        run = run[0] > 0.0 ? new double[3] : run;
        gather(bars, observed[i]);
        addBar(normal, sign[at], 2.0 * i / observed.length - 1.0, observed[i]);
      } else {
        gather(run, observed[i]);
      }
    }
    unexplained += unexplained(run) + barsUnexplained(bars, normal);
    return weight * Math.log(Math.max(unexplained, LEAST_SHARE * total) / total);
  }

  /** Terms: level, contrast, and a slope along the strip of both. */
  private static void addBar(double[][] normal, double sign, double along, double light) {
    double[] terms = {1.0, sign, along, sign * along, light};
    for (int k = 0; k < TERMS; k++) {
      for (int l = 0; l <= TERMS; l++) {
        normal[k][l] += terms[k] * terms[l];
      }
    }
  }

  private static double barsUnexplained(double[] bars, double[][] normal) {
    double plain = unexplained(bars);
    if (bars[0] < 2.0 * TERMS) {
      return plain;
    }
    double middle = normal[0][2] / bars[0];
    double[] explained = new double[1];
    double[] levels = solve(normal, explained);
    // bars that would have to be darker where they are bright explain nothing
    return levels[1] + levels[3] * middle <= 0.0
        ? plain
        : Math.min(plain, Math.max(0.0, bars[2] - explained[0]));
  }

  /** Least squares by Gaussian elimination, with a trace of damping; also the squares explained. */
  private static double[] solve(double[][] normal, double[] explained) {
    double[] right = new double[TERMS];
    double[][] a = new double[TERMS][];
    for (int k = 0; k < TERMS; k++) {
      a[k] = normal[k].clone();
      right[k] = normal[k][TERMS];
      a[k][k] += 1e-9 * (normal[k][k] + 1e-12);
    }
    for (int p = 0; p < TERMS; p++) {
      for (int i = p + 1; i < TERMS; i++) {
        double factor = a[i][p] / a[p][p];
        for (int j = p; j <= TERMS; j++) {
          a[i][j] -= factor * a[p][j];
        }
      }
    }
    double[] x = new double[TERMS];
    for (int i = TERMS - 1; i >= 0; i--) {
      double sum = a[i][TERMS];
      for (int j = i + 1; j < TERMS; j++) {
        sum -= a[i][j] * x[j];
      }
      x[i] = sum / a[i][i];
      explained[0] += x[i] * right[i];
    }
    return x;
  }

  private static void gather(double[] run, double x) {
    run[0] += 1.0;
    run[1] += x;
    run[2] += x * x;
  }

  private static double unexplained(double[] run) {
    return run[0] == 0.0 ? 0.0 : Math.max(0.0, run[2] - run[1] * run[1] / run[0]);
  }
}
