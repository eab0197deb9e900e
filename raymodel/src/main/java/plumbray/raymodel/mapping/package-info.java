/**
 * What a camera sees at a distance: apparent elevation (rad, positive up) against elevation (m
 * above the level surface through the camera's foot), cut into branches that rise or fall
 * throughout.
 */
package plumbray.raymodel.mapping;
