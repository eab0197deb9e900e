package plumbray.imaging.fit;

/**
 * What a fit left unexplained.
 *
 * @param count how many rows of edges or points were observed
 * @param rmsPx their root mean square, px
 * @param chiSquare sum of squares in units of their standard deviations, with correlations
 * @param degreesOfFreedom observations and priors less estimates
 */
public record Residuals(int count, double rmsPx, double chiSquare, int degreesOfFreedom) {}
