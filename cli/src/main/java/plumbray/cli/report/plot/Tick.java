package plumbray.cli.report.plot;

/**
 * A marked value of an axis.
 *
 * @param value the value
 * @param label what is written beside it
 */
public record Tick(double value, String label) {}
