package plumbray.imaging.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.reading.PointObservation;
import plumbray.imaging.reading.ReferenceObservation;
import plumbray.imaging.reading.StaffScene;
import plumbray.imaging.reading.StaffStrip;

/**
 * The references of a sight, read from the photo where they need one.
 *
 * @param staffs staffs with their strips
 * @param points sets of points
 */
record References(List<StaffScene> staffs, List<PointObservation> points) {

  /** Reads the references. */
  static References read(Sight sight, Optional<Photo> photo) {
    List<StaffScene> staffs = new ArrayList<>();
    List<PointObservation> points = new ArrayList<>();
    Camera camera = sight.camera().camera();
    for (int i = 0; i < sight.references().size(); i++) {
      Reference reference = sight.references().get(i);
      if (reference.kind() instanceof StaffTarget staff) {
        staffs.add(new StaffScene(i, reference, staff, strip(reference, photo, camera)));
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

  /** What each reference shows, staffs made into observations by {@code of}, then the points. */
  List<ReferenceObservation> observations(Function<StaffScene, ReferenceObservation> of) {
    List<ReferenceObservation> all = new ArrayList<>();
    staffs.forEach(s -> all.add(of.apply(s)));
    all.addAll(points);
    return all;
  }
}
