package plumbray.cli.report;

import java.util.Optional;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.imaging.rectify.SigmaPlane;

/** How surely the redrawn photo's pixels stand where they do. */
final class SigmaSection implements Section {
  private static final int WIDTH_MOST_PX = 700;
  private static final int UNKNOWN_RGB = 0xf2f4f5;

  /** Upper bounds of the classes, px; the last has none. */
  private static final double[] BOUNDS_PX = {0.05, 0.1, 0.2, 0.5, 1.0};

  /** From light to dark, so that it reads in grey too. */
  private static final int[] COLOURS_RGB = {
    0xdbe9c8, 0xa8d6a4, 0x66b8a6, 0x2f8fa3, 0x23628f, 0x2b2f6b
  };

  private final Optional<SigmaPlane> sigma;

  SigmaSection(ReportInput input) {
    this.sigma = input.sigma();
  }

  @Override
  public void addTo(Markup page) {
    sigma.ifPresent(plane -> add(page, plane));
  }

  private void add(Markup page, SigmaPlane plane) {
    page.open("section", "class", "sigma");
    page.leaf("h2", "How surely it stands there");
    page.open("figure");
    Raster map = map(plane);
    page.empty(
        "img",
        "src",
        map.png(),
        "alt",
        "Standard deviation of each pixel's row in the redrawn photo",
        "width",
        Integer.toString(map.width()),
        "height",
        Integer.toString(map.height()));
    page.leaf(
        "figcaption",
        "Standard deviation of the row in which the content of each redrawn pixel belongs, from the"
            + " fit's covariance; for all of a line of sight together, not pixel by pixel. The file"
            + " ending in .sigma.tif holds it in px.");
    page.close();
    legend(page, plane);
    page.close();
  }

  private static Raster map(SigmaPlane plane) {
    int width = Math.min(WIDTH_MOST_PX, plane.widthPx());
    int height = Math.max(1, plane.heightPx() * width / plane.widthPx());
    Raster map = Raster.blank(width, height);
    for (int y = 0; y < height; y++) {
      for (int x = 0; x < width; x++) {
        int u = (int) ((x + 0.5) * plane.widthPx() / width);
        int v = (int) ((y + 0.5) * plane.heightPx() / height);
        map.set(x, y, colour(plane.at(u, v)));
      }
    }
    return map;
  }

  private static int colour(float sigmaPx) {
    if (Float.isNaN(sigmaPx)) {
      return UNKNOWN_RGB;
    }
    int kind = 0;
    while (kind < BOUNDS_PX.length && sigmaPx >= BOUNDS_PX[kind]) {
      kind++;
    }
    return COLOURS_RGB[kind];
  }

  private static void legend(Markup page, SigmaPlane plane) {
    double[] below = plane.sharesBelow(BOUNDS_PX);
    page.open("ul", "class", "tints");
    for (int kind = 0; kind < COLOURS_RGB.length; kind++) {
      double upTo = kind < below.length ? below[kind] : 1.0;
      double share = upTo - (kind > 0 ? below[kind - 1] : 0.0);
      if (share > 0.0) {
        item(page, COLOURS_RGB[kind], words(kind) + ": " + percent(share) + " of them");
      }
    }
    item(page, UNKNOWN_RGB, "not restored, or ground, for which it is not worked out");
    page.close();
  }

  private static void item(Markup page, int rgb, String words) {
    Raster sample = Raster.blank(28, 16);
    for (int y = 0; y < sample.height(); y++) {
      for (int x = 0; x < sample.width(); x++) {
        sample.set(x, y, rgb);
      }
    }
    page.open("li");
    page.empty("img", "src", sample.png(), "alt", "", "width", "28", "height", "16");
    page.text(" " + words).close();
  }

  private static String words(int kind) {
    if (kind == BOUNDS_PX.length) {
      return NumberText.significant(BOUNDS_PX[kind - 1], 1) + " px or more";
    }
    return "below " + NumberText.significant(BOUNDS_PX[kind], 1) + " px";
  }

  private static String percent(double share) {
    return share < 0.001 ? "less than 0.1 %" : NumberText.fixed(100.0 * share, 1) + " %";
  }
}
