package plumbray.imaging.photo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import plumbray.imaging.light.SampleProfiles;

class PhotoTest {
  /** Single precision of numbers up to one. */
  private static final float FLOAT_STEP = 1e-6f;

  @Test
  void samplesAreDecodedToLinearLight() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(4, 1, 1, 8));
    builder.sample(1, 0, 0, 255).sample(2, 0, 0, 10).sample(3, 0, 0, 128);
    GreyPlane plane = builder.build().linearLuminance();
    assertThat(plane.at(0, 0)).isZero();
    assertThat(plane.at(1, 0)).isEqualTo(1f);
    // IEC 61966-2-1, straight part: 10 / 255 / 12.92
    assertThat(plane.at(2, 0)).isCloseTo(0.0030353f, within(FLOAT_STEP));
    // IEC 61966-2-1, curved part, worked by hand: ((128/255 + 0.055) / 1.055)^2.4 = 0.215861
    assertThat(plane.at(3, 0)).isCloseTo(0.215861f, within(FLOAT_STEP));
  }

  @Test
  void bothDepthsGiveTheSameLight() {
    for (int value = 0; value < 256; value++) {
      Photo eight = new PhotoBuilder(new PhotoShape(1, 1, 1, 8)).sample(0, 0, 0, value).build();
      Photo sixteen =
          new PhotoBuilder(new PhotoShape(1, 1, 1, 16)).sample(0, 0, 0, value * 257).build();
      assertThat(sixteen.linearLuminance().at(0, 0))
          .isCloseTo(eight.linearLuminance().at(0, 0), within(FLOAT_STEP));
    }
  }

  @Test
  void coloursWeighAsRec709Says() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(3, 2, 4, 8));
    for (int c = 0; c < 3; c++) {
      builder.sample(c, 1, c, 255);
    }
    GreyPlane plane = builder.build().linearLuminance(new PixelBox(0, 1, 3, 1));
    // Rec. ITU-R BT.709-6, item 3.2
    assertThat(plane.values()).containsExactly(0.2126f, 0.7152f, 0.0722f);
  }

  @Test
  void anEmbeddedProfileSaysWhatLightIs() {
    for (int bits : new int[] {8, 16}) {
      for (int channels : new int[] {1, 3}) {
        Photo photo = SamplePhotos.noise(new PhotoShape(9, 7, channels, bits), 4);
        byte[] straight = SampleProfiles.straight();
        byte[] power = SampleProfiles.power(2.2);
        GreyPlane linear = under(photo, straight).linearLuminance();
        GreyPlane bent = under(photo, power).linearLuminance();
        if (channels == 1) {
          double value = photo.sample(3, 2, 0) / (double) photo.shape().highestSample();
          assertThat((double) linear.at(3, 2)).isCloseTo(value, within(1e-6));
          // ICC.1:2010, 10.5: 2.2 is written as 563/256
          assertThat((double) bent.at(3, 2)).isCloseTo(Math.pow(value, 563 / 256.0), within(1e-6));
        }
        assertThat(linear.at(3, 2)).isNotEqualTo(photo.linearLuminance().at(3, 2));
        assertThat(bent.at(3, 2)).isLessThan(linear.at(3, 2));
      }
    }
  }

  private static Photo under(Photo photo, byte[] curve) {
    byte[] profile =
        photo.channels() == 1 ? SampleProfiles.grey(curve) : SampleProfiles.colour(curve);
    return photo.withMetadata(PhotoMetadata.none().withIccProfile(profile));
  }

  @Test
  void aProfileThatCannotBeUsedIsComplainedOfAndTakenAsSrgb() {
    Photo photo = SamplePhotos.noise(new PhotoShape(9, 7, 3, 8), 4);
    Photo broken = photo.withMetadata(PhotoMetadata.none().withIccProfile(new byte[200]));
    assertThat(photo.profileComplaint()).isEmpty();
    assertThat(under(photo, SampleProfiles.straight()).profileComplaint()).isEmpty();
    assertThat(broken.profileComplaint().orElseThrow()).contains("taken as sRGB-encoded");
    assertThat(broken.linearLuminance().values()).isEqualTo(photo.linearLuminance().values());
  }

  @Test
  void aBoxIsCutOutInItsPlace() {
    Photo photo = SamplePhotos.noise(new PhotoShape(9, 7, 3, 16), 4);
    GreyPlane whole = photo.linearLuminance();
    GreyPlane part = photo.linearLuminance(new PixelBox(2, 3, 5, 4));
    assertThat(part.width()).isEqualTo(5);
    for (int y = 0; y < 4; y++) {
      for (int x = 0; x < 5; x++) {
        assertThat(part.at(x, y)).isEqualTo(whole.at(x + 2, y + 3));
      }
    }
  }

  @Test
  void boxesBeyondThePhotoAreRefused() {
    Photo photo = SamplePhotos.noise(new PhotoShape(9, 7, 1, 8), 4);
    assertThatThrownBy(() -> photo.linearLuminance(new PixelBox(5, 0, 5, 7)))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("must lie inside 9 x 7 px");
    assertThatThrownBy(() -> new PixelBox(-1, 0, 5, 7))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> new PixelBox(0, 0, 0, 7)).isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void rowsAreRoundedToNearestAndLimited() {
    PhotoShape shape = new PhotoShape(6, 1, 1, 16);
    Photo photo =
        new PhotoBuilder(shape)
            .row(0, new float[] {-5f, 0.49f, 0.51f, 65534.5f, 65534.4f, 7e9f})
            .build();
    float[] row = new float[6];
    photo.row(0, row);
    // 65534.5 lies half way: to even
    assertThat(row).containsExactly(0f, 0f, 1f, 65534f, 65534f, 65535f);
  }

  @Test
  void shapesBeyondOneArrayAreRefused() {
    assertThatThrownBy(() -> new PhotoShape(50_000, 50_000, 1, 8))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("must be at most");
    assertThatThrownBy(() -> new PhotoShape(0, 5, 1, 8)).hasMessageContaining("widthPx is 0");
    assertThatThrownBy(() -> new PhotoShape(5, 5, 5, 8)).hasMessageContaining("channels is 5");
    assertThatThrownBy(() -> new PhotoShape(5, 5, 1, 12)).hasMessageContaining("bits is 12");
  }
}
