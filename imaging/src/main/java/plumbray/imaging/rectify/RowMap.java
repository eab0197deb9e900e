package plumbray.imaging.rectify;

/** Where the pixels of one output row come from. */
final class RowMap {
  final int[] codes;
  final double[] u;
  final double[] v;
  final double[] stretch;

  RowMap(int width) {
    codes = new int[width];
    u = new double[width];
    v = new double[width];
    stretch = new double[width];
  }

  int width() {
    return codes.length;
  }

  boolean isShown(int x) {
    return codes[x] == MaskPlane.UPRIGHT || codes[x] == MaskPlane.INVERTED;
  }

  /** Whether all pixels from {@code from} to before {@code to} are shown. */
  boolean allShown(int from, int to) {
    for (int x = from; x < to; x++) {
      if (!isShown(x)) {
        return false;
      }
    }
    return true;
  }
}
