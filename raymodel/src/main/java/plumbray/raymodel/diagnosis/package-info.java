/**
 * What one ray went through, and where the air is of one kind: heights felt, local bending, and
 * layers in which the index rises with height. Heights are above the local ground, distances along
 * the level surface from the camera's foot; a refraction coefficient is positive where the ray is
 * curved like the Earth.
 */
package plumbray.raymodel.diagnosis;
