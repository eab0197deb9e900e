/**
 * Families of temperature against height above the local ground. Heights in metres, upwards;
 * temperatures in kelvin.
 */
package plumbray.raymodel.profile;
