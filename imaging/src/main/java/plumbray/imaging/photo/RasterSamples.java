package plumbray.imaging.photo;

import java.awt.image.BufferedImage;
import java.awt.image.ColorModel;
import java.awt.image.ComponentSampleModel;
import java.awt.image.DataBuffer;
import java.awt.image.DataBufferByte;
import java.awt.image.DataBufferUShort;
import java.awt.image.IndexColorModel;
import java.awt.image.Raster;

/** Takes the samples of a decoded image out of its raster, untouched by colour conversion. */
final class RasterSamples {
  private RasterSamples() {}

  static Photo photo(BufferedImage image, PhotoMetadata metadata) throws UnreadableException {
    Raster raster = image.getRaster();
    if (image.getColorModel() instanceof IndexColorModel palette) {
      return PaletteExpansion.photo(raster, palette, metadata);
    }
    PhotoShape shape = shape(raster, image.getColorModel());
    Photo photo = new Photo(shape, metadata, samples(raster, shape));
    return image.getColorModel().isAlphaPremultiplied() ? Premultiplied.undone(photo) : photo;
  }

  private static PhotoShape shape(Raster raster, ColorModel colors) throws UnreadableException {
    int bands = raster.getNumBands();
    int bits = raster.getSampleModel().getSampleSize(0);
    boolean alpha = colors != null && colors.hasAlpha();
    if (bands > 4 || alpha != (bands == 2 || bands == 4)) {
      throw UnreadableException.unsupported(bands + " samples per pixel of unknown meaning");
    }
    boolean whole =
        bits == 8 && raster.getDataBuffer().getDataType() == DataBuffer.TYPE_BYTE
            || bits == 16 && raster.getDataBuffer().getDataType() == DataBuffer.TYPE_USHORT;
    for (int size : raster.getSampleModel().getSampleSize()) {
      whole &= size == bits;
    }
    if (!whole || !(raster.getSampleModel() instanceof ComponentSampleModel)) {
      throw UnreadableException.unsupported("samples of " + bits + " bit or not whole numbers");
    }
    return new PhotoShape(raster.getWidth(), raster.getHeight(), bands, bits);
  }

  /** The raster's own array where it lies as a photo's samples do, else a copy. */
  private static Object samples(Raster raster, PhotoShape shape) {
    ComponentSampleModel model = (ComponentSampleModel) raster.getSampleModel();
    if (liesAlike(raster, model, shape)) {
      DataBuffer data = raster.getDataBuffer();
      Object samples =
          data instanceof DataBufferByte bytes
              ? bytes.getData()
              : ((DataBufferUShort) data).getData();
      inOrder(samples, model.getBandOffsets());
      return samples;
    }
    Object samples = shape.bits() == 8 ? new byte[shape.samples()] : new short[shape.samples()];
    for (int c = 0; c < shape.channels(); c++) {
      copyBand(raster, model, c, samples);
    }
    return samples;
  }

  /** Whether the samples are those of the pixels and no others, perhaps in blue green red order. */
  private static boolean liesAlike(Raster raster, ComponentSampleModel model, PhotoShape shape) {
    DataBuffer data = raster.getDataBuffer();
    int[] offsets = model.getBandOffsets();
    return data.getNumBanks() == 1
        && data.getOffset() == 0
        && data.getSize() == shape.samples()
        && model.getPixelStride() == shape.channels()
        && model.getScanlineStride() == shape.rowSamples()
        && raster.getSampleModelTranslateX() == raster.getMinX()
        && raster.getSampleModelTranslateY() == raster.getMinY()
        && (isStraight(offsets) || isBlueFirst(offsets));
  }

  private static boolean isStraight(int... offsets) {
    for (int c = 0; c < offsets.length; c++) {
      if (offsets[c] != c) {
        return false;
      }
    }
    return true;
  }

  private static boolean isBlueFirst(int... offsets) {
    return offsets.length == 3 && offsets[0] == 2 && offsets[1] == 1 && offsets[2] == 0;
  }

  private static void inOrder(Object samples, int... offsets) {
    if (isStraight(offsets)) {
      return;
    }
    if (samples instanceof byte[] bytes) {
      for (int i = 0; i < bytes.length; i += 3) {
        byte blue = bytes[i];
        bytes[i] = bytes[i + 2];
        bytes[i + 2] = blue;
      }
    } else {
      short[] shorts = (short[]) samples;
      for (int i = 0; i < shorts.length; i += 3) {
        short blue = shorts[i];
        shorts[i] = shorts[i + 2];
        shorts[i + 2] = blue;
      }
    }
  }

  private static void copyBand(Raster raster, ComponentSampleModel model, int c, Object into) {
    int bank = model.getBankIndices()[c];
    int base = raster.getDataBuffer().getOffsets()[bank] + model.getBandOffsets()[c];
    int channels = raster.getNumBands();
    for (int y = 0; y < raster.getHeight(); y++) {
      int from = base + y * model.getScanlineStride();
      int to = y * raster.getWidth() * channels + c;
      if (into instanceof byte[] bytes) {
        byte[] data = ((DataBufferByte) raster.getDataBuffer()).getData(bank);
        for (int x = 0; x < raster.getWidth(); x++) {
          bytes[to + x * channels] = data[from + x * model.getPixelStride()];
        }
      } else {
        short[] data = ((DataBufferUShort) raster.getDataBuffer()).getData(bank);
        for (int x = 0; x < raster.getWidth(); x++) {
          ((short[]) into)[to + x * channels] = data[from + x * model.getPixelStride()];
        }
      }
    }
  }
}
