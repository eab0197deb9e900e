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
   * @param place where it is seen
   * @param out filled with one derivative a quantity, px per unit
   */
  void rowDerivatives(int reference, Place place, double[] out);

  /**
   * Derivatives, by the estimated quantities, of the row in which an image ends in the ground.
   *
   * @param apparentRad a branch's lowest or highest apparent elevation, rad
   * @param azimuthRad azimuth, rad
   * @param out filled with one derivative a quantity, px per unit
   * @return whether there is such an end there, and its derivatives are known
   */
  boolean endDerivatives(double apparentRad, double azimuthRad, double[] out);

  /**
   * Where an elevation is seen.
   *
   * @param branch the image
   * @param elevationRad apparent elevation, rad
   * @param azimuthRad azimuth, rad
   * @param leastSlopeShare the slope of the mapping counts as at least this part of a straight
   *     ray's: near the vanishing line the row of an edge runs away
   */
  record Place(Branch branch, double elevationRad, double azimuthRad, double leastSlopeShare) {}
}
