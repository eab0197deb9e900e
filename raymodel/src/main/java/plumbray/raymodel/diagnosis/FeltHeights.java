package plumbray.raymodel.diagnosis;

import java.util.List;

/**
 * The heights above the ground whose air decides where a thing at the end of a ray is seen.
 *
 * <p>Each part of the path at distance s counts with its lever arm D - s, D the distance of the
 * thing: turning the ray by an angle d there moves its end by (D - s) d, and so moves the thing in
 * the picture by (D - s) d/D. Air near the camera counts most, air at the thing nothing. This is
 * exact for small turns of a ray that the air before and behind bends evenly; where the bending
 * depends strongly on height, as in a mirage, a turn is magnified or taken back on its further way,
 * which these weights leave out on purpose: they tell where the bending is done, not how stable it
 * is.
 *
 * <p>Between the places of the path the height is taken straight, and the distribution of those
 * straight pieces is exact.
 */
public final class FeltHeights {

  private static final int HALVINGS = 50;

  /** Quantiles are searched to this, m. */
  private static final double SEARCHED_M = 1e-7;

  private final double reachM;
  private final double[] distancesM;
  private final double[] heightsM;
  private final double lowestM;
  private final double highestM;

  private FeltHeights(double[] distancesM, double[] heightsM) {
    this.distancesM = distancesM;
    this.heightsM = heightsM;
    reachM = distancesM[distancesM.length - 1];
    double low = heightsM[0];
    double high = heightsM[0];
    for (double z : heightsM) {
      low = Math.min(low, z);
      high = Math.max(high, z);
    }
    lowestM = low;
    highestM = high;
  }

  /** The heights that the light along a way felt. */
  public static FeltHeights of(RayPath path) {
    return new FeltHeights(path.distancesM(), path.heightsM());
  }

  /** Part of the weight of some parts of a path of length {@code reachM}, 0 to 1. */
  public static double share(List<Bend> parts, double reachM) {
    return parts.stream().mapToDouble(p -> weight(p.fromM(), p.toM(), reachM)).sum()
        / weight(0.0, reachM, reachM);
  }

  /** Integral of D - s from one distance to another, m^2. */
  private static double weight(double fromM, double toM, double reachM) {
    return (toM - fromM) * (reachM - 0.5 * (fromM + toM));
  }

  /** The mean height, m. */
  public double meanM() {
    double sum = 0.0;
    for (int i = 1; i < distancesM.length; i++) {
      double width = distancesM[i] - distancesM[i - 1];
      double arm = reachM - distancesM[i - 1];
      double rise = heightsM[i] - heightsM[i - 1];
      // integral of (arm - width u) (z + rise u) width du, u from 0 to 1
      sum +=
          width
              * (arm * (heightsM[i - 1] + 0.5 * rise)
                  - width * (0.5 * heightsM[i - 1] + rise / 3.0));
    }
    return sum / weight(0.0, reachM, reachM);
  }

  /** Part of the weight that lies below a height, 0 to 1. */
  public double shareBelow(double heightM) {
    double sum = 0.0;
    for (int i = 1; i < distancesM.length; i++) {
      double a = heightsM[i - 1] - heightM;
      double b = heightsM[i] - heightM;
      double from = distancesM[i - 1];
      double to = distancesM[i];
      if (a < 0.0 && b < 0.0) {
        sum += weight(from, to, reachM);
      } else if (a < 0.0) {
        sum += weight(from, from + (to - from) * a / (a - b), reachM);
      } else if (b < 0.0) {
        sum += weight(from + (to - from) * a / (a - b), to, reachM);
      }
    }
    return sum / weight(0.0, reachM, reachM);
  }

  /** The height below which a given part of the weight lies, m; {@code share} from 0 to 1. */
  public double quantileM(double share) {
    double low = lowestM;
    double high = highestM;
    for (int i = 0; i < HALVINGS && high - low > SEARCHED_M; i++) {
      double mid = 0.5 * (low + high);
      if (shareBelow(mid) < share) {
        low = mid;
      } else {
        high = mid;
      }
    }
    return 0.5 * (low + high);
  }
}
