package plumbray.honesty;

import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.RowSensitivity;
import plumbray.imaging.fit.EstimateLayout;
import plumbray.raymodel.mapping.Branch;

/**
 * Derivatives of the row in which a height is seen: with the elevation y(a, q) seen in direction a,
 * da/dq = -(dy/dq) / (dy/da); a quantity of the camera's attitude acts on the row alone.
 */
final class RowDerivatives {
  private RowDerivatives() {}

  /** Derivatives by the quantities in their order, px per SI unit. */
  static double[] of(Camera camera, EstimateLayout layout, Branch branch, double apparentRad) {
    double[] derivatives = new double[layout.size()];
    RowSensitivity row = camera.rowSensitivity(apparentRad, 0);
    for (int i = 0; i < derivatives.length; i++) {
      int index = layout.sensitivityIndex(i);
      derivatives[i] =
          index < 0
              ? byCamera(row, layout.name(i))
              : -row.dvdElevation()
                  * branch.sensitivity(apparentRad, index)
                  / branch.slopeMPerRad(apparentRad);
    }
    return derivatives;
  }

  /** Derivative by the pitch, the one quantity of the camera that is left open here. */
  static double byCamera(RowSensitivity row, String name) {
    if (!name.equals("camera.pitchRad")) {
      throw new IllegalArgumentException(name + " is not among what the bound is written for");
    }
    return row.dvdPitch();
  }
}
