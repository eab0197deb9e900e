package plumbray.imaging.rectify;

/**
 * An interpolation kernel over samples one apart. Where many samples go into one pixel it is
 * widened by their number and divided by its sum, so that detail too fine for the output is
 * averaged rather than aliased.
 */
abstract class Kernel {
  /** Distance beyond which a sample has no weight, samples. */
  abstract double reach();

  /** Weight of a sample at a distance of {@code x} samples, before dividing by the sum. */
  abstract double weight(double x);

  /**
   * The weights of many samples, in single precision.
   *
   * @param distances distances, samples, of either sign and as large as one likes; used up
   * @param into receives the weights, before dividing by their sum
   * @param count how many
   */
  abstract void weights(float[] distances, float[] into, int count);

  /** Whether the weights of samples one apart have the sum 1 by themselves. */
  abstract boolean sumsToOne();
}
