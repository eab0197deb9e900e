package plumbray.cli.report;

import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.Base64;
import javax.imageio.IIOImage;
import javax.imageio.ImageIO;
import javax.imageio.ImageTypeSpecifier;
import javax.imageio.ImageWriteParam;
import javax.imageio.ImageWriter;
import javax.imageio.stream.ImageOutputStream;
import javax.imageio.stream.MemoryCacheImageOutputStream;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PixelBox;

/** A small opaque colour picture for a page. */
final class Raster {

  private static final float JPEG_QUALITY = 0.86f;

  private final BufferedImage image;

  private Raster(BufferedImage image) {
    this.image = image;
  }

  /** A white picture. */
  static Raster blank(int width, int height) {
    BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
    Raster raster = new Raster(image);
    for (int y = 0; y < height; y++) {
      for (int x = 0; x < width; x++) {
        raster.set(x, y, 0xffffff);
      }
    }
    return raster;
  }

  /** The whole photo, at most {@code widthMost} wide. */
  static Raster of(Photo photo, int widthMost) {
    return of(photo, new PixelBox(0, 0, photo.width(), photo.height()), widthMost);
  }

  /** A box of a photo, at most {@code widthMost} wide: means over pixels, transparent on white. */
  static Raster of(Photo photo, PixelBox box, int widthMost) {
    int width = Math.min(widthMost, box.widthPx());
    int height = Math.max(1, (int) Math.round((double) box.heightPx() * width / box.widthPx()));
    Raster raster = new Raster(new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB));
    float[] row = new float[photo.shape().rowSamples()];
    for (int y = 0; y < height; y++) {
      int from = edge(y, height, box.heightPx());
      int to = Math.max(from + 1, edge(y + 1, height, box.heightPx()));
      double[] sums = new double[3 * width];
      for (int v = from; v < to; v++) {
        photo.row(box.topPx() + v, row);
        addRow(photo, row, box, sums);
      }
      raster.setRow(y, sums, box.widthPx(), to - from);
    }
    return raster;
  }

  private static int edge(int i, int parts, int whole) {
    return (int) ((long) i * whole / parts);
  }

  private static void addRow(Photo photo, float[] row, PixelBox box, double[] sums) {
    int channels = photo.channels();
    int light = photo.shape().lightChannels();
    double scale = 255.0 / photo.shape().highestSample();
    int width = sums.length / 3;
    for (int x = 0; x < width; x++) {
      int to = edge(x + 1, width, box.widthPx());
      for (int u = edge(x, width, box.widthPx()); u < to; u++) {
        int at = (box.leftPx() + u) * channels;
        double alpha = photo.hasAlpha() ? row[at + light] * scale / 255.0 : 1.0;
        for (int c = 0; c < 3; c++) {
          double value = row[at + (light == 1 ? 0 : c)] * scale;
          sums[3 * x + c] += alpha * value + (1.0 - alpha) * 255.0;
        }
      }
    }
  }

  private void setRow(int y, double[] sums, int boxWidth, int rows) {
    int width = width();
    for (int x = 0; x < width; x++) {
      int columns = edge(x + 1, width, boxWidth) - edge(x, width, boxWidth);
      int rgb = 0;
      for (int c = 0; c < 3; c++) {
        rgb = rgb << 8 | (int) Math.rint(sums[3 * x + c] / ((double) columns * rows));
      }
      set(x, y, rgb);
    }
  }

  int width() {
    return image.getWidth();
  }

  int height() {
    return image.getHeight();
  }

  /** Red, green and blue of a pixel, eight bits each. */
  int at(int x, int y) {
    return image.getRGB(x, y) & 0xffffff;
  }

  /** Sets a pixel. */
  void set(int x, int y, int rgb) {
    image.setRGB(x, y, rgb);
  }

  /** The picture as the address of a PNG within the page. */
  String png() {
    return address("png", 0f);
  }

  /** The picture as the address of a JPEG within the page. */
  String jpeg() {
    return address("jpeg", JPEG_QUALITY);
  }

  private String address(String format, float quality) {
    ImageWriter writer =
        ImageIO.getImageWriters(ImageTypeSpecifier.createFromRenderedImage(image), format).next();
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (ImageOutputStream stream = new MemoryCacheImageOutputStream(bytes)) {
      writer.setOutput(stream);
      ImageWriteParam param = writer.getDefaultWriteParam();
      if (quality > 0f) {
        param.setCompressionMode(ImageWriteParam.MODE_EXPLICIT);
        param.setCompressionQuality(quality);
      }
      writer.write(null, new IIOImage(image, null, null), param);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    } finally {
      writer.dispose();
    }
    return "data:image/"
        + format
        + ";base64,"
        + Base64.getEncoder().encodeToString(bytes.toByteArray());
  }
}
