package plumbray.imaging.reading;

import java.util.Arrays;
import plumbray.calibration.sight.StaffTarget;

/**
 * What lies at a height of a staff, as a number: bars count from 0 at the foot; one more is what is
 * above the staff; {@link #BELOW} is what is below its lowest edge, {@link #GROUND} the ground in
 * front of it.
 */
final class StaffBars {

  static final int BELOW = -1;
  static final int GROUND = -2;

  private final double[] edges;
  private final boolean firstDark;

  StaffBars(StaffTarget staff) {
    edges = staff.edgesM();
    firstDark = staff.firstBarDark();
  }

  int edgeCount() {
    return edges.length;
  }

  double edgeM(int i) {
    return edges[i];
  }

  /** What lies at a height above the foot. */
  int at(double heightM) {
    int i = Arrays.binarySearch(edges, heightM);
    return i >= 0 ? i : -i - 2;
  }

  boolean isBar(int what) {
    return what >= 0 && what < edges.length - 1;
  }

  boolean isDark(int bar) {
    return (bar % 2 == 0) == firstDark;
  }
}
