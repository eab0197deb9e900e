package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StretchSetup;

/**
 * The air over a stretch of the path after the first.
 *
 * @param fromM distance at which it begins, m
 * @param rows temperature against height over its ground
 */
public record StretchTemperatures(double fromM, List<TemperatureRow> rows) {

  /** Copies the rows. */
  public StretchTemperatures {
    rows = List.copyOf(rows);
  }

  /** One entry a stretch after the first; none where the air is the same all along. */
  public static List<StretchTemperatures> of(Sight sight, Estimates estimates) {
    List<StretchSetup> further = sight.profile().further();
    List<StretchTemperatures> all = new ArrayList<>();
    for (int i = 0; i < further.size(); i++) {
      List<TemperatureRow> rows = TemperatureRow.of(sight, estimates, i + 1);
      all.add(new StretchTemperatures(further.get(i).fromM(), rows));
    }
    return all;
  }
}
