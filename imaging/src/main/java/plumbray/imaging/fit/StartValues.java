package plumbray.imaging.fit;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.SlideScore.Start;

/** Turns starts into values of a sight's estimated quantities. */
final class StartValues {

  private StartValues() {}

  /** The sight's own values, but for the start's profile and pitch; kept within bounds. */
  static double[] of(SightParameters parameters, Start start) {
    Map<String, Double> values = byName(start.profile());
    List<Parameter> list = parameters.parameters();
    double[] out = parameters.values();
    for (int k = 0; k < out.length; k++) {
      Parameter p = list.get(k);
      if (p.name().equals("camera.pitchRad")) {
        out[k] += start.pitchShiftRad();
      }
      out[k] = values.getOrDefault(p.name(), out[k]);
      out[k] = Math.max(p.lowest(), Math.min(p.highest(), out[k]));
    }
    return out;
  }

  private static Map<String, Double> byName(ProfileSetup profile) {
    Map<String, Double> values = new HashMap<>();
    List<ProfileSetup> stretches = profile.stretches();
    for (int i = 0; i < stretches.size(); i++) {
      String prefix = profile.prefix(i);
      stretches.get(i).quantities().forEach((key, q) -> values.put(prefix + key, q.value()));
    }
    return values;
  }
}
