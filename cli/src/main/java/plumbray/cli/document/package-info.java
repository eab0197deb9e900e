/**
 * Every file the program reads or writes in JSON or CSV.
 *
 * <p>Reading is strict: an unknown key, a missing one, a wrong type, a number that is not finite or
 * out of range, each is an {@link plumbray.cli.document.InputException} whose one line names the
 * file, the place, what was found and what is allowed. Units are converted here, once: the files
 * carry the units their keys name, everything below carries SI and radians. Pixels have u to the
 * right, v down, and the centre of the top-left pixel at (0, 0). Numbers are written without regard
 * to the locale, and no clock is read.
 */
package plumbray.cli.document;
