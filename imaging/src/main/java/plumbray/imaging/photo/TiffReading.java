package plumbray.imaging.photo;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.file.Path;
import java.util.OptionalLong;
import javax.imageio.ImageReader;
import javax.imageio.plugins.tiff.BaselineTIFFTagSet;
import javax.imageio.stream.FileImageInputStream;
import javax.imageio.stream.ImageInputStream;
import plumbray.imaging.metadata.TiffDescription;
import plumbray.imaging.metadata.TiffWalk;

/**
 * Reads TIFF files by the runtime's decoder.
 *
 * <p>That decoder refuses samples of 16 bit that are stored as differences along rows (predictor 2;
 * TIFF 6.0, section 14), as many programs write them. It is handed the file without that remark,
 * and the differences are summed up here.
 */
final class TiffReading {
  private final Path file;

  TiffReading(Path file) {
    this.file = file;
  }

  Photo read() throws IOException, UnreadableException {
    TiffFile tiff;
    try (ImageInputStream in = new FileImageInputStream(file.toFile())) {
      tiff = directory(in);
    }
    FileFacts facts = PhotoReader.checkedSize(tiff.facts());
    Photo stored;
    try (ImageInputStream in =
        tiff.needsSums() ? withoutPredictor() : new FileImageInputStream(file.toFile())) {
      stored = decode(in, facts);
    }
    if (tiff.needsSums()) {
      sumUp(stored, tiff.tileWidthPx());
    }
    return facts.orientation().upright(stored.withMetadata(described(facts.metadata())));
  }

  private static TiffFile directory(ImageInputStream in) throws IOException, UnreadableException {
    ImageReader reader = Codecs.reader(PhotoFormat.TIFF);
    try {
      reader.setInput(in, true, false);
      return TiffFile.of(reader.getImageMetadata(0), in.length());
    } finally {
      reader.dispose();
    }
  }

  private PhotoMetadata described(PhotoMetadata metadata) {
    TiffDescription description = TiffDescription.of(file);
    PhotoMetadata with = description.exif().map(metadata::withExif).orElse(metadata);
    return description.xmp().map(with::withXmp).orElse(with);
  }

  private static Photo decode(ImageInputStream in, FileFacts facts)
      throws IOException, UnreadableException {
    ImageReader reader = Codecs.reader(PhotoFormat.TIFF);
    try {
      reader.setInput(in, true, true);
      BufferedImage image = PhotoReader.undamaged(reader, reader.getDefaultReadParam());
      return RasterSamples.photo(image, facts.metadata());
    } finally {
      reader.dispose();
    }
  }

  private ImageInputStream withoutPredictor() throws IOException {
    try (ImageInputStream in = new FileImageInputStream(file.toFile())) {
      TiffWalk walk = new TiffWalk(in);
      OptionalLong value = walk.value(walk.first(), BaselineTIFFTagSet.TAG_PREDICTOR);
      boolean little = in.getByteOrder() == ByteOrder.LITTLE_ENDIAN;
      byte[] none = little ? new byte[] {1, 0} : new byte[] {0, 1};
      return new PatchedInput(file, value.orElseThrow(), none);
    }
  }

  private static void sumUp(Photo differences, int tileWidthPx) {
    short[] samples = (short[]) differences.samples();
    int row = differences.shape().rowSamples();
    int channels = differences.channels();
    for (int start = 0; start < samples.length; start += row) {
      for (int i = channels; i < row; i++) {
        boolean begins = i / channels % tileWidthPx == 0;
        samples[start + i] += begins ? 0 : samples[start + i - channels];
      }
    }
  }
}
