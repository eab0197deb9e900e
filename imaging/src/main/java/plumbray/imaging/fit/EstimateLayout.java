package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.ProfileParameter;

/**
 * Which estimated quantity acts where: on the air (and there as which parameter of the column), on
 * the camera's height, on its attitude or focal length, or on a reference's foot.
 */
public final class EstimateLayout {

  private static final List<String> STATE =
      List.of("air.temperatureK", "air.pressurePa", "air.relativeHumidity");

  private final int[] airOf;

  /** By stretch: for each estimate of the air, which of the column's parameters it is. */
  private final int[][] columnParameters;

  private final List<String> names;

  private EstimateLayout(List<String> names, int[] airOf, int[][] columnParameters) {
    this.names = List.copyOf(names);
    this.airOf = airOf;
    this.columnParameters = columnParameters;
  }

  /** The layout for estimates of a sight, by name. */
  public static EstimateLayout of(Sight sight, List<String> names) {
    List<ProfileSetup> stretches = sight.profile().stretches();
    int[] airOf = new int[names.size()];
    List<int[]> carried = new ArrayList<>();
    for (int i = 0; i < names.size(); i++) {
      int[] indices = new int[stretches.size()];
      for (int s = 0; s < indices.length; s++) {
        indices[s] = columnIndex(names.get(i), sight.profile().prefix(s), stretches.get(s));
      }
      boolean ofAir = Arrays.stream(indices).anyMatch(index -> index >= 0);
      airOf[i] = ofAir ? carried.size() : -1;
      if (ofAir) {
        carried.add(indices);
      }
    }
    int[][] byStretch = new int[stretches.size()][];
    for (int s = 0; s < byStretch.length; s++) {
      int stretch = s;
      byStretch[s] = carried.stream().mapToInt(indices -> indices[stretch]).toArray();
    }
    return new EstimateLayout(names, airOf, byStretch);
  }

  private static int columnIndex(String name, String prefix, ProfileSetup profile) {
    List<String> keys =
        profile.family().map(ProfileFamily::parameters).orElse(List.of()).stream()
            .map(ProfileParameter::key)
            .toList();
    if (name.startsWith(prefix)) {
      return keys.indexOf(name.substring(prefix.length()));
    }
    int state = STATE.indexOf(name);
    return state < 0 ? AirColumn.FOREIGN : keys.size() + state;
  }

  /**
   * What each estimate of the air, in order, is among the parameters of the column over a stretch.
   *
   * @param stretch its place along the path, 0 at the camera
   * @return indices into the column's full list of parameters, {@link AirColumn#FOREIGN} for a
   *     quantity of another stretch
   */
  public int[] columnParameters(int stretch) {
    return columnParameters[stretch].clone();
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
