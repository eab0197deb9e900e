package plumbray.imaging.photo;

import java.awt.image.IndexColorModel;
import java.awt.image.Raster;

/** Writes the colours of a palette out in full: grey where the palette is, with alpha if it has. */
final class PaletteExpansion {
  private PaletteExpansion() {}

  static Photo photo(Raster raster, IndexColorModel palette, PhotoMetadata metadata) {
    int lightChannels = isGrey(palette) ? 1 : 3;
    int channels = lightChannels + (palette.hasAlpha() ? 1 : 0);
    PhotoShape shape = new PhotoShape(raster.getWidth(), raster.getHeight(), channels, 8);
    byte[][] table = table(palette, lightChannels, channels);
    byte[] samples = new byte[shape.samples()];
    int[] row = new int[shape.widthPx()];
    int next = 0;
    for (int y = 0; y < shape.heightPx(); y++) {
      raster.getSamples(raster.getMinX(), raster.getMinY() + y, row.length, 1, 0, row);
      for (int index : row) {
        for (int c = 0; c < channels; c++) {
          samples[next++] = index < palette.getMapSize() ? table[c][index] : 0;
        }
      }
    }
    return new Photo(shape, metadata, samples);
  }

  private static byte[][] table(IndexColorModel palette, int lightChannels, int channels) {
    byte[][] table = new byte[channels][palette.getMapSize()];
    palette.getReds(table[0]);
    if (lightChannels == 3) {
      palette.getGreens(table[1]);
      palette.getBlues(table[2]);
    }
    if (channels > lightChannels) {
      palette.getAlphas(table[lightChannels]);
    }
    return table;
  }

  private static boolean isGrey(IndexColorModel palette) {
    for (int i = 0; i < palette.getMapSize(); i++) {
      if (palette.getRed(i) != palette.getGreen(i) || palette.getRed(i) != palette.getBlue(i)) {
        return false;
      }
    }
    return true;
  }
}
