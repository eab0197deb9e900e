/**
 * One camera, one line of sight, one state of the air, and what is known about the things in the
 * picture, as an immutable value; and the vector of what is to be estimated of it.
 *
 * <p>SI units and radians throughout. Heights count from the local ground upwards, distances along
 * the level surface from the foot of the camera.
 */
package plumbray.calibration.sight;
