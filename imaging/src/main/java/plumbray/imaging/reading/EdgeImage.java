package plumbray.imaging.reading;

import plumbray.raymodel.mapping.Sense;

/**
 * One edge of a staff in one image.
 *
 * @param edge index of the edge
 * @param heightM its height above the staff's foot, m
 * @param image number of the image, counted downwards
 * @param sense which way up the image is
 * @param row row predicted, px
 * @param step 1 where it is brighter below the row, -1 where it is darker, 0 where that is not
 *     known
 * @param slopeShare how fast the elevation changes with the angle, as a share of what it would
 *     without bending; small near the vanishing line
 */
public record EdgeImage(
    int edge, double heightM, int image, Sense sense, double row, int step, double slopeShare) {}
