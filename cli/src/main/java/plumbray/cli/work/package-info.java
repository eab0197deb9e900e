/**
 * The jobs behind the commands: each takes what was read, computes, and writes its files into a
 * folder. Nothing here prints.
 */
package plumbray.cli.work;
