/**
 * Nonlinear least squares with Gaussian priors, bounds and a robust loss, and what the data say
 * about the parameters: covariance, correlation, and the combinations that stay undetermined.
 *
 * <p>Residuals are observed minus predicted or the reverse, as the observation likes, divided by
 * their standard deviations. Parameters carry the units of their owners.
 */
package plumbray.calibration.estimate;
