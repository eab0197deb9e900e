package plumbray.imaging.scene;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import plumbray.imaging.photo.Photo;
import plumbray.raymodel.mapping.Sense;

/** The edges of one staff's bars down a picture, and their places in a photo of it. */
record SeenEdges(List<Edge> inner) {
  /** Narrowest bar that is measured: the point spread then leaves its middle untouched. */
  private static final double NARROWEST_PX = 12;

  private static final double DARK = 0.04;
  private static final double BRIGHT = 0.8;

  /** The middles of the bars above and below an edge, and whether the lower one is bright. */
  record Around(double upperPx, double lowerPx, boolean brightBelow) {}

  record Edge(Sense sense, double columnPx, double rowPx, Around around) {
    double rowIn(Photo photo, int fromU, int toU) {
      return around.brightBelow()
          ? rowBetween(photo, fromU, toU, DARK, BRIGHT)
          : rowBetween(photo, fromU, toU, BRIGHT, DARK);
    }

    /**
     * The row that divides the light between the middles of the two bars: whatever the point
     * spread, the light down to there is that of a sharp edge.
     */
    double rowBetween(Photo photo, int fromU, int toU, double above, double below) {
      int top = (int) Math.round(around.upperPx());
      int bottom = (int) Math.round(around.lowerPx());
      double light = 0;
      for (int v = top; v <= bottom; v++) {
        for (int u = fromU; u <= toU; u++) {
          light += LinearColour.decode(photo.sample(u, v, 1) / 65535.0) / (toU - fromU + 1);
        }
      }
      return (light + above * (top - 0.5) - below * (bottom + 0.5)) / (above - below);
    }
  }

  private record Seen(double heightM, SceneTruth.Image image) {
    double rowPx() {
      return image.pixel().v();
    }
  }

  static SeenEdges of(List<SceneTruth.Mark> marks) {
    List<Seen> seen = new ArrayList<>();
    marks.forEach(
        mark -> mark.images().forEach(image -> seen.add(new Seen(mark.heightM(), image))));
    seen.sort(Comparator.comparingDouble(Seen::rowPx));
    List<Edge> inner = new ArrayList<>();
    for (int i = 1; i + 1 < seen.size(); i++) {
      double above = seen.get(i).rowPx() - seen.get(i - 1).rowPx();
      double below = seen.get(i + 1).rowPx() - seen.get(i).rowPx();
      if (Math.min(above, below) > NARROWEST_PX) {
        inner.add(edge(seen.get(i), above, below));
      }
    }
    return new SeenEdges(inner);
  }

  private static Edge edge(Seen seen, double above, double below) {
    double rowPx = seen.rowPx();
    boolean upright = seen.image().sense() == Sense.UPRIGHT;
    int barAbove = (int) Math.round(seen.heightM() / 0.2);
    // Bars are numbered from the foot, even ones dark; upside down the next lower bar is above.
    int barBelowInPicture = upright ? barAbove - 1 : barAbove;
    return new Edge(
        seen.image().sense(),
        seen.image().pixel().u(),
        rowPx,
        new Around(rowPx - above / 2, rowPx + below / 2, barBelowInPicture % 2 != 0));
  }

  long count(Sense sense) {
    return inner.stream().filter(edge -> edge.sense() == sense).count();
  }
}
