package plumbray.imaging.fit;

/**
 * A reason not to trust a fit blindly.
 *
 * @param code a short name that does not change
 * @param message the reason in words
 */
public record Warning(String code, String message) {}
