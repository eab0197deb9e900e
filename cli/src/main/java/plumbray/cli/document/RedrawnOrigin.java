package plumbray.cli.document;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.FitDocument.NamedEstimate;
import plumbray.imaging.fit.Warning;
import plumbray.imaging.metadata.PhotoOrigin;
import plumbray.imaging.metadata.PhotoOrigin.Fact;
import plumbray.imaging.metadata.PhotoOrigin.Quantity;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * What a redrawn photo's own XMP says of where it comes from: the program, digests of what went in,
 * the verdict, and the air as it was found, by the names and in the units of the files.
 */
public final class RedrawnOrigin {
  private final List<Fact> facts = new ArrayList<>();

  private RedrawnOrigin(String program) {
    add("program", "Plumbray " + program);
  }

  /**
   * The origin of a photo that was redrawn by a fit.
   *
   * @param fit the fit
   * @param photo digest of the photo that was redrawn
   * @param redrawing how it was redrawn
   */
  public static PhotoOrigin of(FitDocument fit, Digest photo, String redrawing) {
    RedrawnOrigin origin = new RedrawnOrigin(ProgramVersion.name());
    origin.add("status", fit.status().key());
    if (!fit.inputs().isEmpty()) {
      origin.file("sight", fit.inputs().get(0));
    }
    origin.file("photo", photo);
    origin.sight(fit.sight(), redrawing);
    origin.add("residualCount", String.valueOf(fit.residuals().count()));
    origin.number("residualRmsPx", fit.residuals().rmsPx());
    origin.number("chiSquare", fit.residuals().chiSquare());
    origin.add("degreesOfFreedom", String.valueOf(fit.residuals().degreesOfFreedom()));
    origin.number("shimmerPx", fit.jitterPx());
    List<String> warnings = fit.warnings().stream().map(Warning::message).toList();
    return new PhotoOrigin(origin.facts, quantities(fit.sight(), fit.namedEstimates()), warnings);
  }

  /**
   * The origin of a photo that was redrawn by a sight file or a fit file.
   *
   * @param held what was read from the file
   * @param file digest of that file
   * @param photo digest of the photo that was redrawn
   * @param redrawing how it was redrawn
   */
  public static PhotoOrigin of(HeldSight held, Digest file, Digest photo, String redrawing) {
    Optional<FitDocument> fit = held.fit();
    if (fit.isPresent()) {
      return of(fit.get(), photo, redrawing);
    }
    RedrawnOrigin origin = new RedrawnOrigin(ProgramVersion.name());
    origin.add("status", "held");
    origin.file("sight", file);
    origin.file("photo", photo);
    origin.sight(held.sight(), redrawing);
    return new PhotoOrigin(origin.facts, quantities(held.sight(), List.of()), List.of());
  }

  private void add(String name, String text) {
    facts.add(new Fact(name, text));
  }

  private void number(String name, double value) {
    if (Double.isFinite(value)) {
      add(name, Numbers.shortest(value));
    }
  }

  private void file(String name, Digest digest) {
    add(name + "File", digest.name());
    add(name + "Sha256", digest.sha256());
  }

  private void sight(Sight sight, String redrawing) {
    sight.profile().family().map(ProfileFamily::key).ifPresent(key -> add("family", key));
    number("refractionCoefficient", sight.refractionCoefficient());
    add("redrawing", redrawing);
  }

  /** What was estimated, then what the profile holds besides. */
  private static List<Quantity> quantities(Sight sight, List<NamedEstimate> estimates) {
    List<Quantity> quantities = new ArrayList<>();
    Set<String> named = new HashSet<>();
    for (NamedEstimate estimate : estimates) {
      quantities.add(new Quantity(estimate.name(), estimate.value(), estimate.sigma()));
      named.add(estimate.name());
    }
    List<ProfileSetup> profiles = new ArrayList<>(List.of(sight.profile()));
    sight.profile().further().forEach(stretch -> profiles.add(stretch.profile()));
    for (int i = 0; i < profiles.size(); i++) {
      String prefix = profiles.size() == 1 ? "profile." : "profile[" + i + "].";
      for (Quantity held : held(profiles.get(i), prefix)) {
        if (!named.contains(held.name())) {
          quantities.add(held);
        }
      }
    }
    return quantities;
  }

  private static List<Quantity> held(ProfileSetup profile, String prefix) {
    List<Quantity> held = new ArrayList<>();
    for (ProfileParameter parameter : profile.family().orElseThrow().parameters()) {
      double value = profile.quantities().get(parameter.key()).value();
      double shown = Unit.ofSymbol(parameter.unit()).fromSi(value);
      held.add(new Quantity(prefix + parameter.key(), shown, Double.NaN));
    }
    return held;
  }
}
