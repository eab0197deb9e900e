package plumbray.imaging.scene;

import java.util.List;

/** The light that comes from one direction. */
final class Shader {
  private final SeenScene seen;
  private final double radPerPx;
  private final double farSlopePerRad;
  private final GrainNoise groundNoise;
  private final double[] place = new double[4];
  private final double[] light = new double[LinearPicture.CHANNELS];

  Shader(SeenScene seen, double radPerPx) {
    this.seen = seen;
    this.radPerPx = radPerPx;
    this.farSlopePerRad = 1 / seen.scene().backdrop().sky().highRad();
    this.groundNoise = seen.groundNoise();
  }

  /**
   * The light from a direction.
   *
   * @param things what can be seen there, nearest first
   * @param apparentRad apparent elevation (rad)
   * @param tanAzimuth tangent of the azimuth
   * @param widthPx width of the piece of the picture that the sample stands for (px)
   * @return red, green, blue in linear light; overwritten by the next call
   */
  double[] light(List<Placed> things, double apparentRad, double tanAzimuth, double widthPx) {
    double position = seen.table().position(apparentRad);
    double farther = Math.sqrt(1 + tanAzimuth * tanAzimuth);
    for (int i = 0; i < things.size(); i++) {
      ElevationTable.Sheet sheet = things.get(i).sheet();
      double distanceM = sheet.distanceM();
      double elevationM =
          ElevationTable.between(sheet.elevationM(), position)
              + distanceM * (farther - 1) * ElevationTable.between(sheet.pathSlope(), position);
      double acrossM = distanceM * tanAzimuth;
      if (things.get(i).isAt(acrossM, elevationM)) {
        place[0] = acrossM;
        place[1] = elevationM - things.get(i).zeroM();
        place[2] = distanceM * radPerPx * widthPx;
        place[3] = place[2];
        paint(things.get(i), distanceM);
        return light;
      }
    }
    backdrop(position, tanAzimuth / farther, widthPx);
    return light;
  }

  private void paint(Placed placed, double distanceM) {
    shine(placed.thing().shape().paint(place[0], place[1]), placed.grainNoise(), distanceM);
  }

  private void shine(Paint paint, GrainNoise noise, double distanceM) {
    Grain grain = paint.grain();
    double factor = grain.contrast() == 0 ? 1 : noise.factor(grain, place);
    Backdrop.Haze haze = seen.scene().backdrop().haze();
    double passed = haze.passed(distanceM);
    LinearColour colour = paint.colour();
    LinearColour veil = haze.colour();
    light[0] = passed * factor * colour.red() + (1 - passed) * veil.red();
    light[1] = passed * factor * colour.green() + (1 - passed) * veil.green();
    light[2] = passed * factor * colour.blue() + (1 - passed) * veil.blue();
  }

  private void backdrop(double position, double sinAzimuth, double widthPx) {
    double inversePerM = seen.table().inverseGroundPerM(position);
    if (Double.isNaN(inversePerM)) {
      sky(ElevationTable.between(seen.far().pathSlope(), position));
      return;
    }
    double distanceM = 1 / inversePerM;
    double nearerM = 1 / seen.table().inverseGroundPerM(Math.max(0, position - 0.5));
    double spreadM = Math.abs(distanceM - nearerM) * 2 * radPerPx / seen.table().stepRad();
    place[0] = distanceM * sinAzimuth;
    place[1] = distanceM * Math.sqrt(1 - sinAzimuth * sinAzimuth);
    place[2] = distanceM * radPerPx * widthPx;
    place[3] = spreadM * widthPx;
    Backdrop.Ground ground = seen.scene().backdrop().ground();
    shine(ground.paintAt(place[0], place[1]), groundNoise, distanceM);
  }

  private void sky(double slope) {
    Backdrop.Sky sky = seen.scene().backdrop().sky();
    double share = slope > 0 ? Math.min(1, slope * farSlopePerRad) : 0;
    LinearColour low = sky.horizon();
    LinearColour high = sky.high();
    light[0] = low.red() + share * (high.red() - low.red());
    light[1] = low.green() + share * (high.green() - low.green());
    light[2] = low.blue() + share * (high.blue() - low.blue());
  }
}
