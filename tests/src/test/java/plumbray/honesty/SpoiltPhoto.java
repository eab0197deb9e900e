package plumbray.honesty;

import java.util.ArrayList;
import java.util.List;
import java.util.function.IntToDoubleFunction;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.scene.BoardShape;
import plumbray.imaging.scene.Grain;
import plumbray.imaging.scene.LinearColour;
import plumbray.imaging.scene.Paint;
import plumbray.imaging.scene.PolygonShape;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Thing;

/** Photos of a staff as they should not be: something in front of it, bad light, out of plumb. */
final class SpoiltPhoto {
  /** As an ordinary camera's: 8 bits. */
  static final Sensor SENSOR = new Sensor(0.8, 1, 4000, 6, 8);

  /** What hides the staff stands this little in front of it, m. */
  private static final double IN_FRONT_M = 0.1;

  private final KnownSight known;
  private final long seed;

  SpoiltPhoto(KnownSight known, long seed) {
    this.known = known;
    this.seed = seed;
  }

  /** The photo with nothing wrong. */
  Photo plain() {
    return known.photo(seed, SENSOR, List.of(known.staff()));
  }

  /** Uneven growth of dark grass up to a height. */
  Photo grassUpTo(double topM) {
    Paint grass = new Paint(LinearColour.grey(0.2), new Grain(0.8, 0.05, 0.05));
    return behind(new BoardShape(-1, 1, 0, topM, grass));
  }

  /** Something even before the staff. */
  Photo behind(double[] leftRightM, double[] bottomTopM, double light) {
    return behind(
        new BoardShape(
            leftRightM[0],
            leftRightM[1],
            bottomTopM[0],
            bottomTopM[1],
            Paint.flat(LinearColour.grey(light))));
  }

  private Photo behind(BoardShape board) {
    double nearerM = known.reference().distanceM() - IN_FRONT_M;
    return known.photo(
        seed, SENSOR, List.of(known.staff(), new Thing("in front", nearerM, 0, board)));
  }

  /** Every encoded value times what its row says: half the light is about 0.73 of the value. */
  Photo lit(IntToDoubleFunction ofRow) {
    Photo plain = plain();
    PhotoBuilder lit = new PhotoBuilder(plain.shape());
    float[] row = new float[plain.shape().rowSamples()];
    for (int v = 0; v < plain.height(); v++) {
      plain.row(v, row);
      for (int i = 0; i < row.length; i++) {
        row[i] *= (float) ofRow.applyAsDouble(v);
      }
      lit.row(v, row);
    }
    return lit.build();
  }

  /** The staff leaning to the right about its foot. */
  Photo leaning(double angleRad) {
    double[] edgesM = ((StaffTarget) known.reference().kind()).edgesM();
    List<Thing> bars = new ArrayList<>();
    for (int i = 0; i + 1 < edgesM.length; i++) {
      double[][] corners = {
        leant(-0.32, edgesM[i], angleRad),
        leant(0.32, edgesM[i], angleRad),
        leant(0.32, edgesM[i + 1], angleRad),
        leant(-0.32, edgesM[i + 1], angleRad)
      };
      double light = i % 2 == 0 ? KnownSight.DARK : KnownSight.BRIGHT;
      PolygonShape bar = new PolygonShape(corners, Paint.flat(LinearColour.grey(light)));
      bars.add(new Thing("bar " + i, known.reference().distanceM(), 0, bar));
    }
    return known.photo(seed, SENSOR, bars);
  }

  private static double[] leant(double acrossM, double upM, double angleRad) {
    double c = Math.cos(angleRad);
    double s = Math.sin(angleRad);
    return new double[] {acrossM * c + upM * s, -acrossM * s + upM * c};
  }
}
