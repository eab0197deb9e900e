/**
 * How good and how honest fits are: many photos are drawn of known air, each is fitted, and what
 * comes out is held against the Cramer-Rao bound and against its own standard deviations.
 */
package plumbray.honesty;
