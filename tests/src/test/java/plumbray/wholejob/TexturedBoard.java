package plumbray.wholejob;

import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Region;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.rectify.RectifyMap;
import plumbray.imaging.scene.Backdrop;
import plumbray.imaging.scene.BoardShape;
import plumbray.imaging.scene.Grain;
import plumbray.imaging.scene.LinearColour;
import plumbray.imaging.scene.Paint;
import plumbray.imaging.scene.Scene;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Shimmer;
import plumbray.imaging.scene.Simulation;
import plumbray.imaging.scene.Thing;

/**
 * A wall of uneven grey that fills the view above the ground at one distance; an invented place.
 *
 * @param sight the sight, with a staff where the wall is
 */
record TexturedBoard(DrawnSight sight) {
  double distanceM() {
    return sight.staffs().get(0).distanceM();
  }

  Simulation drawn(Sensor sensor) {
    Backdrop backdrop =
        new Backdrop(
            new Backdrop.Sky(LinearColour.grey(0.9), LinearColour.grey(0.5), 0.02),
            new Backdrop.Ground(Paint.flat(LinearColour.grey(0.3)), List.of(), 3000),
            Backdrop.Haze.none());
    Paint paint = new Paint(LinearColour.grey(0.35), new Grain(0.7, 0.15, 0.15));
    Thing wall = new Thing("wall", distanceM(), 0, new BoardShape(-9, 9, 0, 9, paint));
    Scene scene = new Scene(7, backdrop, List.of(wall), Shimmer.none(), sensor);
    return new Simulation(sight.truth(), scene);
  }

  SightOptics optics() {
    return SightOptics.of(sight.truth());
  }

  RectifyMap map() {
    SightOptics optics = optics();
    List<Region> all = List.of(new Region("wall", false, distanceM(), Optional.empty()));
    return RectifyMap.of(
        optics.camera(), optics.straight(), optics.sight().path().path(), optics.fan(), all);
  }
}
