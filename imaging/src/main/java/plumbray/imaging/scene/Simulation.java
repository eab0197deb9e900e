package plumbray.imaging.scene;

import java.util.List;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightAir;
import plumbray.imaging.photo.Photo;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.RayTracer;
import plumbray.raymodel.ray.StraightRay;

/**
 * The photo that a sight would give of a scene, with all that is known about it.
 *
 * <p>Where the sight gives the colour channels wavelengths of their own, each is drawn by its own
 * rays. Every quantity of the sight counts at its value, estimated or not. The picture does not
 * depend on the number of threads.
 */
public final class Simulation {
  /** Spacing of the tabulated rays (px): straight between them errs by less than 0.001 px. */
  private static final double NODE_SPACING_PX = 1.0 / 16;

  private static final double TRACING_TOLERANCE_PX = 0.003;

  /** How far beyond the picture rays are traced (px), besides the shimmer's reach. */
  private static final double MARGIN_PX = 4;

  /** The shimmer's reach, in its rms. */
  private static final double SHIMMER_REACH = 7;

  private final Sight sight;
  private final Scene scene;
  private final Camera camera;
  private final SightPath path;
  private final AirColumn air;
  private final RayFan fan;
  private final List<RayFan> channelFans;
  private final ElevationTable.Nodes nodes;

  /**
   * Traces the rays.
   *
   * @param sight camera, ground and air; its profile names one family
   * @param scene what stands there
   */
  public Simulation(Sight sight, Scene scene) {
    this.sight = sight;
    this.scene = scene;
    this.camera = sight.camera().camera();
    this.path = sight.path().path();
    this.air = columns(sight).get(0);
    this.nodes = nodes();
    this.fan = fan(sight);
    this.channelFans = channelFans();
  }

  /** The rays of each colour channel, where the sight gives each a wavelength of its own. */
  private List<RayFan> channelFans() {
    return sight.air().channelWavelengthsM().stream()
        .map(wavelengthM -> fan(sight.withAir(sight.air().atWavelength(wavelengthM))))
        .toList();
  }

  private RayFan fan(Sight coloured) {
    return RayFan.trace(
        SightAir.along(coloured, columns(coloured)),
        path,
        request(),
        RayTracer.DEFAULT_TOLERANCE_M);
  }

  private static List<AirColumn> columns(Sight sight) {
    if (sight.profile().family().isEmpty()) {
      throw new IllegalArgumentException(
          "profile.family is \"best\", must be one family (the air to simulate)");
    }
    return IntStream.range(0, sight.profile().stretches().size())
        .mapToObj(i -> SightAir.column(sight, i, new int[0]))
        .toList();
  }

  private ElevationTable.Nodes nodes() {
    Shimmer shimmer = scene.shimmer();
    double marginPx =
        MARGIN_PX + SHIMMER_REACH * (shimmer.verticalRmsPx() + shimmer.horizontalRmsPx());
    double marginRad = marginPx * camera.radPerPx();
    ElevationSpan span = ElevationSpan.of(camera);
    return ElevationTable.Nodes.over(
        span.lowestRad() - marginRad,
        span.highestRad() + marginRad,
        NODE_SPACING_PX * camera.radPerPx());
  }

  private FanRequest request() {
    double[] distancesM =
        DoubleStream.concat(
                scene.things().stream().mapToDouble(Thing::distanceM), DoubleStream.of(reachM()))
            .distinct()
            .sorted()
            .toArray();
    return new FanRequest(
        sight.camera().heightM().value(),
        nodes.lowestRad(),
        nodes.highestRad(),
        distancesM,
        TRACING_TOLERANCE_PX * camera.radPerPx(),
        false);
  }

  /** The farthest distance in use (m). */
  private double reachM() {
    return scene.things().stream()
        .mapToDouble(Thing::distanceM)
        .reduce(scene.backdrop().ground().reachM(), Math::max);
  }

  /** The photo: through the air, with shimmer and noise. */
  public Photo photo() {
    return throughAir(scene);
  }

  /** The photo without shimmer and noise. */
  public Photo stillPhoto() {
    return throughAir(scene.still());
  }

  /**
   * The same view along rays of the sight's refraction coefficient (0: straight), without shimmer
   * and noise.
   */
  public Photo straightPhoto() {
    return picture(scene.still(), new UniformRays(straightRay(), path, reachM()));
  }

  private StraightRay straightRay() {
    return new StraightRay(
        sight.camera().heightM().value(), path.earthRadiusM(), sight.refractionCoefficient());
  }

  private Photo picture(Scene drawn, Rays rays) {
    return new Development(drawn).develop(light(drawn, rays));
  }

  private Photo throughAir(Scene drawn) {
    if (channelFans.isEmpty()) {
      return picture(drawn, new TracedRays(fan));
    }
    List<LinearPicture> light =
        channelFans.stream().map(each -> light(drawn, new TracedRays(each))).toList();
    return new Development(drawn).develop(light.get(0).joined(light.get(1), light.get(2)));
  }

  private LinearPicture light(Scene drawn, Rays rays) {
    SeenScene seen = SeenScene.of(drawn, new ElevationTable(rays, nodes), reachM());
    return new SceneRenderer(seen, camera).render();
  }

  /** What is known exactly about the photo. */
  public SceneTruth truth() {
    return new TruthFinder(camera, fan, straightRay()).find(scene, air);
  }
}
