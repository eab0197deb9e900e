/**
 * Whole jobs on photos that were drawn: fitted, redrawn and read, against what they were drawn
 * from.
 */
package plumbray.wholejob;
