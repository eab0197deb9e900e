package plumbray.cli.report.plot;

/** How values spread over an axis. */
public enum AxisKind {
  /** Evenly. */
  LINEAR,
  /** Evenly, with whole numbers marked only. */
  COUNT,
  /** By the square root of the size, with its sign: small values get more room. */
  SQUARE_ROOT,
  /** By the logarithm. */
  LOGARITHMIC;

  /** The quantity in which the axis is even. */
  double warp(double value) {
    return switch (this) {
      case LINEAR, COUNT -> value;
      case SQUARE_ROOT -> Math.copySign(Math.sqrt(Math.abs(value)), value);
      case LOGARITHMIC -> Math.log10(value);
    };
  }
}
