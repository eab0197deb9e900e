package plumbray.cli.report.plot;

import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;

/**
 * One axis of a plot.
 *
 * @param label what it shows, with the unit
 * @param kind how values spread over it
 * @param low value at its start: left or bottom
 * @param high value at its end; below {@code low} for an even axis that runs the other way
 */
public record Axis(String label, AxisKind kind, double low, double high) {

  /** Room beyond the values at each end, as a part of their range. */
  private static final double PADDING = 0.05;

  /** Checks that there is a range, and one that the kind can show. */
  public Axis {
    if (!Double.isFinite(low) || !Double.isFinite(high) || low == high) {
      throw new IllegalArgumentException(
          "axis %s is from %s to %s, must have two finite ends that differ"
              .formatted(label, low, high));
    }
    boolean rising = low < high;
    boolean possible =
        switch (kind) {
          case LINEAR, COUNT -> true;
          case SQUARE_ROOT -> rising;
          case LOGARITHMIC -> rising && low > 0.0;
        };
    if (!possible) {
      throw new IllegalArgumentException(
          "axis %s is from %s to %s, must rise from %s (axis that is not even)"
              .formatted(
                  label, low, high, kind == AxisKind.LOGARITHMIC ? "above 0" : "at least 0"));
    }
  }

  /** An even axis around values with some room; what is not finite is passed over. */
  public static Axis around(String label, DoubleStream values) {
    double[] finite = values.filter(Double::isFinite).toArray();
    if (finite.length == 0) {
      return new Axis(label, AxisKind.LINEAR, 0.0, 1.0);
    }
    double least = Arrays.stream(finite).min().getAsDouble();
    double most = Arrays.stream(finite).max().getAsDouble();
    double range = most - least;
    // a range lost in rounding, as of a constant, is widened
    double room =
        range > 1e-9 * Math.max(Math.abs(least), Math.abs(most))
            ? PADDING * range
            : Math.max(1e-3, PADDING * Math.abs(most));
    return new Axis(label, AxisKind.LINEAR, least - room, most + room);
  }

  /** The same axis with its range widened about its middle to at least {@code range}. */
  public Axis atLeast(double range) {
    double lacking = range - Math.abs(high - low);
    double side = Math.copySign(Math.max(0.0, lacking) / 2.0, high - low);
    return new Axis(label, kind, low - side, high + side);
  }

  /** The same range spread otherwise. */
  public Axis spread(AxisKind otherKind) {
    return new Axis(label, otherKind, low, high);
  }

  /** The same axis the other way round. */
  public Axis reversed() {
    return new Axis(label, kind, high, low);
  }

  /** Where a value lies: 0 at the start, 1 at the end; NaN where the kind cannot show it. */
  public double fraction(double value) {
    double start = kind.warp(low);
    return (kind.warp(value) - start) / (kind.warp(high) - start);
  }

  /** Round values to mark, at most about {@code most} of them. */
  public List<Tick> ticks(int most) {
    double least = Math.min(low, high);
    double greatest = Math.max(low, high);
    return switch (kind) {
      case LINEAR -> Ticks.even(least, greatest, most);
      case COUNT -> Ticks.whole(least, greatest, most);
      case SQUARE_ROOT, LOGARITHMIC -> Ticks.uneven(this, most);
    };
  }
}
