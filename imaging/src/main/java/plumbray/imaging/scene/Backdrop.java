package plumbray.imaging.scene;

import java.util.List;
import java.util.Objects;

/**
 * What there is behind and beneath the things of a scene.
 *
 * @param sky the sky
 * @param ground the ground
 * @param haze the light that the air itself adds with distance
 */
public record Backdrop(Sky sky, Ground ground, Haze haze) {
  /** Checks that all are there. */
  public Backdrop {
    Objects.requireNonNull(sky, "sky");
    Objects.requireNonNull(ground, "ground");
    Objects.requireNonNull(haze, "haze");
  }

  /**
   * A sky whose colour changes with elevation, linearly in linear light.
   *
   * @param horizon colour at elevation 0 and below
   * @param high colour at {@code highRad} and above
   * @param highRad elevation at which the second colour is reached (rad), above 0; elevations are
   *     those of the ray where it leaves the scene, so that a mirage shows the sky it shows in
   *     nature
   */
  public record Sky(LinearColour horizon, LinearColour high, double highRad) {
    /** Checks the elevation. */
    public Sky {
      Objects.requireNonNull(horizon, "horizon");
      Objects.requireNonNull(high, "high");
      if (!(highRad > 0) || !Double.isFinite(highRad)) {
        throw new IllegalArgumentException(
            "highRad is %s rad, must be above 0 rad (elevation of the sky's second colour)"
                .formatted(highRad));
      }
    }
  }

  /**
   * The ground: one paint, with patches laid over it.
   *
   * @param paint its paint
   * @param patches rectangles of other paint, the last on top
   * @param reachM how far from the camera it reaches (m), above 0; sky beyond
   */
  public record Ground(Paint paint, List<Patch> patches, double reachM) {
    /** Checks the reach and copies the patches. */
    public Ground {
      Objects.requireNonNull(paint, "paint");
      patches = List.copyOf(patches);
      if (!(reachM > 0) || !Double.isFinite(reachM)) {
        throw new IllegalArgumentException(
            "reachM is %s m, must be above 0 m (how far the ground reaches)".formatted(reachM));
      }
    }

    Paint paintAt(double acrossM, double distanceM) {
      for (int i = patches.size() - 1; i >= 0; i--) {
        if (patches.get(i).holds(acrossM, distanceM)) {
          return patches.get(i).paint();
        }
      }
      return paint;
    }
  }

  /**
   * A rectangle on the ground: a road, a strip of another soil.
   *
   * @param leftM its left side, lateral position (m)
   * @param rightM its right side (m), above {@code leftM}
   * @param fromM its near side, distance (m)
   * @param toM its far side, distance (m), above {@code fromM}
   * @param paint its paint
   */
  public record Patch(double leftM, double rightM, double fromM, double toM, Paint paint) {
    /** Checks that the patch has an area. */
    public Patch {
      Objects.requireNonNull(paint, "paint");
      if (!(rightM > leftM && toM > fromM) || !Double.isFinite(rightM - leftM + toM - fromM)) {
        throw new IllegalArgumentException(
            "patch is %s to %s m across and %s to %s m away, must have an area"
                .formatted(leftM, rightM, fromM, toM));
      }
    }

    boolean holds(double acrossM, double distanceM) {
      return acrossM >= leftM && acrossM < rightM && distanceM >= fromM && distanceM < toM;
    }
  }

  /**
   * Haze after Koschmieder (1924): the light of a thing at distance D is weakened to exp(-D/range),
   * and the rest filled up with the haze's own light.
   *
   * @param colour colour of the haze
   * @param rangeM range (m), above 0; may be infinite for air without haze
   */
  public record Haze(LinearColour colour, double rangeM) {
    /** Checks the range. */
    public Haze {
      Objects.requireNonNull(colour, "colour");
      if (!(rangeM > 0)) {
        throw new IllegalArgumentException(
            "rangeM is %s m, must be above 0 m (range of the haze)".formatted(rangeM));
      }
    }

    /** Clear air. */
    public static Haze none() {
      return new Haze(LinearColour.grey(0), Double.POSITIVE_INFINITY);
    }

    double passed(double distanceM) {
      return Math.exp(-distanceM / rangeM);
    }
  }
}
