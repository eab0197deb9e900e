/** Text of web pages: elements that are always closed, text that is always escaped, numbers. */
package plumbray.cli.report.markup;
