package plumbray.imaging.photo;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import plumbray.imaging.metadata.ExifBlock;
import plumbray.imaging.metadata.PhotoOrigin;
import plumbray.imaging.metadata.Resolution;
import plumbray.imaging.metadata.XmpPacket;

/**
 * What a photo file says besides its pixels and is carried from file to file. Immutable.
 *
 * <p>A stored orientation is undone on reading; on writing the blocks that named it say that the
 * picture is as it is to be looked at, so that nobody turns it twice.
 */
public final class PhotoMetadata {
  private static final PhotoMetadata NONE =
      new PhotoMetadata(
          new Parts(null, null, null, null, List.of(), Optional.empty(), FileCoding.unknown()));

  private static final int XMP_BYTES_MOST = 56_000;

  private final Parts parts;

  private PhotoMetadata(Parts parts) {
    this.parts = parts;
  }

  /**
   * What there is, null where there is nothing.
   *
   * @param pieces what only a file of the same format can carry
   * @param coding how the pixels were stored; no part of what the file says
   */
  private record Parts(
      byte[] iccProfile,
      ExifBlock exif,
      byte[] xmp,
      Resolution resolution,
      List<FilePiece> pieces,
      Optional<PhotoOrigin> origin,
      FileCoding coding) {}

  /** No metadata: samples are sRGB-encoded. */
  public static PhotoMetadata none() {
    return NONE;
  }

  /** The same with this ICC colour profile, the bytes of a whole profile. */
  public PhotoMetadata withIccProfile(byte[] profile) {
    return new PhotoMetadata(
        new Parts(
            profile.clone(),
            parts.exif,
            parts.xmp,
            parts.resolution,
            parts.pieces,
            parts.origin,
            parts.coding));
  }

  /** The same with this EXIF block, with or without its name in front. */
  public PhotoMetadata withExif(byte[] block) {
    return withExif(ExifBlock.of(block).orElse(null));
  }

  PhotoMetadata withExif(ExifBlock block) {
    return new PhotoMetadata(
        new Parts(
            parts.iccProfile,
            block,
            parts.xmp,
            parts.resolution,
            parts.pieces,
            parts.origin,
            parts.coding));
  }

  /** The same with this XMP packet. */
  public PhotoMetadata withXmp(byte[] packet) {
    return new PhotoMetadata(
        new Parts(
            parts.iccProfile,
            parts.exif,
            packet.clone(),
            parts.resolution,
            parts.pieces,
            parts.origin,
            parts.coding));
  }

  /** The same with this resolution. */
  public PhotoMetadata withResolution(Resolution resolution) {
    return new PhotoMetadata(
        new Parts(
            parts.iccProfile,
            parts.exif,
            parts.xmp,
            resolution,
            parts.pieces,
            parts.origin,
            parts.coding));
  }

  /** The same with this origin, which goes into the XMP of the file that is written. */
  public PhotoMetadata withOrigin(PhotoOrigin origin) {
    return new PhotoMetadata(
        new Parts(
            parts.iccProfile,
            parts.exif,
            parts.xmp,
            parts.resolution,
            parts.pieces,
            Optional.of(origin),
            parts.coding));
  }

  PhotoMetadata withPieces(List<FilePiece> pieces) {
    return new PhotoMetadata(
        new Parts(
            parts.iccProfile,
            parts.exif,
            parts.xmp,
            parts.resolution,
            List.copyOf(pieces),
            parts.origin,
            parts.coding));
  }

  PhotoMetadata withCoding(FileCoding coding) {
    return new PhotoMetadata(
        new Parts(
            parts.iccProfile,
            parts.exif,
            parts.xmp,
            parts.resolution,
            parts.pieces,
            parts.origin,
            coding));
  }

  /** The embedded ICC colour profile. */
  public Optional<byte[]> iccProfile() {
    return Optional.ofNullable(parts.iccProfile).map(byte[]::clone);
  }

  /** The EXIF block as it was read. */
  public Optional<ExifBlock> exif() {
    return Optional.ofNullable(parts.exif);
  }

  /** The XMP packet as it was read. */
  public Optional<byte[]> xmp() {
    return Optional.ofNullable(parts.xmp).map(byte[]::clone);
  }

  /** How large the picture is meant to be shown. */
  public Optional<Resolution> resolution() {
    return Optional.ofNullable(parts.resolution);
  }

  /** Where the picture comes from, for the file that is to be written. */
  public Optional<PhotoOrigin> origin() {
    return parts.origin;
  }

  /** What cannot be carried into another file, a line each. */
  public List<String> complaints() {
    if (parts.xmp == null) {
      return List.of();
    }
    if (XmpPacket.read(parts.xmp).isEmpty()) {
      return List.of("its XMP is not well-formed and is left out");
    }
    // only a JPEG has this limit, and leaves room for some pages of ours
    boolean full = parts.coding.jpeg().isPresent() && parts.xmp.length > XMP_BYTES_MOST;
    return full ? List.of("its XMP leaves no room for more and may be left out") : List.of();
  }

  List<FilePiece> pieces() {
    return parts.pieces;
  }

  FileCoding coding() {
    return parts.coding;
  }

  /** Equal in all that the file says; how its pixels were stored is no part of it. */
  @Override
  public boolean equals(Object other) {
    return other instanceof PhotoMetadata that
        && Arrays.equals(parts.iccProfile, that.parts.iccProfile)
        && exif().equals(that.exif())
        && Arrays.equals(parts.xmp, that.parts.xmp)
        && resolution().equals(that.resolution())
        && parts.pieces.equals(that.parts.pieces)
        && parts.origin.equals(that.parts.origin);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(parts.iccProfile) + 31 * Arrays.hashCode(parts.xmp);
  }
}
