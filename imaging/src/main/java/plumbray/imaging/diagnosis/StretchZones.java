package plumbray.imaging.diagnosis;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.diagnosis.HeightZone;
import plumbray.raymodel.diagnosis.SteepAir;
import plumbray.raymodel.profile.TemperatureProfile;

/**
 * Heights over one stretch of the path at which the air is steeper than autoconvective.
 *
 * @param fromM distance at which the stretch begins, m; 0 at the camera
 * @param zones the heights, rising
 */
public record StretchZones(double fromM, List<HeightZone> zones) {

  /** Copies the zones. */
  public StretchZones {
    zones = List.copyOf(zones);
  }

  /** One entry a stretch of the path, from the camera on. */
  public static List<StretchZones> of(Sight sight) {
    List<StretchZones> all = new ArrayList<>();
    for (int i = 0; i < sight.profile().stretches().size(); i++) {
      double from = i == 0 ? 0.0 : sight.profile().further().get(i - 1).fromM();
      all.add(
          new StretchZones(
              from,
              SteepAir.zones(
                  SightOptics.column(sight, List.of(), i), TemperatureProfile.LINEAR_ABOVE_M)));
    }
    return all;
  }
}
