package plumbray.cli.report.plot;

import plumbray.cli.report.markup.Markup;

/** Something drawn in a plot. */
public sealed interface Mark permits Band, Guide, Line, Points {

  /** What the legend calls it; empty to leave it out. */
  String name();

  /** Draws it. */
  void draw(Markup into, Frame frame);

  /** Draws its sample for the legend, {@code widthPx} wide with its left end's middle at x, y. */
  void drawKey(Markup into, double x, double y, double widthPx);
}
