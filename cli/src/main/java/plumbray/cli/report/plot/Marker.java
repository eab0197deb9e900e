package plumbray.cli.report.plot;

import static plumbray.cli.report.markup.NumberText.coordinate;

import plumbray.cli.report.markup.Markup;

/** Shapes of points. */
public enum Marker {
  /** A small filled dot. */
  DOT("m-2.2 0a2.2 2.2 0 1 0 4.4 0a2.2 2.2 0 1 0 -4.4 0z", true),
  /** A ring. */
  RING("m-3.4 0a3.4 3.4 0 1 0 6.8 0a3.4 3.4 0 1 0 -6.8 0z", false),
  /** A filled triangle that stands on its base. */
  TRIANGLE_UP("m0 -4.6l4.2 7.4h-8.4z", true),
  /** A hollow triangle on its tip. */
  TRIANGLE_DOWN("m0 4.6l4.2 -7.4h-8.4z", false),
  /** A hollow square on its corner. */
  DIAMOND("m0 -4.8l4.2 4.8l-4.2 4.8l-4.2 -4.8z", false),
  /** A cross. */
  CROSS("m-3.6 -3.6l7.2 7.2m0 -7.2l-7.2 7.2", false);

  private final String path;
  private final boolean filled;

  Marker(String path, boolean filled) {
    this.path = path;
    this.filled = filled;
  }

  /** Draws the shape around a place, CSS px. */
  void draw(Markup into, double x, double y, Ink ink) {
    into.empty(
        "path",
        "d",
        "M" + coordinate(x) + " " + coordinate(y) + path,
        "fill",
        filled ? ink.css() : "#ffffff",
        "stroke",
        ink.css(),
        "stroke-width",
        "1.3");
  }
}
