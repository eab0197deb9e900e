/** The program: the only room that prints, exits or knows a terminal. */
package plumbray.cli;
