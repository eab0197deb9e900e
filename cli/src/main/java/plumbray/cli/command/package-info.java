/**
 * What can be typed after {@code plumbray}. A command reads its arguments, calls the worker that
 * does the job, and says shortly what came of it. It throws {@link
 * plumbray.cli.document.InputException} for what its user can mend.
 */
package plumbray.cli.command;
