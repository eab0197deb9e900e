package plumbray.imaging.rectify;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.Projection;
import plumbray.calibration.sight.Region;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.StraightRay;

/**
 * From a pixel of the redrawn picture to the place in the photo that shows what belongs there.
 *
 * <p>Polygons are drawn on the photo, and a place of the photo belongs to the first region that
 * holds it. The first region whose things, as seen in the photo, lie inside its polygon is the one
 * shown; where they lie in that of an earlier region too, that one hides them, and nothing shows
 * them: else its rim would be drawn a second time. Where a region's thing is not seen in the photo,
 * the output pixel itself must lie inside. A pixel that no region claims goes with the last one.
 */
public final class RectifyMap {
  private final Camera camera;
  private final List<MappedRegion> regions;

  /** The table of a region, and that of its inverted images alone, where there are some. */
  record Tables(ElevationTable all, Optional<ElevationTable> inverted) {}

  /** A region with its distance (NaN: ground) and tables; without outline it holds all pixels. */
  record MappedRegion(Optional<Outline> outline, double distanceM, Tables tables) {
    MappedRegion(Optional<Outline> outline, double distanceM, ElevationTable table) {
      this(outline, distanceM, new Tables(table, Optional.empty()));
    }

    MappedRegion(Optional<Outline> outline, ElevationTable table) {
      this(outline, Double.NaN, table);
    }

    ElevationTable table() {
      return tables.all();
    }

    /** The region as its inverted images alone show it. */
    MappedRegion inverted() {
      return new MappedRegion(
          outline, distanceM, tables.inverted().orElseGet(ElevationTable::ofNothing));
    }

    boolean holds(double u, double v) {
      return outline.isEmpty() || outline.get().holds(u, v);
    }
  }

  RectifyMap(Camera camera, List<MappedRegion> regions) {
    this.camera = camera;
    this.regions = List.copyOf(regions);
  }

  /**
   * The map of one sight.
   *
   * @param camera camera of both the photo and the redrawn picture
   * @param straight the rays that the redrawn picture is to have
   * @param path what lies under the sight
   * @param fan rays over the picture's rows, to the distances of all regions
   * @param regions what lies where in the photo, at least one
   */
  public static RectifyMap of(
      Camera camera, StraightRay straight, SightPath path, RayFan fan, List<Region> regions) {
    if (regions.isEmpty()) {
      throw new IllegalArgumentException(
          "regions is empty, must have at least one region (what lies where); add one");
    }
    ElevationSpan span = ElevationSpan.of(camera);
    Map<Double, Tables> tables = new HashMap<>();
    List<MappedRegion> mapped = new ArrayList<>();
    for (Region region : regions) {
      Tables table =
          tables.computeIfAbsent(
              region.distanceM(),
              distanceM ->
                  region.ground()
                      ? new Tables(groundTable(straight, path, fan, span), Optional.empty())
                      : tables(straight, fan, distanceM, span));
      mapped.add(new MappedRegion(region.polygonPx().map(Outline::new), region.distanceM(), table));
    }
    return new RectifyMap(camera, mapped);
  }

  private static Tables tables(
      StraightRay straight, RayFan fan, double distanceM, ElevationSpan span) {
    List<ApparentBranch> branches =
        fan.mapping(distanceM).branches().stream().map(ApparentBranch::of).toList();
    return tables(branches, straight, distanceM, span);
  }

  static Tables tables(
      List<ApparentBranch> branches, StraightRay straight, double distanceM, ElevationSpan span) {
    List<ApparentBranch> inverted = branches.stream().filter(b -> !b.upright()).toList();
    Optional<ElevationTable> alone =
        inverted.isEmpty()
            ? Optional.empty()
            : Optional.of(MappingTable.of(inverted, straight, distanceM, span));
    return new Tables(MappingTable.of(branches, straight, distanceM, span), alone);
  }

  private static ElevationTable groundTable(
      StraightRay straight, SightPath path, RayFan fan, ElevationSpan span) {
    double reachM = fan.mappings().get(fan.mappings().size() - 1).distanceM();
    return GroundTable.of(straight, path, fan.ground(), reachM, span);
  }

  int widthPx() {
    return camera.widthPx();
  }

  int heightPx() {
    return camera.heightPx();
  }

  /** The map of inverted images alone; empty where there are none. */
  Optional<RectifyMap> invertedAlone() {
    boolean some = regions.stream().anyMatch(region -> region.tables().inverted().isPresent());
    return some
        ? Optional.of(new RectifyMap(camera, regions.stream().map(MappedRegion::inverted).toList()))
        : Optional.empty();
  }

  /** Distance of a region's things, m; NaN for the ground. */
  double distanceM(int region) {
    return regions.get(region).distanceM();
  }

  int regionCount() {
    return regions.size();
  }

  /** A reader of this map for one thread. */
  Cursor cursor() {
    return new Cursor();
  }

  /** Looks pixels up; keeps its working space, so each thread needs its own. */
  final class Cursor {
    private final Projection projection = camera.projection();
    private final ElevationTable.Answer answer = new ElevationTable.Answer();
    private final double[] direction = new double[2];
    private final double[] source = new double[2];
    private final TestedPlaces tested = new TestedPlaces(regions.size());
    private int code;
    private long place;

    /** Looks an output pixel up; the answers are then asked for. */
    void look(double u, double v) {
      projection.direction(u, v, direction);
      double halfSine = Math.sin(0.5 * direction[1]);
      double fartherShare = 2 * halfSine * halfSine;
      for (int i = 0; i < regions.size(); i++) {
        MappedRegion region = regions.get(i);
        region.table().look(direction[0], fartherShare, answer);
        place = (long) i << 32 | answer.piece;
        if (answer.code != ElevationTable.NOT_HERE && claims(i, u, v)) {
          return;
        }
      }
      code = answer.code == ElevationTable.NOT_HERE ? MaskPlane.NEVER_VISIBLE : code;
    }

    private boolean claims(int region, double u, double v) {
      code = answer.code;
      if (!isShown()) {
        return holds(region, u, v);
      }
      projection.pixel(answer.apparentRad, direction[1], source);
      if (!inPhoto(source[0], camera.widthPx()) || !inPhoto(source[1], camera.heightPx())) {
        code = MaskPlane.OUTSIDE;
        return holds(region, u, v);
      }
      double seenU = withinCentres(source[0], camera.widthPx());
      double seenV = withinCentres(source[1], camera.heightPx());
      if (!holds(region, seenU, seenV)) {
        return false;
      }
      if (isTaken(region, seenU, seenV)) {
        code = MaskPlane.NEVER_VISIBLE;
      }
      return true;
    }

    /** Whether an earlier region has that place of the photo: what is there hides this region. */
    private boolean isTaken(int region, double u, double v) {
      for (int i = 0; i < region; i++) {
        if (holds(i, u, v)) {
          return true;
        }
      }
      return false;
    }

    private boolean holds(int region, double u, double v) {
      tested.add(region, u, v);
      return regions.get(region).holds(u, v);
    }

    /** A photo reaches half a pixel beyond the centres of its outer pixels; NaN is outside. */
    private static boolean inPhoto(double at, int size) {
      return at >= -0.5 && at <= size - 0.5;
    }

    private static double withinCentres(double at, int size) {
      return Math.max(0, Math.min(size - 1, at));
    }

    /** Region and piece of its table that answered: within one, the map is smooth. */
    long place() {
      return place;
    }

    /** True elevation on the axis at which the table answered, rad. */
    double onAxisRad() {
      return answer.onAxisRad;
    }

    /** Which region answered. */
    int region() {
      return (int) (place >> 32);
    }

    /** Apparent elevation in the photo, rad, where shown. */
    double apparentRad() {
      return answer.apparentRad;
    }

    /** Starts a stretch of pixels, after which {@link #isSteady} is asked. */
    void startStretch() {
      tested.clear();
    }

    /** Whether no outline cuts through the stretch, so that the place alone decides in it. */
    boolean isSteady() {
      for (int i = 0; i < regions.size(); i++) {
        Optional<Outline> outline = regions.get(i).outline();
        if (outline.isPresent() && tested.isCut(i, outline.get())) {
          return false;
        }
      }
      return true;
    }

    /** Mask code of the pixel. */
    int code() {
      return code;
    }

    /** Whether the photo shows what belongs there. */
    boolean isShown() {
      return code == MaskPlane.UPRIGHT || code == MaskPlane.INVERTED;
    }

    /** Column in the photo, px, where shown. */
    double sourceU() {
      return source[0];
    }

    /** Row in the photo, px, where shown. */
    double sourceV() {
      return source[1];
    }

    /** Rows of the photo that the pixel is made of, where shown. */
    double stretch() {
      return answer.stretch;
    }
  }
}
