package plumbray.cli.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.Base64;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.photo.PixelBox;
import plumbray.imaging.rectify.MaskPlane;

class RasterTest {

  private static Photo photo(PhotoShape shape, int... samples) {
    PhotoBuilder builder = new PhotoBuilder(shape);
    int i = 0;
    for (int y = 0; y < shape.heightPx(); y++) {
      for (int x = 0; x < shape.widthPx(); x++) {
        for (int c = 0; c < shape.channels(); c++) {
          builder.sample(x, y, c, samples[i++]);
        }
      }
    }
    return builder.build();
  }

  @Test
  void shrinkingTakesMeans() {
    Photo photo = photo(new PhotoShape(4, 2, 1, 8), 0, 10, 100, 200, 20, 30, 100, 0);
    Raster raster = Raster.of(photo, 2);
    assertThat(raster.height()).isEqualTo(1);
    assertThat(raster.at(0, 0)).isEqualTo(0x0f0f0f);
    assertThat(raster.at(1, 0)).isEqualTo(0x646464);
  }

  @Test
  void nothingIsEnlarged() {
    Photo photo = photo(new PhotoShape(2, 1, 3, 8), 1, 2, 3, 4, 5, 6);
    Raster raster = Raster.of(photo, 1600);
    assertThat(raster.width()).isEqualTo(2);
    assertThat(raster.at(1, 0)).isEqualTo(0x040506);
  }

  @Test
  void sixteenBitsBecomeEight() {
    Photo photo = photo(new PhotoShape(2, 1, 1, 16), 65535, 257 * 90);
    assertThat(Raster.of(photo, 2).at(0, 0)).isEqualTo(0xffffff);
    assertThat(Raster.of(photo, 2).at(1, 0)).isEqualTo(0x5a5a5a);
  }

  @Test
  void whatIsTransparentIsWhite() {
    Photo photo = photo(new PhotoShape(2, 1, 4, 8), 200, 0, 0, 0, 200, 0, 0, 255);
    assertThat(Raster.of(photo, 2).at(0, 0)).isEqualTo(0xffffff);
    assertThat(Raster.of(photo, 2).at(1, 0)).isEqualTo(0xc80000);
  }

  @Test
  void aBoxIsCutOut() {
    Photo photo = photo(new PhotoShape(3, 2, 1, 8), 1, 2, 3, 4, 5, 6);
    Raster raster = Raster.of(photo, new PixelBox(1, 1, 2, 1), 10);
    assertThat(raster.at(0, 0)).isEqualTo(0x050505);
    assertThat(raster.at(1, 0)).isEqualTo(0x060606);
  }

  @Test
  void theAddressHoldsThePicture() throws IOException {
    Photo photo = photo(new PhotoShape(2, 1, 3, 8), 1, 2, 3, 250, 5, 6);
    String address = Raster.of(photo, 2).png();
    assertThat(address).startsWith("data:image/png;base64,");
    byte[] bytes = Base64.getDecoder().decode(address.substring(address.indexOf(',') + 1));
    BufferedImage image = ImageIO.read(new ByteArrayInputStream(bytes));
    assertThat(image.getRGB(0, 0) & 0xffffff).isEqualTo(0x010203);
    assertThat(image.getRGB(1, 0) & 0xffffff).isEqualTo(0xfa0506);
  }

  @Test
  void tintsChangeWhatTheMaskSaysAndNothingElse() {
    Photo photo = photo(new PhotoShape(4, 1, 1, 8), 120, 120, 120, 120);
    byte[] codes = {
      (byte) MaskPlane.UPRIGHT,
      (byte) MaskPlane.NEVER_VISIBLE,
      (byte) MaskPlane.INVERTED,
      MaskPlane.OUTSIDE
    };
    MaskPlane mask = new MaskPlane(4, 1, codes);
    Raster tinted = MaskTint.over(Raster.of(photo, 4), mask);
    assertThat(tinted.at(0, 0)).isEqualTo(0x787878);
    assertThat(new int[] {tinted.at(1, 0), tinted.at(2, 0), tinted.at(3, 0)})
        .doesNotContain(0x787878)
        .doesNotHaveDuplicates();
    for (MaskTint tint : MaskTint.values()) {
      assertThat(tint.share(mask)).isEqualTo(0.25);
    }
  }
}
