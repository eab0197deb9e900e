package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.SenseWanted;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.reading.EdgeImage;
import plumbray.imaging.reading.PointObservation;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.Relabel;
import plumbray.imaging.reading.StaffScene;
import plumbray.imaging.reading.StaffStrip;
import plumbray.raymodel.mapping.Sense;

/**
 * The references of a sight, read from the photo where they need one.
 *
 * @param staffs staffs with their strips
 * @param points sets of points
 */
record References(List<StaffScene> staffs, List<PointObservation> points) {

  private static final double TRACKED_FREE_PX = 15.0;
  private static final int MOST_WAYS = 4;
  private static final double TRACKED_SIGMA_PX = 1.5;

  /** Edges drawn from afar are no outliers until they are this many times nearer. */
  private static final double REACH_SIGMAS = 6.0;

  /** Reads the references. */
  static References read(Sight sight, Optional<Photo> photo) {
    List<StaffScene> staffs = new ArrayList<>();
    List<PointObservation> points = new ArrayList<>();
    Camera camera = sight.camera().camera();
    for (int i = 0; i < sight.references().size(); i++) {
      Reference reference = sight.references().get(i);
      Optional<StaffTarget> bars = reference.kind().bars();
      if (bars.isPresent()) {
        staffs.add(new StaffScene(i, reference, bars.get(), strip(reference, photo, camera)));
      } else if (reference.kind() instanceof PointTarget target) {
        points.add(new PointObservation(i, reference, target));
      }
    }
    return new References(List.copyOf(staffs), List.copyOf(points));
  }

  private static StaffStrip strip(Reference reference, Optional<Photo> photo, Camera camera) {
    ImageBox box =
        reference
            .imageBox()
            .orElseThrow(
                () ->
                    new IllegalArgumentException(
                        "reference \""
                            + reference.name()
                            + "\" has no imageBox, must have one (where the staff is in the"
                            + " picture); add it"));
    Photo seen =
        photo.orElseThrow(
            () ->
                new IllegalArgumentException(
                    "reference \""
                        + reference.name()
                        + "\" is a staff and no photo was given; name the photo, or use points"));
    return StaffStrip.read(seen, box, shear(camera, box));
  }

  /**
   * Rows by which a line of equal elevation falls a column to the right, in the middle of a box.
   */
  private static double shear(Camera camera, ImageBox box) {
    double[] direction = new double[2];
    double[] left = new double[2];
    double[] right = new double[2];
    camera.direction(0.5 * (box.u0() + box.u1()), 0.5 * (box.v0() + box.v1()), direction);
    double step = 10.0 * camera.radPerPx();
    camera.pixel(direction[0], direction[1] - step, left);
    camera.pixel(direction[0], direction[1] + step, right);
    return (right[1] - left[1]) / (right[0] - left[0]);
  }

  /** A camera turned, and free to turn on by some pixels at most where its pitch is estimated. */
  static CameraSetup turned(CameraSetup camera, double byRad, double freePx) {
    Quantity pitch = camera.pitchRad();
    double at = pitch.value() + byRad;
    double free = freePx * camera.camera().radPerPx();
    Quantity turned = pitch.estimated() ? Quantity.free(at).within(at - free, at + free) : pitch;
    return new CameraSetup(
        camera.widthPx(),
        camera.heightPx(),
        camera.focalLengthM(),
        camera.pixelPitchM(),
        camera.principalPoint(),
        camera.k1(),
        camera.k2(),
        camera.heightM(),
        turned,
        camera.rollRad());
  }

  /** The edges of the staffs as points, where a start puts them; points stay as they are. */
  References tracked(Sight sight, SlideScore.Start start) {
    Sight at =
        sight
            .withProfile(start.profile())
            .withCamera(turned(sight.camera(), start.pitchShiftRad(), TRACKED_FREE_PX));
    FitTrace trace =
        FitTrace.of(at, List.of(), SightOptics.elevationRange(at.camera().camera()), 0.3);
    List<PointObservation> all = new ArrayList<>(points);
    for (StaffScene staff : staffs) {
      List<PointMark> marks = new ArrayList<>();
      for (EdgeImage edge : staff.edges(trace)) {
        marks.add(
            new PointMark(
                edge.heightM(),
                new PixelPoint(staff.strip().columnPx(), edge.row()),
                TRACKED_SIGMA_PX,
                edge.sense() == Sense.UPRIGHT ? SenseWanted.UPRIGHT : SenseWanted.INVERTED));
      }
      all.add(
          new PointObservation(
              staff.reference(),
              sight.references().get(staff.reference()),
              new PointTarget(marks)));
    }
    return new References(List.of(), all);
  }

  /**
   * The staffs' edges as points where the strips alone tell which is which; several ways to read
   * them, the likeliest first, none where a strip does not tell. Points stay as they are.
   */
  List<References> trailed(Sight sight, double sigmaPx) {
    double radPerPx = sight.camera().camera().radPerPx();
    List<List<PointObservation>> ways = new ArrayList<>();
    ways.add(points);
    for (StaffScene staff : staffs) {
      Reference reference = sight.references().get(staff.reference());
      List<List<PointObservation>> longer = new ArrayList<>();
      for (List<PointMark> marks : staff.trails(reference.distanceM() * radPerPx, sigmaPx)) {
        for (List<PointObservation> way : ways) {
          List<PointObservation> all = new ArrayList<>(way);
          all.add(new PointObservation(staff.reference(), reference, new PointTarget(marks)));
          longer.add(all);
        }
      }
      ways = longer;
    }
    return ways.stream().limit(MOST_WAYS).map(way -> new References(List.of(), way)).toList();
  }

  /**
   * The staffs' edges that the strips show near where a traced sight puts them, taken for what
   * {@code relabel} says, and the points.
   */
  List<ReferenceObservation> matched(Sight sight, FitTrace trace, Relabel relabel, double reachPx) {
    List<ReferenceObservation> all = new ArrayList<>(points);
    for (StaffScene staff : staffs) {
      List<PointMark> marks =
          staff.matched(trace, relabel, reachPx, Math.max(1.5, reachPx / REACH_SIGMAS));
      if (!marks.isEmpty()) {
        Reference reference = sight.references().get(staff.reference());
        all.add(new PointObservation(staff.reference(), reference, new PointTarget(marks)));
      }
    }
    return all;
  }

  /** What each reference shows, staffs made into observations by {@code of}, then the points. */
  List<ReferenceObservation> observations(Function<StaffScene, ReferenceObservation> of) {
    List<ReferenceObservation> all = new ArrayList<>();
    staffs.forEach(s -> all.add(of.apply(s)));
    all.addAll(points);
    return all;
  }
}
