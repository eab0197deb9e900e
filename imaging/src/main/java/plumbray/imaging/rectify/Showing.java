package plumbray.imaging.rectify;

/** An interval of true elevations that one image shows, and where. */
interface Showing {
  /** Apparent elevation of a true one, rad. */
  double apparentRad(double trueRad);

  /**
   * Change of the true elevation with the share q = d / (D + d) by which the thing is farther away,
   * rad, for the ray that shows this true elevation at distance D.
   */
  double lagRad(double trueRad);
}
