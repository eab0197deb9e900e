package plumbray.imaging.photo;

import java.util.List;
import java.util.Optional;
import plumbray.imaging.metadata.ExifBlock;
import plumbray.imaging.metadata.Resolution;
import plumbray.imaging.metadata.XmpPacket;

/** What a file to be written is to say: the carried metadata, true of the picture as it is now. */
final class OutgoingMetadata {
  private final PhotoMetadata carried;
  private final Optional<ExifBlock> exif;
  private final Optional<byte[]> xmp;

  /**
   * What is to be said of a photo.
   *
   * @param bytesMost how long an EXIF block and an XMP packet can be in the file's format
   */
  OutgoingMetadata(Photo photo, int bytesMost) {
    this.carried = photo.metadata();
    this.exif =
        carried
            .exif()
            .map(block -> block.redrawn(photo.width(), photo.height()))
            .filter(block -> block.bytes().length <= bytesMost);
    this.xmp = xmp(photo, bytesMost);
  }

  /** The source's packet with the origin; where both together are too long, the origin alone. */
  private Optional<byte[]> xmp(Photo photo, int bytesMost) {
    Optional<XmpPacket> source = carried.xmp().flatMap(XmpPacket::read);
    source.ifPresent(packet -> packet.setRedrawn(photo.width(), photo.height()));
    return withOrigin(source)
        .filter(packet -> packet.length <= bytesMost)
        .or(() -> withOrigin(Optional.empty()).filter(packet -> packet.length <= bytesMost));
  }

  private Optional<byte[]> withOrigin(Optional<XmpPacket> source) {
    if (source.isEmpty() && carried.origin().isEmpty()) {
      return Optional.empty();
    }
    XmpPacket packet = source.orElseGet(XmpPacket::empty);
    carried.origin().ifPresent(packet::setOrigin);
    return Optional.of(packet.bytes());
  }

  Optional<byte[]> iccProfile() {
    return carried.iccProfile();
  }

  Optional<ExifBlock> exif() {
    return exif;
  }

  Optional<byte[]> xmp() {
    return xmp;
  }

  Optional<Resolution> resolution() {
    return carried.resolution();
  }

  /** What only a file of this format can carry. */
  List<FilePiece> pieces(PhotoFormat format) {
    return carried.pieces().stream().filter(piece -> piece.format() == format).toList();
  }
}
