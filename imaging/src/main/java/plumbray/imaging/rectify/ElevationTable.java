package plumbray.imaging.rectify;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * True elevation to apparent elevation for the things of one region, as a table.
 *
 * <p>The table holds for things at distance D on the axis. A thing at azimuth a stands at D / cos
 * a; the ray that shows it there is found to first order in q = 1 - cos a, from the slope of the
 * ray where it passes D: true elevation at D / cos a is that at D plus q times the lag, exactly so
 * for straight lines over a plane.
 */
final class ElevationTable {
  /** The region says nothing about this elevation. */
  static final int NOT_HERE = -1;

  private final TablePiece[] pieces;
  private final double pixelRad;

  private ElevationTable(List<TablePiece> pieces, double pixelRad) {
    this.pieces = pieces.toArray(TablePiece[]::new);
    this.pixelRad = pixelRad;
  }

  /** What a table answers; filled anew at each look-up. */
  static final class Answer {
    int code;

    /** Which piece of the table answered. */
    int piece;

    double apparentRad;

    /** True elevation at the region's distance on the axis. */
    double onAxisRad;

    /** Source pixels that one output pixel is high. */
    double stretch;
  }

  /**
   * A table of pieces.
   *
   * @param pieces one after the other by rising elevation, from minus to plus infinity
   * @param pixelRad angle of one pixel, rad
   */
  static ElevationTable of(List<TablePiece> pieces, double pixelRad) {
    List<TablePiece> linked = new ArrayList<>();
    for (int i = 0; i < pieces.size(); i++) {
      TablePiece piece = pieces.get(i);
      linked.add(piece.isShown() ? piece : linked(pieces, i));
    }
    return new ElevationTable(linked, pixelRad);
  }

  /** The table of things that are never seen. */
  static ElevationTable ofNothing() {
    double[] all = {Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY};
    return of(List.of(TablePiece.dark(all, MaskPlane.NEVER_VISIBLE)), 1);
  }

  /** A dark piece moves with the shown ones beside it as distance grows. */
  private static TablePiece linked(List<TablePiece> pieces, int dark) {
    OptionalDouble below = OptionalDouble.empty();
    OptionalDouble above = OptionalDouble.empty();
    for (int i = 0; i < pieces.size(); i++) {
      if (pieces.get(i).isShown() && i < dark) {
        below = OptionalDouble.of(pieces.get(i).lagAtHighestRad());
      } else if (pieces.get(i).isShown() && above.isEmpty()) {
        above = OptionalDouble.of(pieces.get(i).lagAtLowestRad());
      }
    }
    return pieces.get(dark).between(below.orElse(above.orElse(0)), above.orElse(below.orElse(0)));
  }

  /**
   * Looks a true elevation up.
   *
   * @param trueRad true elevation, rad
   * @param fartherShare q = 1 - cos(azimuth), dimensionless
   * @param answer receives code, apparent elevation and stretch
   */
  void look(double trueRad, double fartherShare, Answer answer) {
    double onAxisRad = trueRad - fartherShare * pieces[index(trueRad)].lagRad(trueRad);
    answer.onAxisRad = onAxisRad;
    answer.piece = index(onAxisRad);
    TablePiece piece = pieces[answer.piece];
    answer.code = piece.code();
    if (piece.isShown()) {
      answer.apparentRad = onAxisRad + piece.shiftRad(onAxisRad);
      answer.stretch = piece.stretch(onAxisRad, pixelRad);
    }
  }

  private int index(double trueRad) {
    int i = 0;
    while (i < pieces.length - 1 && trueRad > pieces[i].highestRad()) {
      i++;
    }
    return i;
  }
}
