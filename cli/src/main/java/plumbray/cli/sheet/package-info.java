/**
 * Staffs drawn in true scale. All lengths on paper are in millimetres, y upwards from the lower
 * edge of a sheet, x from its left edge; heights along the staff are in millimetres above its foot.
 */
package plumbray.cli.sheet;
