/**
 * The ground under a sight line. Distances run along the level surface from the foot of the camera;
 * elevations are above the level surface through that foot.
 */
package plumbray.raymodel.path;
