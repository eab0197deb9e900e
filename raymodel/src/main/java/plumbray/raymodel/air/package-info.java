/**
 * The air: refractive index after Ciddor (1996), vapour pressure, hydrostatics, and the column of
 * air over a point. Heights in metres above the local ground, upwards; temperatures in kelvin,
 * pressures in pascal.
 */
package plumbray.raymodel.air;
