package plumbray.imaging.reading;

import java.util.List;
import plumbray.calibration.quantity.Parameter;

/**
 * What one reference shows, as residuals with exact derivatives. A reference may have quantities of
 * its own, such as the point spread, which are estimated beside the sight's.
 */
public interface ReferenceObservation {

  /** How many residuals there are. */
  int count();

  /** The reference's own quantities. */
  List<Parameter> ownParameters();

  /**
   * Computes residuals in units of their standard deviations.
   *
   * @param sight the sight at the present values
   * @param own values of {@link #ownParameters}
   * @param into where results go
   */
  void evaluate(TracedSight sight, double[] own, Rows into);

  /**
   * A window into a larger set of residuals.
   *
   * @param residuals all residuals
   * @param jacobian all derivatives, or null where they are not wanted
   * @param firstRow first residual of this reference
   * @param firstOwn first column of this reference's own quantities
   */
  record Rows(double[] residuals, double[][] jacobian, int firstRow, int firstOwn) {

    void set(int i, double residual) {
      residuals[firstRow + i] = residual;
    }

    boolean wantsJacobian() {
      return jacobian != null;
    }

    double[] derivatives(int i) {
      return jacobian[firstRow + i];
    }
  }
}
