package plumbray.cli.report;

import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.plot.Axis;
import plumbray.cli.report.plot.AxisKind;
import plumbray.cli.report.plot.Band;
import plumbray.cli.report.plot.Ink;
import plumbray.cli.report.plot.Line;
import plumbray.cli.report.plot.Plot;
import plumbray.cli.report.plot.Stroke;
import plumbray.cli.report.plot.Stroke.Dash;
import plumbray.imaging.diagnosis.BundleRay;
import plumbray.imaging.diagnosis.BundleRay.Role;
import plumbray.imaging.diagnosis.RayBundle;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.diagnosis.RayPath;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.path.SightPath;

/** The ways that the light takes to each distance, heights exaggerated. */
final class BundleSection implements Section {

  private static final double WIDTH_PX = 860;
  private static final double HEIGHT_PX = 380;

  /** Of the places along a ray every so many are drawn, and the last. */
  private static final int PLACES_A_POINT = 3;

  /** Ground that rises and falls this many times as far as rays run above it hides them. */
  private static final double MOST_RELIEF = 4.0;

  private final SightOptics optics;
  private final SightPath path;

  BundleSection(SightOptics optics) {
    this.optics = optics;
    path = optics.sight().path().path();
  }

  @Override
  public void addTo(Markup page) {
    if (ShownDistances.seen(optics).isEmpty()) {
      return;
    }
    page.open("section");
    page.leaf("h2", "The ways of the light");
    page.leaf(
        "p",
        "Rays from the camera, at the left, to evenly spaced heights at the distance, and some that"
            + " end in the ground before. Heights are much exaggerated. Where two rays meet at the"
            + " right, one thing is seen twice.");
    for (SightMapping mapping : ShownDistances.seen(optics)) {
      page.open("div", "class", "mapping");
      page.leaf("h3", "To " + Metres.text(mapping.distanceM()));
      page.add(plot(mapping).svg(WIDTH_PX, HEIGHT_PX)).close();
    }
    page.close();
  }

  private Plot plot(SightMapping mapping) {
    List<BundleRay> rays = RayBundle.of(optics, mapping);
    boolean overGround = relief(mapping.distanceM()) > MOST_RELIEF * highest(rays);
    double[] ground = groundDistances(mapping.distanceM());
    Axis x = new Axis("Distance (m)", AxisKind.LINEAR, 0.0, mapping.distanceM());
    Axis y =
        Axis.around(
            overGround
                ? "Height above the local ground (m)"
                : "Elevation above the level of the camera's foot (m)",
            DoubleStream.concat(
                rays.stream().flatMapToDouble(ray -> values(ray.path(), overGround)),
                DoubleStream.of(ground).map(d -> overGround ? 0.0 : groundM(d))));
    Plot plot = new Plot("Rays to " + Metres.text(mapping.distanceM()), x, y);
    addGround(plot, ground, y.low(), overGround);
    Set<Role> named = EnumSet.noneOf(Role.class);
    for (BundleRay ray : rays) {
      plot.add(line(ray, named.add(ray.role()), overGround));
    }
    return plot;
  }

  private double groundM(double distanceM) {
    return path.ground().elevationM(distanceM);
  }

  private double[] groundDistances(double reachM) {
    return DoubleStream.concat(
            DoubleStream.of(path.ground().breaksM()).filter(d -> d < reachM),
            DoubleStream.of(reachM))
        .toArray();
  }

  private double relief(double reachM) {
    double[] elevations =
        DoubleStream.of(groundDistances(reachM)).map(this::groundM).sorted().toArray();
    return elevations[elevations.length - 1] - elevations[0];
  }

  private static double highest(List<BundleRay> rays) {
    return rays.stream()
        .flatMapToDouble(ray -> DoubleStream.of(ray.path().heightsM()))
        .max()
        .orElse(0.0);
  }

  private static DoubleStream values(RayPath ray, boolean overGround) {
    return DoubleStream.of(overGround ? ray.heightsM() : ray.elevationsM());
  }

  private void addGround(Plot plot, double[] distances, double lowM, boolean overGround) {
    double[] foot = new double[distances.length];
    double[] top = new double[distances.length];
    double[] blocked = new double[distances.length];
    for (int i = 0; i < distances.length; i++) {
      foot[i] = lowM;
      top[i] = overGround ? 0.0 : groundM(distances[i]);
      blocked[i] = top[i] + path.blockedBelowM();
    }
    plot.add(new Band("ground", distances, foot, top, new Band.Fill(Ink.GREY, 0.45, false)));
    if (path.blockedBelowM() > 0.0) {
      plot.add(
          new Band(
              "what stands on it", distances, top, blocked, new Band.Fill(Ink.GREY, 0.2, false)));
    }
  }

  private static Line line(BundleRay ray, boolean named, boolean overGround) {
    RayPath path = ray.path();
    double[] distances = path.distancesM();
    double[] heights = values(path, overGround).toArray();
    int last = path.size() - 1;
    int[] drawn =
        IntStream.rangeClosed(0, last).filter(i -> i % PLACES_A_POINT == 0 || i == last).toArray();
    return new Line(
        named ? name(ray.role()) : "",
        IntStream.of(drawn).mapToDouble(i -> distances[i]).toArray(),
        IntStream.of(drawn).mapToDouble(i -> heights[i]).toArray(),
        stroke(ray.role()));
  }

  private static String name(Role role) {
    return switch (role) {
      case UPRIGHT -> "to the upright image";
      case INVERTED -> "to the inverted image";
      case GROUND -> "to the ground";
      case GRAZING -> "grazing";
      case VANISHING -> "vanishing line";
    };
  }

  private static Stroke stroke(Role role) {
    return switch (role) {
      case UPRIGHT -> new Stroke(Ink.BLUE, Dash.SOLID, 1.1);
      case INVERTED -> new Stroke(Ink.VERMILION, Dash.DASHED, 1.2);
      case GROUND -> new Stroke(Ink.GREY, Dash.DOTTED, 1.2);
      case GRAZING -> new Stroke(Ink.BLACK, Dash.DASH_DOT, 1.8);
      case VANISHING -> new Stroke(Ink.GREEN, Dash.SOLID, 2.2);
    };
  }
}
