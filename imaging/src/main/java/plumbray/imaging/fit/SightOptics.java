package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightAir;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.ray.PathAir;
import plumbray.raymodel.ray.RayTracer;
import plumbray.raymodel.ray.StraightRay;
import plumbray.raymodel.ray.TabulatedMedium;

/**
 * What a sight's camera sees, at the current values of all its quantities: the camera, the air, and
 * the mapping at every distance in use over all of the picture's rows.
 */
public final class SightOptics {

  /** Mappings are good to this part of a pixel. */
  public static final double TOLERANCE_PX = 0.005;

  private static final double MARGIN = 0.05;

  /** Ground is followed this many times as far as the farthest distance in use. */
  private static final double GROUND_REACH = 3.0;

  private final Sight sight;
  private final Camera camera;
  private final AirColumn column;
  private final PathAir air;
  private final RayFan fan;

  private SightOptics(Sight sight, Camera camera, AirColumn column, PathAir air, RayFan fan) {
    this.sight = sight;
    this.camera = camera;
    this.column = column;
    this.air = air;
    this.fan = fan;
  }

  /** The optics at the sight's current values, without derivatives by them. */
  public static SightOptics of(Sight sight) {
    return of(sight, List.of());
  }

  /**
   * The optics at the sight's current values.
   *
   * @param sight a sight whose profile family is chosen
   * @param estimated names of the quantities by which the mappings carry derivatives
   * @throws IllegalArgumentException where the values make no physical sense together
   */
  public static SightOptics of(Sight sight, List<String> estimated) {
    return of(sight, estimated, distancesInUse(sight));
  }

  /**
   * The optics for the light of one colour channel, without derivatives. The camera, the air and
   * what is asked of the mappings are the same as in {@link #of(Sight)}; only the refractive index
   * is that at the channel's wavelength, so that rays bend by (n_c - 1)/(n - 1) times as much, to
   * first order.
   *
   * @param sight a sight whose profile family is chosen
   * @param channel 0 red, 1 green, 2 blue; where the sight gives the channels no wavelengths of
   *     their own, all see as the luminance does
   */
  public static SightOptics ofChannel(Sight sight, int channel) {
    return of(sight.withAir(sight.air().atWavelength(sight.air().wavelengthM(channel))));
  }

  /** The optics for distances of one's own, m. */
  public static SightOptics of(Sight sight, List<String> estimated, double[] distancesM) {
    Camera camera = sight.camera().camera();
    AirColumn column = column(sight, estimated);
    double[] range = elevationRange(camera);
    TreeSet<Double> targets = new TreeSet<>();
    for (double d : distancesM) {
      targets.add(d);
    }
    if (sight.regions().stream().anyMatch(Region::ground)) {
      targets.add(GROUND_REACH * targets.last());
    }
    FanRequest request =
        new FanRequest(
            sight.camera().heightM().value(),
            range[0],
            range[1],
            targets.stream().mapToDouble(Double::doubleValue).toArray(),
            TOLERANCE_PX * camera.radPerPx(),
            !estimated.isEmpty());
    PathAir air = air(sight, estimated);
    RayFan fan = RayFan.trace(air, sight.path().path(), request, RayTracer.DEFAULT_TOLERANCE_M);
    return new SightOptics(sight, camera, column, air, fan);
  }

  /**
   * The air over the ground at the camera, with derivatives by the quantities named; those of other
   * stretches count among them and have none.
   */
  public static AirColumn column(Sight sight, List<String> estimated) {
    return column(sight, estimated, 0);
  }

  /** The air over the ground of a stretch, 0 at the camera; otherwise as over the first. */
  public static AirColumn column(Sight sight, List<String> estimated, int stretch) {
    if (sight.profile().family().isEmpty()) {
      throw new IllegalArgumentException(
          "profile.family is best, must be one family (the air is not known before a fit has"
              + " chosen)");
    }
    int[] carried = EstimateLayout.of(sight, estimated).columnParameters(stretch);
    return SightAir.column(sight, stretch, carried);
  }

  /** The air along the path, tabulated, with derivatives by the quantities named. */
  static PathAir air(Sight sight, List<String> estimated) {
    List<TabulatedMedium> media = new ArrayList<>();
    for (int i = 0; i < sight.profile().stretches().size(); i++) {
      media.add(new TabulatedMedium(column(sight, estimated, i)));
    }
    return SightAir.along(sight, media);
  }

  /** Apparent elevations that the picture spans, with a margin, rad. */
  public static double[] elevationRange(Camera camera) {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    double[] direction = new double[2];
    int steps = 16;
    for (int i = 0; i <= steps; i++) {
      for (int j = 0; j <= steps; j++) {
        if (i == 0 || j == 0 || i == steps || j == steps) {
          double u = (camera.widthPx() - 1.0) * i / steps;
          double v = (camera.heightPx() - 1.0) * j / steps;
          camera.direction(u, v, direction);
          lowest = Math.min(lowest, direction[0]);
          highest = Math.max(highest, direction[0]);
        }
      }
    }
    double margin = MARGIN * (highest - lowest);
    return new double[] {lowest - margin, highest + margin};
  }

  /** Distances of the references and regions of a sight, m, rising, each once. */
  public static double[] distancesInUse(Sight sight) {
    TreeSet<Double> distances = new TreeSet<>();
    sight.references().stream().map(Reference::distanceM).forEach(distances::add);
    sight.regions().stream()
        .filter(r -> !r.ground())
        .map(Region::distanceM)
        .forEach(distances::add);
    if (distances.isEmpty()) {
      throw new IllegalArgumentException(
          "no distance is in use, must be at least one (distance of a reference or a region); add"
              + " one");
    }
    return distances.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** Mappings at the distances in use, by rising distance. */
  public List<SightMapping> mappings() {
    List<SightMapping> used = new ArrayList<>();
    for (double d : distancesInUse(sight)) {
      used.add(fan.mapping(d));
    }
    return used;
  }

  /** The sight. */
  public Sight sight() {
    return sight;
  }

  /** The camera. */
  public Camera camera() {
    return camera;
  }

  /** The air at the camera; for one thread at a time. */
  public AirColumn column() {
    return column;
  }

  /** The air along the path, tabulated; for one thread at a time. */
  public PathAir air() {
    return air;
  }

  /** Says so where some mapping could not be made as exact as {@link #TOLERANCE_PX} asks. */
  public Optional<Warning> caution() {
    return caution(fan);
  }

  static Optional<Warning> caution(RayFan fan) {
    return fan.accurate()
        ? Optional.empty()
        : Optional.of(
            new Warning(
                "inexact-mapping",
                "This air folds or bends some lines of sight so sharply that they could not be"
                    + " followed to "
                    + TOLERANCE_PX
                    + " px: heights there may be off by more than their sigmas say. Nearer"
                    + " distances, a narrower view or a smoother profile would help."));
  }

  /** The rays. */
  public RayFan fan() {
    return fan;
  }

  /** The mapping at one of the distances in use, m. */
  public SightMapping mapping(double distanceM) {
    return fan.mapping(distanceM);
  }

  /** The rays as which the picture is redrawn. */
  public StraightRay straight() {
    return new StraightRay(
        sight.camera().heightM().value(),
        sight.path().earthRadiusM(),
        sight.refractionCoefficient());
  }
}
