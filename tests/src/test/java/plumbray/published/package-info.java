/**
 * The program against numbers from outside: printed tables, formulas as the trade states them, and
 * closed solutions. Each number carries its source; {@link plumbray.published.PublishedTable}
 * prints them all beside the program's own.
 */
package plumbray.published;
