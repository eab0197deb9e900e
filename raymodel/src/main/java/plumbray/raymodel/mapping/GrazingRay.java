package plumbray.raymodel.mapping;

/**
 * A ray that just clears what blocks rays: where an image ends and the ground in front of it
 * begins.
 *
 * <p>Its lowest clearance c over the ground is zero, at a place where the ray turns, at a bend of
 * the ground or at the target, so that a small change of the place does not matter and c varies as
 * the elevation y does there: with dc = y_a da + sum y_q dq - db = 0, b the height under which rays
 * are stopped, the direction varies by da/dq = -y_q / y_a and da/db = 1 / y_a.
 *
 * @param apparentRad apparent elevation, rad
 * @param atM distance at which it grazes, m
 * @param byQuantity derivatives of the apparent elevation: 0 by the camera's height (rad/m), 1 and
 *     on by the medium's parameters
 * @param byBlockedHeight derivative by the height under which rays are stopped, rad/m
 */
public record GrazingRay(
    double apparentRad, double atM, double[] byQuantity, double byBlockedHeight) {}
