package plumbray.imaging.scene;

/**
 * A small range of directions.
 *
 * @param lowestRad lowest apparent elevation (rad)
 * @param highestRad highest apparent elevation (rad)
 * @param leastTan least tangent of the azimuth
 * @param greatestTan greatest tangent of the azimuth
 */
record Window(double lowestRad, double highestRad, double leastTan, double greatestTan) {
  /** The greatest tangent of the azimuth to either side. */
  double widestTan() {
    return Math.max(Math.abs(leastTan), Math.abs(greatestTan));
  }
}
