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

/**
 * Samples in the clothes of the Java runtime's codecs, not copied. The colour space is a label
 * only: no codec used here converts from or to the standard grey and sRGB ones.
 */
final class ImageView {
  private ImageView() {}

  /**
   * An image whose samples are those of the array.
   *
   * @param shape size and kind
   * @param samples bytes for 8 bit, shorts for 16, interleaved in the order of channels
   */
  static BufferedImage of(PhotoShape shape, Object samples) {
    boolean grey = shape.lightChannels() == 1;
    int type = shape.bits() == 8 ? DataBuffer.TYPE_BYTE : DataBuffer.TYPE_USHORT;
    ColorModel colors =
        new ComponentColorModel(
            ColorSpace.getInstance(grey ? ColorSpace.CS_GRAY : ColorSpace.CS_sRGB),
            shape.hasAlpha(),
            false,
            shape.hasAlpha() ? Transparency.TRANSLUCENT : Transparency.OPAQUE,
            type);
    DataBuffer data =
        samples instanceof byte[] bytes
            ? new DataBufferByte(bytes, bytes.length)
            : new DataBufferUShort((short[]) samples, shape.samples());
    return new BufferedImage(colors, raster(shape, data), false, null);
  }

  private static WritableRaster raster(PhotoShape shape, DataBuffer data) {
    int[] offsets = new int[shape.channels()];
    for (int c = 0; c < offsets.length; c++) {
      offsets[c] = c;
    }
    return Raster.createInterleavedRaster(
        data,
        shape.widthPx(),
        shape.heightPx(),
        shape.rowSamples(),
        shape.channels(),
        offsets,
        null);
  }
}
