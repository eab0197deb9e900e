package plumbray.imaging.photo;

import java.util.Arrays;
import java.util.Optional;

/**
 * What a photo file says besides its pixels and is carried from file to file.
 *
 * <p>A stored orientation is not part of it: it is undone on reading, so repeating it would turn
 * the picture twice.
 */
public final class PhotoMetadata {
  private static final PhotoMetadata NONE = new PhotoMetadata(null);

  private final byte[] iccProfile;

  private PhotoMetadata(byte[] iccProfile) {
    this.iccProfile = iccProfile;
  }

  /** No metadata: samples are sRGB-encoded. */
  public static PhotoMetadata none() {
    return NONE;
  }

  /** The same with this ICC colour profile, the bytes of a whole profile. */
  public PhotoMetadata withIccProfile(byte[] profile) {
    return new PhotoMetadata(profile.clone());
  }

  /** The embedded ICC colour profile. */
  public Optional<byte[]> iccProfile() {
    return Optional.ofNullable(iccProfile).map(byte[]::clone);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof PhotoMetadata that && Arrays.equals(iccProfile, that.iccProfile);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(iccProfile);
  }
}
