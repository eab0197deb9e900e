package plumbray.published;

import java.util.function.DoubleSupplier;

/**
 * One number from outside and the program's own.
 *
 * @param topic what it is about, a few words
 * @param what the case
 * @param unit unit of the numbers, empty for plain ones
 * @param published the number from outside
 * @param tolerance largest difference allowed, in the same unit
 * @param source where the number comes from
 * @param ours computes the program's number
 */
record PublishedCheck(
    String topic,
    String what,
    String unit,
    double published,
    double tolerance,
    Source source,
    DoubleSupplier ours) {

  /** How a number came here. */
  enum Kind {
    /** Read in a printed or published copy. */
    PRINT("print"),
    /** Remembered from print, not looked up again. */
    MEMORY("memory"),
    /** Computed from the stated equation by a program that shares no code with this one. */
    COMPUTED("computed"),
    /** What the trade commonly uses; no source. */
    PRACTICE("common practice");

    private final String words;

    Kind(String words) {
      this.words = words;
    }

    String words() {
      return words;
    }
  }

  /** A citation and how its number came here. */
  record Source(String citation, Kind kind) {}

  @Override
  public String toString() {
    return topic + ": " + what;
  }
}
