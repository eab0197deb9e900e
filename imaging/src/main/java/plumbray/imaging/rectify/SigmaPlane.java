package plumbray.imaging.rectify;

import java.util.Arrays;
import java.util.List;

/**
 * How surely every pixel of a redrawn picture stands where it does.
 *
 * @param widthPx columns
 * @param heightPx rows
 * @param sigmaPx standard deviation of the row in which the pixel's content belongs, px, row by
 *     row; NaN where nothing was restored, and on ground, whose uncertainty is not worked out; not
 *     copied, so leave it alone
 */
public record SigmaPlane(int widthPx, int heightPx, float[] sigmaPx) {
  /** Looked up every so many columns, straight between: sigma changes slowly along a row. */
  private static final int STEP_PX = 32;

  /** Written in steps of 2^-12 px, so that files stay small. */
  private static final double STEPS_PER_PX = 4096;

  /** Checks that the values fill the plane. */
  public SigmaPlane {
    if (widthPx < 1 || heightPx < 1 || (long) widthPx * heightPx != sigmaPx.length) {
      throw new IllegalArgumentException(
          "sigmaPx has %d entries, must be %d x %d (sigma plane); give one per pixel"
              .formatted(sigmaPx.length, widthPx, heightPx));
    }
  }

  /**
   * The plane of a map.
   *
   * @param map where everything is seen
   * @param curves how surely the rays of each distance are known; regions of other distances are
   *     left NaN
   */
  public static SigmaPlane of(RectifyMap map, List<SigmaCurve> curves) {
    SigmaCurve[] ofRegion = new SigmaCurve[map.regionCount()];
    for (SigmaCurve curve : curves) {
      for (int region = 0; region < ofRegion.length; region++) {
        if (curve.distanceM() == map.distanceM(region)) {
          ofRegion[region] = curve;
        }
      }
    }
    float[] plane = new float[map.widthPx() * map.heightPx()];
    Arrays.fill(plane, Float.NaN);
    RowReader reader = new RowReader(map);
    for (int y = 0; y < map.heightPx(); y++) {
      RowSpans spans = reader.read(y);
      for (int i = 0; i < spans.count(); i++) {
        Span span = spans.get(i);
        if (span.isShown() && ofRegion[span.region] != null) {
          fill(span, ofRegion[span.region], plane, y * map.widthPx() + span.from);
        }
      }
    }
    return new SigmaPlane(map.widthPx(), map.heightPx(), plane);
  }

  private static void fill(Span span, SigmaCurve curve, float[] plane, int at) {
    for (int from = 0; from < span.length(); from += STEP_PX) {
      int to = Math.min(span.length(), from + STEP_PX);
      double first = curve.at(span.apparentRad.at(from));
      double perColumn = (curve.at(span.apparentRad.at(to)) - first) / (to - from);
      for (int t = from; t < to; t++) {
        plane[at + t] = stepped(first + (t - from) * perColumn);
      }
    }
  }

  private static float stepped(double sigmaPx) {
    return (float) (Math.rint(sigmaPx * STEPS_PER_PX) / STEPS_PER_PX);
  }

  /** Sigma at column x and row y, px. */
  public float at(int x, int y) {
    return sigmaPx[y * widthPx + x];
  }

  /**
   * The parts of the pixels with a sigma that lie below bounds, 0 to 1.
   *
   * @param boundsPx bounds, px
   * @return for each, the share of pixels whose sigma is below it; all 0 where no pixel has one
   */
  public double[] sharesBelow(double... boundsPx) {
    double[] shares = new double[boundsPx.length];
    long known = 0;
    for (float sigma : sigmaPx) {
      if (!Float.isNaN(sigma)) {
        known++;
        for (int i = 0; i < boundsPx.length; i++) {
          shares[i] += sigma < boundsPx[i] ? 1 : 0;
        }
      }
    }
    for (int i = 0; i < shares.length && known > 0; i++) {
      shares[i] /= known;
    }
    return shares;
  }
}
