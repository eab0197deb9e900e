package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * Which estimated quantity acts where: on the air (and there as which parameter of the column), on
 * the camera's height, on its attitude or focal length, or on a reference's foot.
 */
public final class EstimateLayout {

  private static final String PROFILE = "profile.";
  private static final List<String> STATE =
      List.of("air.temperatureK", "air.pressurePa", "air.relativeHumidity");

  private final int[] airOf;
  private final int[] columnParameters;
  private final List<String> names;

  private EstimateLayout(List<String> names, int[] airOf, int[] columnParameters) {
    this.names = List.copyOf(names);
    this.airOf = airOf;
    this.columnParameters = columnParameters;
  }

  /** The layout for estimates of a sight, by name. */
  public static EstimateLayout of(Sight sight, List<String> names) {
    List<String> keys =
        sight.profile().family().map(ProfileFamily::parameters).orElse(List.of()).stream()
            .map(ProfileParameter::key)
            .toList();
    int[] airOf = new int[names.size()];
    List<Integer> carried = new ArrayList<>();
    for (int i = 0; i < names.size(); i++) {
      int index = columnIndex(names.get(i), keys);
      airOf[i] = index < 0 ? -1 : carried.size();
      if (index >= 0) {
        carried.add(index);
      }
    }
    return new EstimateLayout(names, airOf, carried.stream().mapToInt(Integer::intValue).toArray());
  }

  private static int columnIndex(String name, List<String> keys) {
    if (name.startsWith(PROFILE)) {
      return keys.indexOf(name.substring(PROFILE.length()));
    }
    int state = STATE.indexOf(name);
    return state < 0 ? -1 : keys.size() + state;
  }

  /** Indices of the column's parameters that are estimated, in the order of the estimates. */
  public int[] columnParameters() {
    return columnParameters.clone();
  }

  /** How many quantities are estimated. */
  public int size() {
    return names.size();
  }

  /** Name of estimate {@code i}. */
  public String name(int i) {
    return names.get(i);
  }

  /** Place of estimate {@code i} among {@link #columnParameters}, -1 where it is not of the air. */
  public int airIndex(int i) {
    return airOf[i];
  }

  /**
   * Derivative of an elevation at fixed apparent elevation by estimate {@code i}, to be read from a
   * branch's sensitivities: 0 for the camera's height, 1 and on for the air; -1 for none.
   */
  public int sensitivityIndex(int i) {
    if (airOf[i] >= 0) {
      return 1 + airOf[i];
    }
    return names.get(i).equals("camera.heightM") ? 0 : -1;
  }
}
