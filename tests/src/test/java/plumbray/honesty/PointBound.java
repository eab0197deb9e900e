package plumbray.honesty;

import plumbray.calibration.camera.Camera;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.imaging.fit.EstimateLayout;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.Branch;

/**
 * Fisher's information that upright points hold about a sight: the sum over the points of d d^T /
 * s^2, d the derivatives of a point's row by the sight's quantities and s the standard deviation of
 * pointing (Kay 1993, equation 3.31, from memory).
 */
final class PointBound {
  private PointBound() {}

  /** The information, an n by n matrix over the sight's quantities in their order, SI. */
  static double[][] information(KnownSight known) {
    SightOptics optics = SightOptics.of(known.truth(), known.names());
    EstimateLayout layout = EstimateLayout.of(known.truth(), known.names());
    Camera camera = optics.camera();
    int n = layout.size();
    double[][] information = new double[n][n];
    for (PointMark mark : ((PointTarget) known.reference().kind()).marks()) {
      Branch branch = known.upright(optics, mark.heightM());
      double[] d = RowDerivatives.of(camera, layout, branch, branch.apparentRad(mark.heightM()));
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          information[i][j] += d[i] * d[j] / (mark.sigmaPx() * mark.sigmaPx());
        }
      }
    }
    return information;
  }
}
