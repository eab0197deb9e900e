/**
 * Quantities that are held, estimated with a prior, or estimated freely, and the parameters that an
 * estimation makes of them. Each number is in the unit that its owner names.
 */
package plumbray.calibration.quantity;
