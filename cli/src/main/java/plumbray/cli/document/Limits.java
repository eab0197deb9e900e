package plumbray.cli.document;

/**
 * What a number in a file may be.
 *
 * @param what what the number is, in plain words, for messages
 * @param unit the unit its key names
 * @param lowest the lowest value allowed, in that unit
 * @param highest the highest value allowed, in that unit
 */
record Limits(String what, Unit unit, double lowest, double highest) {
  Limits {
    if (!(lowest < highest)) {
      throw new IllegalArgumentException(
          "lowest is " + lowest + ", must be below highest, " + highest + " (" + what + ")");
    }
  }

  boolean hold(double value) {
    return value >= lowest && value <= highest;
  }

  /** The range as messages say it. */
  String range() {
    return Numbers.shortest(lowest) + " to " + unit.show(highest);
  }
}
