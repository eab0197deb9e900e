package plumbray.cli.document;

import java.util.List;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.TemperatureProfile;

/**
 * Checks that the air's state and the profile make air that can be, from the ground to the camera
 * and to where the state is known: each number can be in its range and the sum of them still below
 * absolute zero.
 */
final class AirCheck {
  /** From colder than any air on earth to hotter than that over any ground looked across. */
  private static final Limits AIR = new Limits("temperature of the air", Unit.CELSIUS, -150, 1200);

  private static final int STEPS = 64;
  private static final double LOWEST_STEP_M = 1e-4;

  private AirCheck() {}

  static void check(Node profileNode, ProfileSetup profile, AirSetup air, double cameraHeightM) {
    if (profile.family().isEmpty()) {
      return;
    }
    if (!profileNode.isArray()) {
      checkOne(profileNode, profile, air, cameraHeightM);
      return;
    }
    List<Node> nodes = profileNode.elements("stretches");
    for (int i = 0; i < nodes.size(); i++) {
      checkOne(nodes.get(i), profile.stretches().get(i), air, cameraHeightM);
    }
  }

  private static void checkOne(
      Node profileNode, ProfileSetup profile, AirSetup air, double cameraHeightM) {
    ProfileFamily family = profile.family().get();
    TemperatureProfile shape = family.profile(profile.values(), profile.stability());
    double offsetK = air.temperatureK().value() - at(shape, air.atHeightM());
    double topM = Math.max(cameraHeightM, air.atHeightM());
    for (int i = 0; i <= STEPS; i++) {
      double heightM =
          i == 0 ? 0.0 : LOWEST_STEP_M * Math.pow(topM / LOWEST_STEP_M, (double) i / STEPS);
      double temperatureC = Unit.CELSIUS.fromSi(offsetK + at(shape, heightM));
      if (!AIR.hold(temperatureC)) {
        throw wrong(profileNode, temperatureC, heightM);
      }
    }
  }

  private static double at(TemperatureProfile shape, double heightM) {
    double[] out = new double[3 + 2 * shape.parameterCount()];
    shape.evaluate(heightM, out);
    return out[0];
  }

  private static InputException wrong(Node profile, double temperatureC, double heightM) {
    String temperature = Unit.CELSIUS.show(Numbers.rounded(temperatureC, 5));
    String height = Unit.METRE.show(Numbers.rounded(heightM, 3));
    return profile.wrong("air of " + temperature + " at " + height, AIR.range(), AIR.what());
  }
}
