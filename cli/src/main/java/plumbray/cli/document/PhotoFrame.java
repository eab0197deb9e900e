package plumbray.cli.document;

import plumbray.calibration.sight.ImageBox;

/**
 * The frame of the photo, from the outer edge of its first pixels to that of its last.
 *
 * @param widthPx columns of the photo
 * @param heightPx rows of the photo
 */
record PhotoFrame(int widthPx, int heightPx) {
  private static final double HALF = 0.5;

  Limits column() {
    return new Limits("column inside the photo", Unit.PIXEL, -HALF, widthPx - HALF);
  }

  Limits row() {
    return new Limits("row inside the photo", Unit.PIXEL, -HALF, heightPx - HALF);
  }

  /** Reads {@code [u0, v0, u1, v1]}, a box inside the photo. */
  ImageBox box(Node node) {
    String what = "box in the photo, [u0, v0, u1, v1]";
    double[] box = node.tuple(what, column(), row(), column(), row());
    checkRises(node, box, 0);
    checkRises(node, box, 1);
    return new ImageBox(box[0], box[1], box[2], box[3]);
  }

  private static void checkRises(Node node, double[] box, int axis) {
    if (!(box[axis] < box[axis + 2])) {
      Node last = node.elements("").get(axis + 2);
      throw last.wrong(
          Unit.PIXEL.show(box[axis + 2]),
          "above " + Unit.PIXEL.show(box[axis]),
          "box in the photo, [u0, v0, u1, v1]");
    }
  }
}
