package plumbray.cli.document;

/**
 * The units that the files' keys name, and the way from each to SI and back.
 *
 * <p>{@code si = (value + offset) * numerator / denominator}. Whole numbers above and below keep
 * the conversion correctly rounded (5.5 um is 5.5 / 1 000 000 m, not 5.5 times a rounded 1e-6).
 */
enum Unit {
  /** Metres. */
  METRE("m", 0.0, 1.0),
  /** Millimetres. */
  MILLIMETRE("mm", 0.0, 1e3),
  /** Micrometres. */
  MICROMETRE("um", 0.0, 1e6),
  /** Nanometres. */
  NANOMETRE("nm", 0.0, 1e9),
  /** Milliradians. */
  MILLIRADIAN("mrad", 0.0, 1e3),
  /** Degrees Celsius; kelvin in SI. */
  CELSIUS("C", 273.15, 1.0),
  /** Kelvin, of differences. */
  KELVIN("K", 0.0, 1.0),
  /** Kelvin per metre. */
  KELVIN_PER_METRE("K/m", 0.0, 1.0),
  /** Hectopascals. */
  HECTOPASCAL("hPa", 0.0, 0.01),
  /** Per cent; a fraction of one in SI. */
  PERCENT("%", 0.0, 100.0),
  /** Parts per million, kept as they are. */
  PPM("ppm", 0.0, 1.0),
  /** Pixels. */
  PIXEL("px", 0.0, 1.0),
  /** No unit. */
  NONE("", 0.0, 1.0);

  private static final int FEWEST_DIGITS = 5;
  private static final int MOST_DIGITS = 17;

  private final String symbol;
  private final double offset;
  private final double perSi;

  Unit(String symbol, double offset, double perSi) {
    this.symbol = symbol;
    this.offset = offset;
    this.perSi = perSi;
  }

  /** The symbol, empty where there is none. */
  String symbol() {
    return symbol;
  }

  /** The unit that a symbol means, {@link #NONE} for a symbol that no file's key names. */
  static Unit ofSymbol(String symbol) {
    for (Unit unit : values()) {
      if (unit.symbol.equals(symbol)) {
        return unit;
      }
    }
    return NONE;
  }

  /** A value of this unit in SI. */
  double toSi(double value) {
    return spanToSi(value + offset);
  }

  /** A difference, or a sigma, of this unit in SI. */
  double spanToSi(double span) {
    return perSi < 1.0 ? span * Math.rint(1.0 / perSi) : span / perSi;
  }

  /**
   * The shortest decimal in this unit that {@link #toSi} takes back to the SI value, the nearest
   * one where none does so to the last bit.
   */
  double fromSi(double si) {
    double exact = spanFromSi(si) - offset;
    for (int digits = FEWEST_DIGITS; digits <= MOST_DIGITS; digits++) {
      double candidate = Numbers.rounded(exact, digits);
      if (toSi(candidate) == si) {
        return candidate;
      }
    }
    return exact;
  }

  /** A difference, or a sigma, of SI in this unit. */
  double spanFromSi(double span) {
    return perSi < 1.0 ? span / Math.rint(1.0 / perSi) : span * perSi;
  }

  /** A value with the symbol behind it, as messages show it. */
  String show(double value) {
    String number = Numbers.shortest(value);
    return symbol.isEmpty() ? number : number + " " + symbol;
  }
}
