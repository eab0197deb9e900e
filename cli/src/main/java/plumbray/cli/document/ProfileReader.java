package plumbray.cli.document;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;
import plumbray.raymodel.profile.Stability;

/** Reads {@code profile} of a sight file: temperature against height. */
final class ProfileReader {
  static final String BEST = "best";
  static final String LAYERED = "layered";

  private static final String FAMILY = "family of temperature profiles";
  private static final String OBUKHOV_LENGTH = "obukhovLengthM";
  private static final String STABILITY = "stability";

  private ProfileReader() {}

  static ProfileSetup read(Node profile) {
    if (profile.isArray()) {
      return StretchReader.read(profile);
    }
    Node name = family(profile);
    String key = name.choice(FAMILY, families());
    if (key.equals(BEST)) {
      profile.onlyKeys("all families are tried; none of their keys is given", List.of("family"));
      return new ProfileSetup(Optional.empty(), Map.of(), Stability.DYER);
    }
    return ofFamily(profile, ProfileFamily.ofKey(key).orElseThrow(), List.of());
  }

  /** The profile of one stretch, which has keys of its own besides the family's. */
  static ProfileSetup readStretch(Node stretch, List<String> ownKeys) {
    Node name = family(stretch);
    if (BEST.equals(name.json().textValue())) {
      throw name.wrong(
          "one of " + String.join(", ", named()),
          FAMILY + "; in a list of stretches each must be named");
    }
    String key = name.choice(FAMILY, named());
    return ofFamily(stretch, ProfileFamily.ofKey(key).orElseThrow(), ownKeys);
  }

  private static ProfileSetup ofFamily(Node profile, ProfileFamily family, List<String> ownKeys) {
    List<String> keys = new ArrayList<>(ownKeys);
    keys.addAll(keys(family));
    profile.onlyKeys("the profile of the family " + family.key(), keys);
    return new ProfileSetup(Optional.of(family), quantities(profile, family), stability(profile));
  }

  private static Node family(Node profile) {
    if (!profile.isObject()) {
      throw profile.wrong("an object", "temperature against height");
    }
    Node family = profile.get("family", FAMILY);
    if (family.json().isTextual() && family.json().textValue().equals(LAYERED)) {
      throw family.wrong(
          "one of " + String.join(", ", families()),
          FAMILY + "; this release does not read " + LAYERED);
    }
    return family;
  }

  private static List<String> families() {
    List<String> keys = new ArrayList<>(named());
    keys.add(BEST);
    return keys;
  }

  private static List<String> named() {
    return Arrays.stream(ProfileFamily.values()).map(ProfileFamily::key).toList();
  }

  private static List<String> keys(ProfileFamily family) {
    List<String> keys = new ArrayList<>();
    keys.add("family");
    family.parameters().forEach(parameter -> keys.add(parameter.key()));
    if (family == ProfileFamily.SIMILARITY) {
      keys.add(STABILITY);
    }
    return keys;
  }

  private static Map<String, Quantity> quantities(Node profile, ProfileFamily family) {
    Map<String, Quantity> quantities = new LinkedHashMap<>();
    for (ProfileParameter parameter : family.parameters()) {
      String key = parameter.key();
      Limits limits = limits(parameter);
      quantities.put(
          key,
          parameter.defaultValue().isPresent()
              ? Quantities.read(profile, key, limits, parameter.defaultValue().getAsDouble())
              : Quantities.read(profile, key, limits));
    }
    checkObukhovLength(profile, quantities);
    return quantities;
  }

  private static void checkObukhovLength(Node profile, Map<String, Quantity> quantities) {
    Quantity length = quantities.get(OBUKHOV_LENGTH);
    if (length != null && length.value() == 0.0) {
      throw profile
          .child(OBUKHOV_LENGTH)
          .wrong(Unit.METRE.show(0.0), "below or above 0 m", "the profile's " + OBUKHOV_LENGTH);
    }
  }

  static Limits limits(ProfileParameter parameter) {
    return new Limits(
        "the profile's " + parameter.key(),
        Unit.ofSymbol(parameter.unit()),
        parameter.lowest(),
        parameter.highest());
  }

  private static Stability stability(Node profile) {
    String dyer = Stability.DYER.key();
    String twoThirds = Stability.TWO_THIRDS.key();
    return profile
        .find(STABILITY)
        .map(node -> node.choice("stability functions", List.of(dyer, twoThirds)))
        .filter(twoThirds::equals)
        .map(two -> Stability.TWO_THIRDS)
        .orElse(Stability.DYER);
  }
}
