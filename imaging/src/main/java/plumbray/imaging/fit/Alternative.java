package plumbray.imaging.fit;

import plumbray.raymodel.profile.ProfileFamily;

/**
 * One family that was tried.
 *
 * @param family the family
 * @param informationCriterion Schwarz's criterion; the smallest is preferred
 * @param rmsPx root mean square of the residuals, px
 * @param status verdict on the family's own fit
 */
public record Alternative(
    ProfileFamily family, double informationCriterion, double rmsPx, FitStatus status) {}
