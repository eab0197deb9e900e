/**
 * What the light of a sight went through on its way, for the heights that matter at its distances:
 * single rays of the physics in {@code plumbray.raymodel.diagnosis}, found by what they show.
 */
package plumbray.imaging.diagnosis;
