/**
 * What photo files say in words and numbers besides their pixels: EXIF blocks, XMP packets, the
 * container of a TIFF file. Bytes in, bytes out; nothing here knows a picture.
 */
package plumbray.imaging.metadata;
