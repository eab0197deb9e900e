package plumbray.imaging.rectify;

/**
 * How surely rays of one distance are known: the standard deviation of where they belong in the
 * redrawn picture.
 *
 * @param distanceM distance of what they show, m
 * @param apparentRad apparent elevations, rad, not falling; at least one
 * @param sigmaPx standard deviation of the row in the redrawn picture, px, for each
 */
public record SigmaCurve(double distanceM, double[] apparentRad, double[] sigmaPx) {
  /** Copies the arrays and checks their lengths and order. */
  public SigmaCurve {
    if (apparentRad.length < 1 || apparentRad.length != sigmaPx.length) {
      throw new IllegalArgumentException(
          "curve has %d elevations and %d sigmas, must have as many of both, one at least"
              .formatted(apparentRad.length, sigmaPx.length));
    }
    for (int i = 1; i < apparentRad.length; i++) {
      if (!(apparentRad[i] >= apparentRad[i - 1])) {
        throw new IllegalArgumentException(
            "apparentRad[%d] is %s rad, must be at least %s rad (elevations rise); sort the rays"
                .formatted(i, apparentRad[i], apparentRad[i - 1]));
      }
    }
    apparentRad = apparentRad.clone();
    sigmaPx = sigmaPx.clone();
  }

  /** The standard deviation at an apparent elevation (rad), px; beyond the ends, that there. */
  double at(double rad) {
    int low = 0;
    int high = apparentRad.length - 1;
    if (rad <= apparentRad[low]) {
      return sigmaPx[low];
    }
    if (rad >= apparentRad[high]) {
      return sigmaPx[high];
    }
    while (high - low > 1) {
      int middle = (low + high) / 2;
      if (apparentRad[middle] <= rad) {
        low = middle;
      } else {
        high = middle;
      }
    }
    double share = (rad - apparentRad[low]) / (apparentRad[high] - apparentRad[low]);
    return sigmaPx[low] + share * (sigmaPx[high] - sigmaPx[low]);
  }
}
