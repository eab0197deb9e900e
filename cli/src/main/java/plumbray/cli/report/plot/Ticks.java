package plumbray.cli.report.plot;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.DoubleStream;
import plumbray.cli.report.markup.NumberText;

/** Round values over a range: 1, 2 or 5 times a power of ten. */
final class Ticks {

  private static final double[] STEPS = {1.0, 2.0, 5.0, 10.0};

  /** Rounding of the range's ends, in steps. */
  private static final double SLACK = 1e-9;

  /** On an axis with a zero, values below this part of the largest have no room. */
  private static final double SMALLEST = 1e-6;

  private Ticks() {}

  /** Evenly spaced ticks within a range, at most {@code most} of them where {@code most} >= 3. */
  static List<Tick> even(double low, double high, int most) {
    double power = Math.pow(10.0, Math.floor(Math.log10((high - low) / most)));
    int i = 0;
    while (count(low, high, STEPS[i] * power) > most && i < STEPS.length - 1) {
      i++;
    }
    double step = STEPS[i] * power;
    int decimals = (int) Math.max(0.0, -Math.floor(Math.log10(step) + SLACK));
    List<Tick> ticks = new ArrayList<>();
    long last = (long) Math.floor(high / step + SLACK);
    for (long k = (long) Math.ceil(low / step - SLACK); k <= last; k++) {
      double value = Math.rint(k * STEPS[i]) * power;
      ticks.add(new Tick(value, NumberText.fixed(value, decimals)));
    }
    return ticks;
  }

  /** Whole numbers within a range. */
  static List<Tick> whole(double low, double high, int most) {
    return even(low, high, most).stream()
        .filter(tick -> Math.abs(tick.value() - Math.rint(tick.value())) < SLACK)
        .map(tick -> new Tick(tick.value(), NumberText.fixed(tick.value(), 0)))
        .toList();
  }

  private static long count(double low, double high, double step) {
    return (long) (Math.floor(high / step + SLACK) - Math.ceil(low / step - SLACK)) + 1;
  }

  /** Ticks on an uneven axis: zero, and round values from the far ends, none too near another. */
  static List<Tick> uneven(Axis axis, int most) {
    double room = 0.8 / most;
    List<Double> chosen = new ArrayList<>();
    for (double value : candidates(axis.low(), axis.high())) {
      double at = axis.fraction(value);
      if (chosen.stream().allMatch(other -> Math.abs(axis.fraction(other) - at) >= room)) {
        chosen.add(value);
      }
    }
    return chosen.stream()
        .sorted()
        .map(value -> new Tick(value, NumberText.significant(value, 3)))
        .toList();
  }

  /** Round values in a range, zero first where it is in it, then by falling size. */
  private static List<Double> candidates(double low, double high) {
    List<Double> values = new ArrayList<>();
    if (low <= 0.0 && high >= 0.0) {
      values.add(0.0);
    }
    double largest = Math.max(Math.abs(low), Math.abs(high));
    double least = low > 0.0 ? low : SMALLEST * largest;
    for (int p = (int) Math.ceil(Math.log10(largest)); p >= Math.floor(Math.log10(least)); p--) {
      for (int i = STEPS.length - 2; i >= 0; i--) {
        double value = STEPS[i] * Math.pow(10.0, p);
        DoubleStream.of(value, -value).filter(v -> within(v, low, high)).forEach(values::add);
      }
    }
    return values;
  }

  private static boolean within(double value, double low, double high) {
    double slack = SLACK * Math.abs(value);
    return value >= low - slack && value <= high + slack;
  }
}
