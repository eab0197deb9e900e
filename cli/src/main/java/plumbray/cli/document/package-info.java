/**
 * Every file format of the program: what is read is checked and turned into SI units and radians
 * here, once, and what is written is turned back. No other package knows JSON or CSV.
 */
package plumbray.cli.document;
