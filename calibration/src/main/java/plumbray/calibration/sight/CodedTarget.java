package plumbray.calibration.sight;

import java.util.Arrays;
import java.util.Optional;
import plumbray.calibration.sight.Checks.Named;

/**
 * A staff of equally high elements, dark and bright as a binary sequence of maximal length has them
 * ({@link MaximalSequence}); neighbours of one kind form one bar. As many elements in a row as the
 * register has stages tell their height, twice as many also whether they are seen upside down.
 *
 * @param bits stages of the register that makes the sequence, 5 to 9
 * @param elements how many elements there are, from the sequence's first, at most 2^bits - 1
 * @param moduleM height of one element, m
 * @param bottomM height of the lowest element's lower edge above the staff's foot, m
 * @param firstBarDark whether the lowest element is dark
 */
public record CodedTarget(
    int bits, int elements, double moduleM, double bottomM, boolean firstBarDark)
    implements ReferenceKind {

  /** Checks that the sequence has as many elements, and that the sizes are sizes. */
  public CodedTarget {
    int most = MaximalSequence.length(bits);
    Checks.within(
        elements, fewestElements(bits), most, new Named("elements", "", "elements of the staff"));
    Checks.above(moduleM, 0, new Named("moduleM", "m", "height of one element"));
    Checks.finite(bottomM, new Named("bottomM", "m", "lowest edge above the foot"));
  }

  /**
   * Fewest elements that tell their height and which way up they are seen.
   *
   * @param bits stages of the register
   */
  public static int fewestElements(int bits) {
    return 2 * bits;
  }

  /** Height of the topmost edge above the foot, m. */
  public double topM() {
    return edgeM(elements);
  }

  private double edgeM(int element) {
    return bottomM + element * moduleM;
  }

  /** The staff's bars, each a run of equal elements. */
  public StaffTarget staff() {
    boolean[] sequence = MaximalSequence.of(bits);
    double[] edgesM = new double[elements + 1];
    int edges = 0;
    edgesM[edges++] = edgeM(0);
    for (int i = 1; i < elements; i++) {
      if (sequence[i] != sequence[i - 1]) {
        edgesM[edges++] = edgeM(i);
      }
    }
    edgesM[edges++] = edgeM(elements);
    return new StaffTarget(Arrays.copyOf(edgesM, edges), firstBarDark);
  }

  @Override
  public Optional<StaffTarget> bars() {
    return Optional.of(staff());
  }
}
