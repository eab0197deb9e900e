/**
 * Redrawing a photo as rays of constant refraction (or straight ones) would have shown it.
 *
 * <p>Every output pixel has a true direction, that of the same camera; what lies in that direction
 * at its region's distance is looked up in the photo where the bent rays show it. Elevations are
 * apparent angles at the camera, rad, positive upwards: the <em>true</em> one belongs to the ray of
 * constant refraction coefficient, the <em>apparent</em> one to the ray through the real air.
 * Pixels are (u, v), the centre of the top-left one is (0, 0), v runs down.
 */
package plumbray.imaging.rectify;
