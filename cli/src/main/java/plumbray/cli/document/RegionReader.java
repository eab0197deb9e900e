package plumbray.cli.document;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Region;

/** Reads {@code regions} of a sight file: what lies where in the picture. */
final class RegionReader {
  static final Limits CORNER = new Limits("corner of a region", Unit.PIXEL, -1e6, 1e6);

  private static final String WHAT = "a region of the picture";
  private static final String POLYGON = "corners of the region, [u, v] each";
  private static final List<String> KEYS = List.of("name", "distanceM", "surface", "polygonPx");
  private static final int FEWEST_CORNERS = 3;

  private RegionReader() {}

  /** Reads the regions; left out, the whole photo is at the first reference's distance. */
  static List<Region> read(Optional<Node> regions, List<Reference> references) {
    if (regions.isEmpty()) {
      return references.stream()
          .limit(1)
          .map(first -> new Region("the photo", false, first.distanceM(), Optional.empty()))
          .toList();
    }
    List<Region> read = new ArrayList<>();
    for (Node region : regions.get().elements("regions of the picture", 1)) {
      read.add(region(region));
    }
    return read;
  }

  private static Region region(Node region) {
    region.onlyKeys(WHAT, KEYS);
    String name = region.text("name", "name of the region");
    Optional<double[][]> polygon = region.find("polygonPx").map(RegionReader::polygon);
    if (region.has("distanceM") == region.has("surface")) {
      String found = region.has("surface") ? "given both" : "given neither";
      throw region.wrong(found, "given exactly one of distanceM, surface", WHAT);
    }
    if (region.has("surface")) {
      region.child("surface").choice("what the region shows", List.of("ground"));
      return new Region(name, true, Double.NaN, polygon);
    }
    return new Region(name, false, region.si("distanceM", ReferenceReader.DISTANCE), polygon);
  }

  private static double[][] polygon(Node node) {
    List<Node> corners = node.elements(POLYGON, FEWEST_CORNERS);
    double[][] polygon = new double[corners.size()][];
    for (int i = 0; i < polygon.length; i++) {
      polygon[i] = corners.get(i).tuple("one corner of a region, [u, v]", CORNER, CORNER);
    }
    return polygon;
  }
}
