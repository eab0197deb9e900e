package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.IntStream;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.reading.StaffObservation;
import plumbray.imaging.reading.StaffObservation.StripModelSettings;
import plumbray.imaging.reading.StaffScene;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/**
 * Fits all families and lets the data choose, by the criterion of Schwarz (1978): each is judged on
 * the same rows, with the noise and the shimmer that suit it best.
 */
final class FamilyChoice {

  private static final double DEFAULT_GRADIENT_SIGMA_K_PER_M = 0.1;

  /** Families that leave this many times as much unexplained as the best are not refined. */
  private static final double HOPELESS = 3.0;

  private final Sight sight;
  private final References references;

  FamilyChoice(Sight sight, References references) {
    this.sight = sight;
    this.references = references;
  }

  /**
   * One family's part in the choice.
   *
   * @param family the family
   * @param sight the sight with that family
   * @param fit its fit
   * @param adjusted its adjustment
   * @param sure whether the bars themselves leave no doubt which edge is which
   */
  private record Candidate(
      ProfileFamily family, Sight sight, FamilyFit fit, Adjusted adjusted, boolean sure) {

    Candidate refined() {
      return with(fit.refine(adjusted));
    }

    private Candidate with(Adjusted other) {
      return new Candidate(family, sight, fit, other, sure);
    }

    Candidate barsRefined() {
      return with(fit.refineBars(adjusted));
    }

    Candidate onceAdjusted() {
      return with(fit.shimmering(adjusted, FamilyFit.FIRST_GUESS));
    }

    double looks() {
      return fit.looks(adjusted);
    }
  }

  /** A family with its criterion. */
  private record Judged(Candidate candidate, double criterion) {}

  /** The result of the family that the data prefer. */
  FitResult fit() {
    List<Candidate> first = candidates();
    if (first.isEmpty()) {
      return FitResult.failed(sight, SightFit.noStart());
    }
    List<Judged> judged = judged(first);
    Candidate best = judged.get(0).candidate();
    Adjusted chosen =
        references.staffs().isEmpty() ? best.adjusted() : best.fit().withGround(best.adjusted());
    List<Alternative> alternatives =
        judged.stream()
            .map(
                j ->
                    FitReport.alternative(
                        j.candidate().family(),
                        j.criterion(),
                        j.candidate().sight(),
                        j.candidate().adjusted()))
            .toList();
    return FitReport.of(best.sight(), chosen, alternatives).askedAs(sight);
  }

  private List<Judged> judged(List<Candidate> first) {
    if (references.staffs().isEmpty()) {
      return first.stream()
          .map(Candidate::refined)
          .map(c -> judged(c, c.adjusted().solution().cost(), c.adjusted().dataCount()))
          .sorted(Comparator.comparingDouble(Judged::criterion))
          .toList();
    }
    double[] looks = first.stream().mapToDouble(Candidate::looks).toArray();
    double least = Arrays.stream(looks).min().orElseThrow();
    double hopeless = least + new SlideScore(sight, references).weight() * Math.log(HOPELESS);
    List<Candidate> refined =
        IntStream.range(0, looks.length)
            .parallel()
            .mapToObj(
                i ->
                    looks[i] <= hopeless ? first.get(i).barsRefined() : first.get(i).onceAdjusted())
            .toList();
    int leader =
        IntStream.range(0, looks.length)
            .boxed()
            .min(Comparator.comparingDouble(i -> refined.get(i).looks()))
            .orElseThrow();
    List<StripModelSettings> rows = commonRows(refined, refined.get(leader).adjusted());
    int data = refined.get(leader).adjusted().dataCount();
    return refined.stream()
        .parallel()
        .map(c -> judged(c, c.fit().deviance(c.adjusted(), rows), data))
        .sorted(Comparator.comparingDouble(Judged::criterion))
        .toList();
  }

  private static Judged judged(Candidate candidate, double deviance, int data) {
    double price = candidate.adjusted().estimated() * Math.log(Math.max(2, data));
    return new Judged(candidate, deviance + price);
  }

  /** Rows that count for any family, with the leader's weights. */
  private List<StripModelSettings> commonRows(List<Candidate> candidates, Adjusted leader) {
    List<StripModelSettings> all = new ArrayList<>();
    for (int r = 0; r < references.staffs().size(); r++) {
      StaffScene scene = references.staffs().get(r);
      boolean[] used = new boolean[scene.strip().rows()];
      for (Candidate c : candidates) {
        StaffObservation seen = (StaffObservation) c.adjusted().observation().references().get(r);
        for (int i : seen.settings().used()) {
          used[i] = true;
        }
      }
      StaffObservation led = (StaffObservation) leader.observation().references().get(r);
      double[] noise = led.settings().noiseFactors().clone();
      double usual = Arrays.stream(noise).min().orElseThrow();
      for (int i = 0; i < noise.length; i++) {
        noise[i] /= usual;
      }
      int[] rows = IntStream.range(0, used.length).filter(i -> used[i]).toArray();
      all.add(new StripModelSettings(rows, noise, led.settings().spreadPx()));
    }
    return all;
  }

  /**
   * All families along what the strips tell; where none of them explains the strips, from a search.
   */
  private List<Candidate> candidates() {
    List<Candidate> along = candidates(FamilyFit::alongTrails);
    if (along.stream().anyMatch(Candidate::sure)) {
      return along;
    }
    List<SlideScore.Start> locks = StartSearch.locks(sight, references);
    Map<ProfileFamily, Candidate> best = new EnumMap<>(ProfileFamily.class);
    along.forEach(c -> best.put(c.family(), c));
    candidates(f -> f.searched(locks).map(a -> new FirstFit.Along(a, false)))
        .forEach(c -> best.merge(c.family(), c, FamilyChoice::better));
    return List.copyOf(best.values());
  }

  private static Candidate better(Candidate a, Candidate b) {
    return a.looks() <= b.looks() ? a : b;
  }

  private List<Candidate> candidates(Function<FamilyFit, Optional<FirstFit.Along>> first) {
    return Arrays.stream(ProfileFamily.values())
        .parallel()
        .map(
            family -> {
              Sight open = sight.withProfile(open(family));
              FamilyFit fit = new FamilyFit(open, references);
              return first
                  .apply(fit)
                  .map(a -> new Candidate(family, open, fit, a.adjusted(), a.sure()));
            })
        .flatMap(Optional::stream)
        .toList();
  }

  /** A family with every quantity open, within what air near the ground does. */
  private static ProfileSetup open(ProfileFamily family) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    for (ProfileParameter p : family.parameters()) {
      Quantity q;
      if (p.key().equals("gradientKPerM") && family != ProfileFamily.UNIFORM) {
        q = Quantity.prior(p.defaultValue().orElseThrow(), DEFAULT_GRADIENT_SIGMA_K_PER_M);
      } else {
        q = Quantity.free(FamilyStarts.typical(p.key())).within(p.lowest(), p.highest());
      }
      quantities.put(p.key(), q);
    }
    return new ProfileSetup(Optional.of(family), quantities, Stability.DYER);
  }
}
