package plumbray.raymodel.diagnosis;

import java.util.ArrayList;
import java.util.List;
import plumbray.raymodel.mapping.CubicPiece;
import plumbray.raymodel.ray.StraightRay;

/** The way of one ray, at places close enough together to be read between them. */
public final class RayPath {

  private static final int HALVINGS = 50;

  private final double apparentRad;
  private final double earthRadiusM;
  private final LocalBending bending;
  private final double[] distancesM;
  private final double[] elevationsM;
  private final double[] slopes;
  private final double[] heightsM;
  private final double[] coefficients;
  private final boolean ended;

  /**
   * A way through places.
   *
   * @param places distance (m), elevation (m), slope dy/dx and height above the ground (m), one row
   *     a place, by rising distance
   */
  RayPath(
      double apparentRad,
      double earthRadiusM,
      LocalBending bending,
      double[][] places,
      boolean ended) {
    this.apparentRad = apparentRad;
    this.earthRadiusM = earthRadiusM;
    this.bending = bending;
    this.ended = ended;
    distancesM = column(places, 0);
    elevationsM = column(places, 1);
    slopes = column(places, 2);
    heightsM = column(places, 3);
    coefficients = new double[places.length];
    for (int i = 0; i < places.length; i++) {
      coefficients[i] = bending.coefficient(distancesM[i], elevationsM[i], slopes[i]);
    }
  }

  private static double[] column(double[][] rows, int at) {
    double[] column = new double[rows.length];
    for (int i = 0; i < rows.length; i++) {
      column[i] = rows[i][at];
    }
    return column;
  }

  /** Apparent elevation at which the ray leaves the camera, rad. */
  public double apparentRad() {
    return apparentRad;
  }

  /** Whether the ground, or what stands on it, ended the ray at the last place. */
  public boolean ended() {
    return ended;
  }

  /** How many places there are. */
  public int size() {
    return distancesM.length;
  }

  /** Distances of the places, m, rising, the first 0. */
  public double[] distancesM() {
    return distancesM.clone();
  }

  /** Elevations at the places, m. */
  public double[] elevationsM() {
    return elevationsM.clone();
  }

  /** Heights above the local ground at the places, m. */
  public double[] heightsM() {
    return heightsM.clone();
  }

  /** Refraction coefficients k at the places, positive where the ray is curved like the Earth. */
  public double[] coefficients() {
    return coefficients.clone();
  }

  /** Distance at which the ray arrives or ends, m. */
  public double reachM() {
    return distancesM[size() - 1];
  }

  /** The place at which the ray is lowest above the ground. */
  public int lowestPlace() {
    int lowest = 0;
    for (int i = 1; i < size(); i++) {
      lowest = heightsM[i] < heightsM[lowest] ? i : lowest;
    }
    return lowest;
  }

  /**
   * The refraction coefficient of the arc that leaves the camera as this ray does and ends where it
   * ends: 2 R/D^2 times how far the ray ends below a straight one. To first order this is the mean
   * of the local coefficients, each weighted with the distance from there to the end.
   */
  public double meanCoefficient() {
    double straight =
        new StraightRay(elevationsM[0], earthRadiusM, 0.0).elevationM(apparentRad, reachM());
    return 2.0 * earthRadiusM * (straight - elevationsM[size() - 1]) / (reachM() * reachM());
  }

  /**
   * Where the ray is concave and where it is convex to the ground, by the sign of its own curvature
   * in space. Changes are located to a part of a millimetre; two of them between neighbouring
   * places go unseen.
   *
   * @return parts that follow each other from the camera to the end
   */
  public List<Bend> bends() {
    List<Bend> bends = new ArrayList<>();
    double from = distancesM[0];
    for (int i = 1; i < size(); i++) {
      if (convex(coefficients[i]) != convex(coefficients[i - 1])) {
        double change = change(i - 1);
        bends.add(new Bend(from, change, curving(coefficients[i - 1])));
        from = change;
      }
    }
    if (reachM() > from) {
      bends.add(new Bend(from, reachM(), curving(coefficients[size() - 1])));
    }
    return bends;
  }

  private static boolean convex(double coefficient) {
    return coefficient < 0.0;
  }

  private static Bend.Curving curving(double coefficient) {
    return convex(coefficient) ? Bend.Curving.CONVEX : Bend.Curving.CONCAVE;
  }

  /** Distance between a place and the next at which the coefficient changes its sign. */
  private double change(int place) {
    boolean before = convex(coefficients[place]);
    double low = 0.0;
    double high = 1.0;
    for (int i = 0; i < HALVINGS; i++) {
      double mid = 0.5 * (low + high);
      if (convex(between(place, mid)) == before) {
        low = mid;
      } else {
        high = mid;
      }
    }
    double width = distancesM[place + 1] - distancesM[place];
    return distancesM[place] + 0.5 * (low + high) * width;
  }

  /** The coefficient on the cubic through elevations and slopes of a place and the next. */
  private double between(int i, double s) {
    double width = distancesM[i + 1] - distancesM[i];
    double y0 = elevationsM[i];
    double y1 = elevationsM[i + 1];
    return bending.coefficient(
        distancesM[i] + s * width,
        CubicPiece.value(s, width, y0, slopes[i], y1, slopes[i + 1]),
        CubicPiece.slope(s, width, y0, slopes[i], y1, slopes[i + 1]));
  }
}
