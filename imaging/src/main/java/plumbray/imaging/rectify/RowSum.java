package plumbray.imaging.rectify;

/**
 * A weighted sum of rows in single precision, four rows at a time: loops with nothing else in them
 * and one index for all arrays, which run at the speed of the processor's vector units.
 */
final class RowSum {
  private static final int TOGETHER = 4;

  private float[][] rows = new float[2 * TOGETHER][];
  private float[] weights = new float[2 * TOGETHER];
  private int groups;

  /** Starts a sum of so many rows. */
  void start(int count) {
    groups = (count + TOGETHER - 1) / TOGETHER;
    if (rows.length < groups * TOGETHER) {
      rows = new float[2 * groups * TOGETHER][];
      weights = new float[rows.length];
    }
  }

  /** Sets row i and its weight; those after it in its group are left without weight. */
  void put(int i, float[] row, double weight) {
    rows[i] = row;
    weights[i] = (float) weight;
    for (int next = i + 1; next % TOGETHER != 0; next++) {
      rows[next] = row;
      weights[next] = 0f;
    }
  }

  /** Writes the sum of the samples from {@code start} to before {@code end} to the same places. */
  void write(float[] into, int start, int end) {
    set(into, start, end);
    for (int group = 1; group < groups; group++) {
      if (weights[group * TOGETHER + 2] != 0) {
        addFour(group * TOGETHER, into, start, end);
      } else {
        addTwo(group * TOGETHER, into, start, end);
      }
    }
  }

  private void set(float[] into, int start, int end) {
    float[] a = rows[0];
    float[] b = rows[1];
    float[] c = rows[2];
    float[] d = rows[3];
    float ofA = weights[0];
    float ofB = weights[1];
    float ofC = weights[2];
    float ofD = weights[3];
    for (int i = start; i < end; i++) {
      into[i] = ofA * a[i] + ofB * b[i] + ofC * c[i] + ofD * d[i];
    }
  }

  private void addFour(int first, float[] into, int start, int end) {
    float[] a = rows[first];
    float[] b = rows[first + 1];
    float[] c = rows[first + 2];
    float[] d = rows[first + 3];
    float ofA = weights[first];
    float ofB = weights[first + 1];
    float ofC = weights[first + 2];
    float ofD = weights[first + 3];
    for (int i = start; i < end; i++) {
      into[i] += ofA * a[i] + ofB * b[i] + ofC * c[i] + ofD * d[i];
    }
  }

  private void addTwo(int first, float[] into, int start, int end) {
    float[] a = rows[first];
    float[] b = rows[first + 1];
    float ofA = weights[first];
    float ofB = weights[first + 1];
    for (int i = start; i < end; i++) {
      into[i] += ofA * a[i] + ofB * b[i];
    }
  }
}
