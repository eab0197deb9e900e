package plumbray.wholejob;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import plumbray.calibration.sight.ImageBox;
import plumbray.imaging.photo.GreyPlane;
import plumbray.imaging.photo.PixelBox;
import plumbray.imaging.rectify.MaskPlane;
import plumbray.imaging.rectify.Rectified;

/**
 * A staff's edges as anybody would find them in a redrawn picture: between the middles of the bars
 * above and below, the row down to which the light is that of a sharp edge.
 */
final class RedrawnEdges {
  /** Narrowest bar of which the middle is free of its neighbours' blur, px. */
  private static final double NARROWEST_PX = 8.0;

  private RedrawnEdges() {}

  /**
   * One edge.
   *
   * @param heightM its height, m
   * @param rowPx the row where it was found
   * @param stretch redrawn rows to one row of the photo, at least 1: what was squeezed in the photo
   *     is drawn larger, and its shimmer with it
   */
  record Edge(double heightM, double rowPx, double stretch) {}

  /** The edges with restored rows all around, by rising height. */
  static List<Edge> of(Sample sample, Rectified redrawn) {
    ImageBox box = sample.result().asked().references().get(0).imageBox().orElseThrow();
    int left = (int) Math.ceil(box.u0());
    int width = (int) Math.floor(box.u1()) - left + 1;
    GreyPlane light =
        redrawn.picture().linearLuminance(new PixelBox(left, 0, width, redrawn.picture().height()));
    double[] column = new double[light.height()];
    for (int v = 0; v < column.length; v++) {
      for (int u = 0; u < width; u++) {
        column[v] += light.at(u, v) / width;
      }
    }
    List<Edge> edges = new ArrayList<>();
    List<Sample.Mark> marks = sample.marks();
    for (int i = 1; i + 1 < marks.size(); i++) {
      double upper = 0.5 * (marks.get(i).straightRowPx() + marks.get(i + 1).straightRowPx());
      double lower = 0.5 * (marks.get(i).straightRowPx() + marks.get(i - 1).straightRowPx());
      int top = (int) Math.round(upper);
      int bottom = (int) Math.round(lower);
      boolean wide = bottom - top >= NARROWEST_PX;
      if (wide && alike(marks, i) && restored(redrawn.mask(), left + width / 2, top, bottom)) {
        double row = divide(column, top, bottom);
        edges.add(new Edge(marks.get(i).heightM(), row, stretch(marks, i)));
      }
    }
    return edges;
  }

  /**
   * Whether an edge and its neighbours are seen equally often, so that one image shows them all.
   */
  private static boolean alike(List<Sample.Mark> marks, int i) {
    int images = marks.get(i).images().size();
    return images > 0
        && marks.get(i - 1).images().size() == images
        && marks.get(i + 1).images().size() == images;
  }

  private static double stretch(List<Sample.Mark> marks, int i) {
    double straight = marks.get(i + 1).straightRowPx() - marks.get(i - 1).straightRowPx();
    return Math.max(1.0, straight / (highest(marks.get(i + 1)) - highest(marks.get(i - 1))));
  }

  /** Row of the highest image, the upright one that is redrawn. */
  private static double highest(Sample.Mark mark) {
    return mark.images().stream().mapToDouble(Sample.Image::v).min().orElseThrow();
  }

  private static boolean restored(MaskPlane mask, int column, int top, int bottom) {
    for (int v = top; v <= bottom; v++) {
      if (v < 0 || v >= mask.heightPx() || mask.at(column, v) != MaskPlane.UPRIGHT) {
        return false;
      }
    }
    return true;
  }

  private static double divide(double[] column, int top, int bottom) {
    double above = level(column, top);
    double below = level(column, bottom);
    double light = 0.0;
    for (int v = top; v <= bottom; v++) {
      light += column[v];
    }
    return (light + above * (top - 0.5) - below * (bottom + 0.5)) / (above - below);
  }

  /** Brightness of a bar at its middle. */
  private static double level(double[] column, int row) {
    double[] around = Arrays.copyOfRange(column, row - 1, row + 2);
    Arrays.sort(around);
    return around[1];
  }
}
