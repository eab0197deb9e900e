package plumbray.cli.document;

import java.util.ArrayList;
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
      throw profile.wrong(
          "a list of stretches",
          "one profile",
          "temperature against height; this release does not read stretches");
    }
    Node name = family(profile);
    String key = name.choice(FAMILY, families());
    if (key.equals(BEST)) {
      profile.onlyKeys("all families are tried; none of their keys is given", List.of("family"));
      return new ProfileSetup(Optional.empty(), Map.of(), Stability.DYER);
    }
    ProfileFamily family = ProfileFamily.ofKey(key).orElseThrow();
    profile.onlyKeys("the profile of the family " + key, keys(family));
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
    List<String> keys = new ArrayList<>();
    for (ProfileFamily family : ProfileFamily.values()) {
      keys.add(family.key());
    }
    keys.add(BEST);
    return keys;
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
