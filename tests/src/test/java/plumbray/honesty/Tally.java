package plumbray.honesty;

import java.util.ArrayList;
import java.util.List;

/** What many fits said about one quantity, against its true value. */
final class Tally {
  private final String quantity;
  private final double bound;
  private final List<double[]> draws = new ArrayList<>();

  /** A tally of a quantity whose Cramer-Rao bound, as a standard deviation, is given. */
  Tally(String quantity, double bound) {
    this.quantity = quantity;
    this.bound = bound;
  }

  /** Adds what one fit said: its error and its standard deviation, in the quantity's unit. */
  void add(double error, double sigma) {
    draws.add(new double[] {error, sigma});
  }

  String quantity() {
    return quantity;
  }

  double bound() {
    return bound;
  }

  int count() {
    return draws.size();
  }

  /** Root mean square of the errors. */
  double rms() {
    return Math.sqrt(draws.stream().mapToDouble(d -> d[0] * d[0]).average().orElse(Double.NaN));
  }

  /** Mean of the errors. */
  double bias() {
    return draws.stream().mapToDouble(d -> d[0]).average().orElse(Double.NaN);
  }

  /** Mean of the standard deviations stated. */
  double stated() {
    return draws.stream().mapToDouble(d -> d[1]).average().orElse(Double.NaN);
  }

  /** How many errors lie within so many of the standard deviations stated with them. */
  long within(double sigmas) {
    return draws.stream().filter(d -> Math.abs(d[0]) <= sigmas * d[1]).count();
  }

  /** Share of the errors within so many of the standard deviations stated with them. */
  double share(double sigmas) {
    return (double) within(sigmas) / count();
  }
}
