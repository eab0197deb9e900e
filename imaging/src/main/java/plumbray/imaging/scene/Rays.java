package plumbray.imaging.scene;

import java.util.OptionalDouble;

/** Where the rays of a camera lie, by apparent elevation. */
interface Rays {
  /** The rays at one distance. */
  AtDistance at(double distanceM);

  /** Distance (m) at which a direction meets the ground; empty where it does not. */
  OptionalDouble groundDistanceM(double apparentRad);

  /** The rays at one distance. */
  interface AtDistance {
    /** Elevation of the ground there (m). */
    double groundM();

    /**
     * Where the ray of an apparent elevation lies.
     *
     * @param apparentRad apparent elevation (rad)
     * @param out receives its elevation (m) and dy/dx, NaN or anything where the ground stops it
     *     before
     */
    void evaluate(double apparentRad, double[] out);
  }
}
