package plumbray.imaging.fit;

import plumbray.imaging.reading.BarShares;
import plumbray.imaging.reading.StaffScene;
import plumbray.imaging.reading.StaffStrip;

/**
 * One staff's pattern slid along its strip. The score of a shift is n ln(unexplained/total
 * variance): bars are explained by two levels, each stretch without bars by its mean.
 */
final class StripSlide {

  /** Share of a row that must show bars for the row to count as bars. */
  private static final double BAR_ROW = 0.5;

  /** Rows of a strip are not independent; one in so many counts. */
  static final double DEPENDENT_ROWS = 4.0;

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
    double sign1 = 0.0;
    double sign2 = 0.0;
    double cross = 0.0;
    double[] bars = new double[3];
    for (int i = 0; i < observed.length; i++) {
      int at = i + around - shift;
      if (staff[at] > BAR_ROW) {
        unexplained += unexplained(run);
        run = run[0] > 0.0 ? new double[3] : run;
        gather(bars, observed[i]);
        sign1 += sign[at];
        sign2 += sign[at] * sign[at];
        cross += sign[at] * observed[i];
      } else {
        gather(run, observed[i]);
      }
    }
    unexplained += unexplained(run) + barsUnexplained(bars, sign1, sign2, cross);
    return weight * Math.log(Math.max(unexplained, LEAST_SHARE * total) / total);
  }

  private static double barsUnexplained(double[] bars, double sign1, double sign2, double cross) {
    if (bars[0] == 0.0) {
      return 0.0;
    }
    double spread = sign2 - sign1 * sign1 / bars[0];
    double covariance = cross - sign1 * bars[1] / bars[0];
    double plain = unexplained(bars);
    // bars that would have to be darker where they are bright explain nothing
    return covariance <= 0.0 || spread <= 1e-9
        ? plain
        : Math.max(0.0, plain - covariance * covariance / spread);
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
