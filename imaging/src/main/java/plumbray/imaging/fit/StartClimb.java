package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BiFunction;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * Improves a start by trying its neighbours, alone and in pairs, with steps that halve when none is
 * better. The pattern of a finely divided staff fits well only near the right profile, nearer than
 * a grid of affordable size can come.
 */
final class StartClimb {

  private static final double FIRST_STEP = 1.0;
  private static final double LAST_STEP = 0.06;
  private static final int MOST_TRIALS = 220;
  private static final double LENGTH_STEP = 0.45;
  private static final double SHARE_STEP = 0.3;

  private final List<ProfileParameter> parameters;
  private final List<Quantity> quantities;
  private final BiFunction<double[], Double, Optional<SlideScore.Start>> slide;
  private final List<int[]> moves = new ArrayList<>();

  /** Climbs with {@code slide}, which scores a profile about a pitch. */
  StartClimb(ProfileSetup profile, BiFunction<double[], Double, Optional<SlideScore.Start>> slide) {
    this.slide = slide;
    parameters = profile.family().orElseThrow().parameters();
    quantities = profile.quantities().entrySet().stream().map(Map.Entry::getValue).toList();
    List<Integer> open = new ArrayList<>();
    for (int k = 0; k < quantities.size(); k++) {
      if (quantities.get(k).estimated()) {
        open.add(k);
      }
    }
    for (int i = 0; i < open.size(); i++) {
      addMove(open.get(i), 1, -1, 0);
      addMove(open.get(i), -1, -1, 0);
      for (int j = 0; j < i; j++) {
        for (int sign : new int[] {1, -1}) {
          addMove(open.get(i), 1, open.get(j), sign);
          addMove(open.get(i), -1, open.get(j), sign);
        }
      }
    }
  }

  private void addMove(int k, int signK, int l, int signL) {
    int[] move = new int[quantities.size()];
    move[k] = signK;
    if (l >= 0) {
      move[l] = signL;
    }
    moves.add(move);
  }

  /** The best start found from one. */
  SlideScore.Start from(SlideScore.Start start) {
    // a start that was found coarsely is scored afresh, so that it can be compared
    SlideScore.Start best =
        slide.apply(start.profile().values(), start.pitchShiftRad()).orElse(start);
    int trials = 1;
    double step = FIRST_STEP;
    while (step > LAST_STEP && trials < MOST_TRIALS) {
      SlideScore.Start before = best;
      for (int[] move : moves) {
        boolean better = true;
        while (better && trials < MOST_TRIALS) {
          Optional<SlideScore.Start> trial =
              slide.apply(moved(best.profile().values(), move, step), best.pitchShiftRad());
          trials++;
          better = trial.isPresent() && trial.get().score() < best.score();
          best = better ? trial.get() : best;
        }
      }
      step = best == before ? 0.5 * step : step;
    }
    return best;
  }

  private double[] moved(double[] values, int[] move, double step) {
    double[] out = values.clone();
    for (int k = 0; k < out.length; k++) {
      if (move[k] != 0) {
        Quantity q = quantities.get(k);
        double value = moved(parameters.get(k).key(), q, out[k], move[k] * step);
        double low = Math.max(q.lowest(), parameters.get(k).lowest());
        double high = Math.min(q.highest(), parameters.get(k).highest());
        out[k] = Math.max(low, Math.min(high, value));
      }
    }
    return out;
  }

  private static double moved(String key, Quantity q, double value, double step) {
    return switch (key) {
      case "scaleHeightM", "upperScaleHeightM", "halfWidthM", "centreM" ->
          value * Math.exp(LENGTH_STEP * step);
      case "roughnessM", "obukhovLengthM" -> value * Math.exp(2.0 * LENGTH_STEP * step);
      case "gradientKPerM" -> value + step * (q.hasPrior() ? q.sigma() : 0.05);
      case "exponent" -> value + 0.1 * step;
      case "slopeK", "temperatureScaleK", "amplitudeK" ->
          value + SHARE_STEP * step * Math.max(Math.abs(value), 0.3);
      default -> value + SHARE_STEP * step * Math.max(Math.abs(value), 3.0);
    };
  }
}
