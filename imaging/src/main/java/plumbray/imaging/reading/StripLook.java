package plumbray.imaging.reading;

/**
 * A strip as a sight predicts it.
 *
 * @param used indices of the strip's values that are predicted
 * @param predicted their brightness, linear light
 * @param contrast brightness of bright bars less that of dark ones
 */
public record StripLook(int[] used, double[] predicted, double contrast) {}
