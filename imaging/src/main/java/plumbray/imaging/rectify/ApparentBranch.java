package plumbray.imaging.rectify;

import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;

/** One image of the things at a distance: elevation against apparent elevation, monotone. */
interface ApparentBranch {
  /** Whether higher things are seen higher. */
  boolean upright();

  /** Lowest apparent elevation, rad. */
  double lowestRad();

  /** Highest apparent elevation, rad. */
  double highestRad();

  /** Lowest elevation shown, m. */
  double lowestElevationM();

  /** Highest elevation shown, m. */
  double highestElevationM();

  /** Apparent elevation of what is at an elevation (m), rad. */
  double apparentRad(double elevationM);

  /** Slope dy/dx of the ray of this apparent elevation (rad) where it arrives. */
  double pathSlope(double apparentRad);

  /** A traced branch. */
  static ApparentBranch of(Branch branch) {
    return new ApparentBranch() {
      @Override
      public boolean upright() {
        return branch.sense() == Sense.UPRIGHT;
      }

      @Override
      public double lowestRad() {
        return branch.lowestRad();
      }

      @Override
      public double highestRad() {
        return branch.highestRad();
      }

      @Override
      public double lowestElevationM() {
        return branch.lowestElevationM();
      }

      @Override
      public double highestElevationM() {
        return branch.highestElevationM();
      }

      @Override
      public double apparentRad(double elevationM) {
        return branch.apparentRad(elevationM);
      }

      @Override
      public double pathSlope(double apparentRad) {
        return branch.pathSlope(apparentRad);
      }
    };
  }
}
