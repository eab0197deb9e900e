package plumbray.imaging.photo;

import java.awt.Transparency;
import java.awt.color.ColorSpace;
import java.awt.image.BufferedImage;
import java.awt.image.ColorModel;
import java.awt.image.ComponentColorModel;
import java.awt.image.DataBuffer;
import java.awt.image.DataBufferByte;
import java.awt.image.DataBufferUShort;
import java.awt.image.Raster;
import java.awt.image.WritableRaster;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.imageio.IIOImage;
import javax.imageio.ImageTypeSpecifier;
import javax.imageio.ImageWriteParam;
import javax.imageio.ImageWriter;
import javax.imageio.metadata.IIOMetadata;
import javax.imageio.metadata.IIOMetadataNode;
import javax.imageio.plugins.tiff.BaselineTIFFTagSet;
import javax.imageio.plugins.tiff.TIFFDirectory;
import javax.imageio.plugins.tiff.TIFFField;
import javax.imageio.plugins.tiff.TIFFTag;
import javax.imageio.stream.FileImageOutputStream;
import javax.imageio.stream.ImageOutputStream;
import javax.imageio.stream.MemoryCacheImageOutputStream;

/** Encodes a photo's samples, untouched, with its colour profile. */
final class PhotoEncoder {
  static final float JPEG_QUALITY = 0.97f;

  /** Rows written at a time in a TIFF file: few seeks, and little to unpack for a few rows. */
  private static final int TIFF_STRIP_ROWS = 64;

  private final Photo photo;
  private final BufferedImage image;

  private final float jpegQuality;

  private PhotoEncoder(Photo photo, float jpegQuality) {
    this.photo = photo;
    this.jpegQuality = jpegQuality;
    this.image = image(photo);
  }

  /** Writes the file anew. */
  static void encode(Photo photo, PhotoFormat format, float jpegQuality, Path file)
      throws IOException {
    PhotoEncoder encoder = new PhotoEncoder(photo, jpegQuality);
    if (format == PhotoFormat.JPEG) {
      Files.write(file, encoder.jpeg());
      return;
    }
    try (ImageOutputStream out = new FileImageOutputStream(file.toFile())) {
      encoder.write(format, out);
    }
  }

  private byte[] jpeg() throws IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (ImageOutputStream out = new MemoryCacheImageOutputStream(bytes)) {
      write(PhotoFormat.JPEG, out);
    }
    byte[] profile = photo.metadata().iccProfile().orElse(null);
    try {
      return profile == null
          ? bytes.toByteArray()
          : JpegFile.withProfile(bytes.toByteArray(), profile);
    } catch (UnreadableException e) {
      throw new IOException("the runtime's own JPEG cannot be taken apart", e);
    }
  }

  private void write(PhotoFormat format, ImageOutputStream out) throws IOException {
    ImageWriter writer = Codecs.writer(format);
    try {
      writer.setOutput(out);
      ImageWriteParam param = writer.getDefaultWriteParam();
      if (format == PhotoFormat.JPEG) {
        param.setCompressionMode(ImageWriteParam.MODE_EXPLICIT);
        param.setCompressionQuality(jpegQuality);
      }
      writer.write(null, new IIOImage(image, null, metadata(format, writer, param)), param);
    } finally {
      writer.dispose();
    }
  }

  private IIOMetadata metadata(PhotoFormat format, ImageWriter writer, ImageWriteParam param)
      throws IOException {
    IIOMetadata metadata =
        writer.getDefaultImageMetadata(ImageTypeSpecifier.createFromRenderedImage(image), param);
    return switch (format) {
      case JPEG -> metadata;
      case PNG -> withPngProfile(metadata);
      case TIFF -> withTiffFields(metadata);
    };
  }

  private IIOMetadata withPngProfile(IIOMetadata metadata) throws IOException {
    byte[] profile = photo.metadata().iccProfile().orElse(null);
    if (profile != null) {
      IIOMetadataNode chunk = new IIOMetadataNode("iCCP");
      chunk.setAttribute("profileName", "ICC profile");
      chunk.setAttribute("compressionMethod", "deflate");
      chunk.setUserObject(PngFile.packedProfile(profile));
      IIOMetadataNode root = new IIOMetadataNode(metadata.getNativeMetadataFormatName());
      root.appendChild(chunk);
      metadata.mergeTree(metadata.getNativeMetadataFormatName(), root);
    }
    return metadata;
  }

  private IIOMetadata withTiffFields(IIOMetadata metadata) throws IOException {
    TIFFDirectory directory = TIFFDirectory.createFromMetadata(metadata);
    BaselineTIFFTagSet tags = BaselineTIFFTagSet.getInstance();
    directory.addTIFFField(
        new TIFFField(
            tags.getTag(BaselineTIFFTagSet.TAG_ROWS_PER_STRIP),
            TIFFTag.TIFF_LONG,
            1,
            new long[] {TIFF_STRIP_ROWS}));
    photo
        .metadata()
        .iccProfile()
        .ifPresent(
            profile ->
                directory.addTIFFField(
                    new TIFFField(
                        tags.getTag(BaselineTIFFTagSet.TAG_ICC_PROFILE),
                        TIFFTag.TIFF_UNDEFINED,
                        profile.length,
                        profile)));
    return directory.getAsMetadata();
  }

  /**
   * The samples in the runtime's clothes. The colour space is a label only: no encoder used here
   * converts from the standard grey and sRGB ones.
   */
  private static BufferedImage image(Photo photo) {
    PhotoShape shape = photo.shape();
    boolean grey = shape.lightChannels() == 1;
    int type = shape.bits() == 8 ? DataBuffer.TYPE_BYTE : DataBuffer.TYPE_USHORT;
    ColorModel colors =
        new ComponentColorModel(
            ColorSpace.getInstance(grey ? ColorSpace.CS_GRAY : ColorSpace.CS_sRGB),
            shape.hasAlpha(),
            false,
            shape.hasAlpha() ? Transparency.TRANSLUCENT : Transparency.OPAQUE,
            type);
    DataBuffer samples =
        photo.samples() instanceof byte[] bytes
            ? new DataBufferByte(bytes, bytes.length)
            : new DataBufferUShort((short[]) photo.samples(), shape.samples());
    int[] offsets = new int[shape.channels()];
    for (int c = 0; c < offsets.length; c++) {
      offsets[c] = c;
    }
    WritableRaster raster =
        Raster.createInterleavedRaster(
            samples,
            shape.widthPx(),
            shape.heightPx(),
            shape.rowSamples(),
            shape.channels(),
            offsets,
            null);
    return new BufferedImage(colors, raster, false, null);
  }
}
