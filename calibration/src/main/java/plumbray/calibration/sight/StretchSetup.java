package plumbray.calibration.sight;

import java.util.Objects;
import plumbray.calibration.sight.Checks.Named;

/**
 * A stretch of the path over ground of another kind, with air of its own.
 *
 * @param fromM distance at which it takes over from the stretch before, m, above 0
 * @param blendM length over which it does, centred on {@code fromM}, m, at least {@link
 *     #SHORTEST_BLEND_M}
 * @param profile temperature against height; of one family, without further stretches
 */
public record StretchSetup(double fromM, double blendM, ProfileSetup profile) {

  /** Shorter than this, air of another temperature would stand beside it like a pane, m. */
  public static final double SHORTEST_BLEND_M = 0.1;

  /** Checks the limits. */
  public StretchSetup {
    Objects.requireNonNull(profile, "profile");
    Checks.above(fromM, 0, new Named("fromM", "m", "where the stretch begins"));
    Checks.finite(fromM, new Named("fromM", "m", "where the stretch begins"));
    Checks.atLeast(
        blendM,
        SHORTEST_BLEND_M,
        new Named("blendM", "m", "length over which a stretch takes over"));
    Checks.finite(blendM, new Named("blendM", "m", "length over which a stretch takes over"));
    if (profile.family().isEmpty() || !profile.further().isEmpty()) {
      throw new IllegalArgumentException(
          "a stretch must have one family of profiles and no stretches of its own; name its"
              + " family");
    }
  }

  /** Where the blend begins, m. */
  public double startM() {
    return fromM - 0.5 * blendM;
  }

  /** Where the blend ends, m. */
  public double endM() {
    return fromM + 0.5 * blendM;
  }
}
