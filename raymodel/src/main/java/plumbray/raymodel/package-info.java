/** Air, sight line and rays, as pure physics on doubles: no files, no images, no terminal. */
package plumbray.raymodel;
