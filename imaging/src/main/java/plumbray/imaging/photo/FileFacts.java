package plumbray.imaging.photo;

/**
 * What a file's own headers say, found before any pixel is decoded.
 *
 * @param widthPx stored width
 * @param heightPx stored height
 * @param bytesPerPixel bytes of a decoded pixel
 * @param filled whether as many pixels can come out of as many stored bytes
 * @param orientation how stored pixels lie in the picture
 * @param metadata what is carried
 */
record FileFacts(
    int widthPx,
    int heightPx,
    int bytesPerPixel,
    boolean filled,
    Orientation orientation,
    PhotoMetadata metadata) {}
