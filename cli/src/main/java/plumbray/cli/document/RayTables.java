package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import plumbray.imaging.diagnosis.StretchZones;
import plumbray.imaging.diagnosis.TargetRay;
import plumbray.raymodel.diagnosis.Bend;
import plumbray.raymodel.diagnosis.HeightZone;
import plumbray.raymodel.diagnosis.RayPath;

/** Writes the tables that tell what the light of a sight went through. */
public final class RayTables {
  private static final List<String> IMAGE = List.of("distance_m", "height_m", "sense");

  /** Parts of the weight at which {@code felt_..._m} are given. */
  private static final double[] SHARES = {0.05, 0.25, 0.5, 0.75, 0.95};

  /** Of the places along a ray every sixth is written, and the last. */
  private static final int PLACES_A_LINE = 6;

  private static final int MRAD = 7;
  private static final int PIXEL = 4;
  private static final int MILLIMETRE = 3;
  private static final int METRE = 6;
  private static final int DIGITS = 6;

  private RayTables() {}

  /** The heights that the light to each image felt, a line an image. */
  public static String felt(List<TargetRay> rays) {
    CsvTable table =
        imageTable(
            "apparent_elevation_mrad",
            "row_px",
            "lowest_ray_height_m",
            "lowest_at_m",
            "felt_5pct_m",
            "felt_25pct_m",
            "felt_50pct_m",
            "felt_75pct_m",
            "felt_95pct_m",
            "felt_mean_m",
            "mean_refraction_coefficient",
            "convex_share");
    for (TargetRay ray : rays) {
      RayPath path = ray.path();
      List<String> fields = image(ray);
      fields.add(Numbers.fixed(Unit.MILLIRADIAN.spanFromSi(path.apparentRad()), MRAD));
      fields.add(Numbers.fixed(ray.rowPx(), PIXEL));
      fields.add(Numbers.fixed(path.heightsM()[path.lowestPlace()], METRE));
      fields.add(Numbers.fixed(path.distancesM()[path.lowestPlace()], MILLIMETRE));
      for (double share : SHARES) {
        fields.add(Numbers.fixed(ray.felt().quantileM(share), METRE));
      }
      fields.add(Numbers.fixed(ray.felt().meanM(), METRE));
      fields.add(Numbers.significant(path.meanCoefficient(), DIGITS));
      fields.add(Numbers.fixed(ray.convexShare(), PIXEL));
      table.add(fields.toArray(String[]::new));
    }
    return table.text();
  }

  /** Where the line of sight to each image is concave and where convex to the ground. */
  public static String bends(List<TargetRay> rays) {
    CsvTable table = imageTable("from_m", "to_m", "curving");
    for (TargetRay ray : rays) {
      for (Bend bend : ray.bends()) {
        List<String> fields = image(ray);
        fields.add(Numbers.fixed(bend.fromM(), MILLIMETRE));
        fields.add(Numbers.fixed(bend.toM(), MILLIMETRE));
        fields.add(bend.curving().name().toLowerCase(Locale.ROOT));
        table.add(fields.toArray(String[]::new));
      }
    }
    return table.text();
  }

  /** Where each ray runs, and how strongly it is bent there. */
  public static String rays(List<TargetRay> rays) {
    CsvTable table =
        imageTable("along_m", "ray_elevation_m", "ray_height_m", "refraction_coefficient");
    for (TargetRay ray : rays) {
      RayPath path = ray.path();
      double[] along = path.distancesM();
      double[] elevations = path.elevationsM();
      double[] heights = path.heightsM();
      double[] coefficients = path.coefficients();
      for (int i = 0; i < path.size(); i++) {
        if (i % PLACES_A_LINE == 0 || i == path.size() - 1) {
          List<String> fields = image(ray);
          fields.add(Numbers.fixed(along[i], MILLIMETRE));
          fields.add(Numbers.fixed(elevations[i], METRE));
          fields.add(Numbers.fixed(heights[i], METRE));
          fields.add(Numbers.significant(coefficients[i], DIGITS));
          table.add(fields.toArray(String[]::new));
        }
      }
    }
    return table.text();
  }

  /** Heights at which the air is steeper than autoconvective; the last may be without end. */
  public static String steep(List<StretchZones> stretches) {
    CsvTable table = new CsvTable(List.of("stretch_from_m", "lowest_height_m", "highest_height_m"));
    for (StretchZones stretch : stretches) {
      for (HeightZone zone : stretch.zones()) {
        table.add(
            Numbers.shortest(stretch.fromM()),
            Numbers.fixed(zone.lowM(), METRE),
            Numbers.fixed(zone.highM(), METRE));
      }
    }
    return table.text();
  }

  private static CsvTable imageTable(String... columns) {
    List<String> header = new ArrayList<>(IMAGE);
    header.addAll(List.of(columns));
    return new CsvTable(header);
  }

  private static List<String> image(TargetRay ray) {
    List<String> fields = new ArrayList<>();
    fields.add(Numbers.shortest(ray.distanceM()));
    fields.add(Numbers.shortest(ray.heightM()));
    fields.add(ray.sense().name().toLowerCase(Locale.ROOT));
    return fields;
  }
}
