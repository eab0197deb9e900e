/**
 * Between pixels and directions.
 *
 * <p>Pixel: u to the right, v down, the centre of the top-left pixel is (0, 0). Camera frame: x
 * right, y down, z forward, x and y in units of the focal length. Directions: apparent elevation
 * above the horizontal of the camera's place, positive upwards; azimuth from the vertical plane of
 * the optical axis, positive to the right. Pitch is positive when the axis points above the
 * horizontal; with a positive roll the camera is turned so that the right-hand side of the picture
 * looks lower. Angles in radians.
 */
package plumbray.calibration.camera;
