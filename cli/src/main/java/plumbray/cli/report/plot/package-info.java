/**
 * Plots as SVG: axes with round ticks, lines, bands, points with error bars, guides and a legend.
 * Positions in a drawing are CSS pixels, x to the right and y down.
 */
package plumbray.cli.report.plot;
