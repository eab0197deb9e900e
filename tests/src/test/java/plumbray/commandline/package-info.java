/** The program as a shell meets it: its start script, its arguments and its exit status. */
package plumbray.commandline;
