/**
 * The ray equation and its integration. Distances run along the level surface from the foot of the
 * camera, elevations above the level surface through that foot; slopes are positive upwards.
 *
 * <p>In the coordinates X = R phi and u = R ln(1 + y/R) a spherical atmosphere is a flat one of
 * index m = n (1 + y/R), exactly. There a ray obeys Q'' = grad(m^2)/2 with respect to sigma, d
 * sigma = (path)/m: a second-order equation free of first derivatives, which Nystrom methods
 * integrate with the fewest evaluations.
 */
package plumbray.raymodel.ray;
