package plumbray.calibration.sight;

import java.util.ArrayList;
import java.util.List;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.PathAir;

/**
 * The air of a sight whose families of profiles are chosen: one column a stretch, all through the
 * same state at the same height above the ground.
 */
public final class SightAir {

  private SightAir() {}

  /**
   * The column over one stretch.
   *
   * @param sight the sight
   * @param stretch its place along the path, 0 at the camera
   * @param carried parameters to differentiate by, as {@link AirColumn} takes them
   */
  public static AirColumn column(Sight sight, int stretch, int[] carried) {
    ProfileSetup profile = sight.profile().stretches().get(stretch);
    return AirColumn.of(
        sight.air().state(),
        sight.air().atHeightM(),
        profile.family().orElseThrow().profile(profile.values(), profile.stability()),
        carried);
  }

  /**
   * The air along the path.
   *
   * @param sight the sight
   * @param media the air over each stretch, from the camera on
   */
  public static PathAir along(Sight sight, List<? extends Medium> media) {
    List<PathAir.Stretch> stretches = new ArrayList<>();
    stretches.add(new PathAir.Stretch(0.0, 0.0, media.get(0)));
    List<StretchSetup> further = sight.profile().further();
    for (int i = 0; i < further.size(); i++) {
      StretchSetup next = further.get(i);
      stretches.add(new PathAir.Stretch(next.fromM(), next.blendM(), media.get(i + 1)));
    }
    return PathAir.of(stretches);
  }
}
