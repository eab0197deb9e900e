/**
 * Pages for readers: one a photo, one a planned sight, one a batch. Each is one file that needs no
 * other, no script and no network; the same input gives the same page.
 */
package plumbray.cli.report;
