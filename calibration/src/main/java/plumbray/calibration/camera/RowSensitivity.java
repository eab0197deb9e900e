package plumbray.calibration.camera;

/**
 * The row in which a direction is seen, and how it moves with the direction and the camera.
 *
 * @param v row, px
 * @param dvdElevation change of the row with the elevation at fixed azimuth, px/rad; negative for
 *     an upright camera
 * @param dvdPitch change of the row with the camera's pitch, px/rad
 * @param dvdRoll change of the row with the camera's roll, px/rad
 * @param dvdFocalPx change of the row with the focal length, px per px
 */
public record RowSensitivity(
    double v, double dvdElevation, double dvdPitch, double dvdRoll, double dvdFocalPx) {}
