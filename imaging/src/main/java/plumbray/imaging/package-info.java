/** Photos, what is read out of them, and how they are redrawn. */
package plumbray.imaging;
