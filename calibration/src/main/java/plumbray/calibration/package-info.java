/** What is known and what is to be estimated about one photographed sight line. */
package plumbray.calibration;
