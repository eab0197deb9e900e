/** Checks that cross rooms. */
package plumbray;
