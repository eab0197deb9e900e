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

  OutgoingMetadata(Photo photo) {
    this.carried = photo.metadata();
    this.exif = carried.exif().map(block -> block.redrawn(photo.width(), photo.height()));
    this.xmp = xmp(photo);
  }

  private Optional<byte[]> xmp(Photo photo) {
    Optional<XmpPacket> source = carried.xmp().flatMap(XmpPacket::read);
    if (source.isEmpty() && carried.origin().isEmpty()) {
      return Optional.empty();
    }
    XmpPacket packet = source.orElseGet(XmpPacket::empty);
    packet.setRedrawn(photo.width(), photo.height());
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
