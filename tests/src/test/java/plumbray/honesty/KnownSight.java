package plumbray.honesty;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PointMark;
import plumbray.calibration.sight.PointTarget;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.ReferenceKind;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.SightFit;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.scene.Backdrop;
import plumbray.imaging.scene.LinearColour;
import plumbray.imaging.scene.Paint;
import plumbray.imaging.scene.Scene;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Shimmer;
import plumbray.imaging.scene.Simulation;
import plumbray.imaging.scene.StaffShape;
import plumbray.imaging.scene.Thing;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;

/**
 * A sight whose truth is known, with one reference straight ahead.
 *
 * @param name what to call it
 * @param asked what a user knows of it
 * @param trueValues true values of what is asked for, in the order of {@link SightParameters}, SI
 * @param shimmer how the air shakes its photos
 */
record KnownSight(String name, Sight asked, double[] trueValues, Shimmer shimmer) {
  static final double DARK = 0.05;
  static final double BRIGHT = 0.75;
  static final double SKY = 0.9;
  static final double GROUND = 0.3;

  /** Sixteen bits, so that rounding adds nothing to the noise. */
  static final Sensor SENSOR = new Sensor(0.8, 1, 4000, 6, 16);

  private static final double STAFF_WIDTH_PX = 50;

  /** The sight with its true values, nothing left open. */
  Sight truth() {
    return SightParameters.of(asked).heldAt(trueValues);
  }

  List<String> names() {
    return SightParameters.of(asked).names();
  }

  Reference reference() {
    return asked.references().get(0);
  }

  boolean ofPoints() {
    return reference().kind() instanceof PointTarget;
  }

  /** The fit of one photo, or of one set of points. */
  FitResult fit(long seed) {
    return ofPoints()
        ? new SightFit()
            .fit(
                askedWith(new PointTarget(pointed(new Random(seed))), Optional.empty()),
                Optional.empty())
        : new SightFit().fit(asked, Optional.of(photo(seed)));
  }

  /** A photo of the staff. */
  Photo photo(long seed) {
    return photo(seed, SENSOR, List.of(staff()));
  }

  /** A photo of things, of two at one distance the later one in front. */
  Photo photo(long seed, Sensor sensor, List<Thing> things) {
    Backdrop backdrop =
        new Backdrop(
            new Backdrop.Sky(LinearColour.grey(SKY), LinearColour.grey(0.5), 0.02),
            new Backdrop.Ground(Paint.flat(LinearColour.grey(GROUND)), List.of(), 3000),
            Backdrop.Haze.none());
    return new Simulation(truth(), new Scene(seed, backdrop, things, shimmer, sensor)).photo();
  }

  /** The staff. */
  Thing staff() {
    StaffTarget staff = (StaffTarget) reference().kind();
    double distanceM = reference().distanceM();
    return new Thing(
        reference().name(),
        distanceM,
        reference().footM().value(),
        new StaffShape(
            0,
            STAFF_WIDTH_PX * distanceM * asked.camera().camera().radPerPx(),
            staff.edgesM(),
            new StaffShape.Bars(DARK, BRIGHT, staff.firstBarDark())));
  }

  /** The upright image in which a height at the reference's distance is seen. */
  Branch upright(SightOptics optics, double heightM) {
    double elevationM = heightM + groundM();
    return optics.mapping(reference().distanceM()).branches().stream()
        .filter(b -> b.sense() == Sense.UPRIGHT && b.holdsElevation(elevationM))
        .findFirst()
        .orElseThrow();
  }

  /** Elevation of the ground under the reference, m. */
  double groundM() {
    return asked.path().ground().elevationM(reference().distanceM());
  }

  /** Its marks pointed at, each off by as much as its standard deviation says. */
  List<PointMark> pointed(Random random) {
    Sight truth = truth();
    Camera camera = truth.camera().camera();
    SightOptics optics = SightOptics.of(truth);
    List<PointMark> marks = new ArrayList<>();
    for (PointMark mark : ((PointTarget) reference().kind()).marks()) {
      Branch upright = upright(optics, mark.heightM());
      double row = camera.rowAt(upright.apparentRad(mark.heightM()));
      PixelPoint pixel =
          new PixelPoint(mark.pixel().u(), row + mark.sigmaPx() * random.nextGaussian());
      marks.add(new PointMark(mark.heightM(), pixel, mark.sigmaPx(), mark.sense()));
    }
    return marks;
  }

  /** What is asked of another reference at the same place. */
  Sight askedWith(ReferenceKind kind, Optional<ImageBox> box) {
    Reference other =
        new Reference(reference().name(), reference().distanceM(), reference().footM(), kind, box);
    return new Sight(
        asked.name(),
        asked.camera(),
        asked.path(),
        asked.air(),
        asked.profile(),
        List.of(other),
        asked.regions(),
        asked.refractionCoefficient());
  }
}
