package plumbray.imaging.photo;

import java.util.Optional;

/**
 * What a file's own headers say, found before any pixel is decoded.
 *
 * @param widthPx stored width
 * @param heightPx stored height
 * @param orientation how stored pixels lie in the picture
 * @param iccProfile embedded colour profile
 */
record FileFacts(int widthPx, int heightPx, Orientation orientation, Optional<byte[]> iccProfile) {

  PhotoMetadata metadata() {
    return iccProfile.map(PhotoMetadata.none()::withIccProfile).orElse(PhotoMetadata.none());
  }
}
