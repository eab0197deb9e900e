package plumbray.cli.sheet;

import java.io.IOException;

/** Draws in black on a sheet; lengths in mm, y upwards from the sheet's lower edge. */
interface Pen {
  /** Which end of a text its place is. */
  enum Align {
    LEFT,
    MIDDLE,
    RIGHT
  }

  /** Fills an upright rectangle, given by its lower left corner and its size. */
  void fill(double xMm, double yMm, double widthMm, double heightMm) throws IOException;

  /** Draws a straight line. */
  void line(double x0Mm, double y0Mm, double x1Mm, double y1Mm, double thickMm) throws IOException;

  /** Writes one line of text; y is its base line, the size that of the letters' square. */
  void text(double xMm, double yMm, double sizeMm, Align align, String text) throws IOException;
}
