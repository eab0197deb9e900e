/**
 * Many photos, one after the other and side by side: nothing that goes wrong with one stops the
 * others, and what is done already is not done again.
 */
package plumbray.cli.batch;
