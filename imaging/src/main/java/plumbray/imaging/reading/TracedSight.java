package plumbray.imaging.reading;

import plumbray.calibration.camera.Camera;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.SightMapping;

/** A sight at one set of values, as a reference's reading needs it. */
public interface TracedSight {

  /** The camera. */
  Camera camera();

  /** The mapping at a reference's distance, m. */
  SightMapping mapping(double distanceM);

  /** Elevation of a reference's zero, m. */
  double footElevationM(int reference);

  /** How many quantities are estimated. */
  int estimateCount();

  /**
   * Derivatives, by the estimated quantities, of the row in which one elevation of a reference is
   * seen.
   *
   * @param reference index of the reference
   * @param branch the image in which it is seen
   * @param elevationRad apparent elevation there, rad
   * @param azimuthRad azimuth there, rad
   * @param out filled with one derivative a quantity, px per unit
   */
  void rowDerivatives(
      int reference, Branch branch, double elevationRad, double azimuthRad, double[] out);
}
