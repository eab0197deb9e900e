package plumbray.imaging.rectify;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import plumbray.calibration.camera.Camera;
import plumbray.imaging.light.SampleProfiles;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoMetadata;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.rectify.RectifyMap.MappedRegion;
import plumbray.imaging.rectify.SampleBranches.Parabola;
import plumbray.raymodel.ray.StraightRay;

class RectifierTest {
  private static final double DISTANCE_M = 900;
  private static final StraightRay STRAIGHT = new StraightRay(1.6, 6_371_000, 0);
  private static final Camera LEVEL = new Camera(150, 120, 30_000, 74.5, 59.5, 0, 0, 0, 0);
  private static final Camera TILTED =
      new Camera(150, 120, 30_000, 74.5, 59.5, 0.3, -0.1, 0.0002, 0.05);

  private static RectifyMap map(Camera camera, ApparentBranch... branches) {
    ElevationTable table =
        MappingTable.of(List.of(branches), STRAIGHT, DISTANCE_M, ElevationSpan.of(camera));
    return new RectifyMap(camera, List.of(new MappedRegion(Optional.empty(), table)));
  }

  /** Upright and inverted about a line below the middle; the inverted one shows more. */
  private static RectifyMap mirage(Camera camera) {
    double lineRad = -3e-4;
    return map(
        camera,
        new Parabola(lineRad, 1.4, 1.5e5, lineRad + 1e-3),
        new Parabola(lineRad, 1.4, 1.5e5, lineRad - 2.9e-3));
  }

  @ParameterizedTest
  @CsvSource({"1,8", "2,8", "3,8", "4,8", "1,16", "2,16", "3,16", "4,16"})
  void withoutRefractionThePhotoComesBackBitForBit(int channels, int bits) {
    ApparentBranch nothing = SampleBranches.constantRefraction(STRAIGHT, DISTANCE_M, -0.01, 0.01);
    for (Camera camera : List.of(LEVEL, TILTED)) {
      Photo photo = SampleImages.noise(new PhotoShape(150, 120, channels, bits), 17);
      Rectified rectified = Rectifier.rectify(photo, map(camera, nothing), 2);
      assertThat(rectified.picture()).isEqualTo(photo);
      for (byte code : rectified.mask().codes()) {
        assertThat(code & 0xff).isEqualTo(MaskPlane.UPRIGHT);
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"CUBIC,3,8", "LANCZOS,1,8", "CUBIC,4,16", "LANCZOS,3,16"})
  void soItDoesByWayOfLinearLight(Interpolation interpolation, int channels, int bits) {
    ApparentBranch nothing = SampleBranches.constantRefraction(STRAIGHT, DISTANCE_M, -0.01, 0.01);
    Photo photo = SampleImages.noise(new PhotoShape(150, 120, channels, bits), 17);
    RedrawOptions options = new RedrawOptions(interpolation, true);
    assertThat(Rectifier.rectify(photo, map(LEVEL, nothing), options, 2).picture())
        .isEqualTo(photo);
  }

  /** Black and white in equal parts: the mean of their light is 187.5 encoded, not 127.5. */
  @Test
  void inLinearLightTheMeanIsThatOfTheLight() {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(150, 120, 1, 8));
    for (int y = 60; y < 120; y++) {
      for (int x = 0; x < 150; x++) {
        builder.sample(x, y, 0, 255);
      }
    }
    Photo edge = builder.build();
    double pixelRad = 1 / LEVEL.focalPx();
    ApparentBranch halfARow =
        SampleBranches.shifted(STRAIGHT, DISTANCE_M, 0.5 * pixelRad, -0.01, 0.01);
    Photo light =
        Rectifier.rectify(
                edge, map(LEVEL, halfARow), new RedrawOptions(Interpolation.CUBIC, true), 1)
            .picture();
    Photo encoded = Rectifier.rectify(edge, map(LEVEL, halfARow), 1).picture();
    // sRGB of 1/2 by IEC 61966-2-1: 1.055 (1/2)^(1/2.4) - 0.055 = 0.7354
    assertThat(light.sample(70, 60, 0)).isCloseTo(188, within(1));
    assertThat(encoded.sample(70, 60, 0)).isCloseTo(128, within(1));
  }

  @ParameterizedTest
  @CsvSource({"3,8", "4,16", "1,16", "2,8"})
  void aConstantPhotoStaysConstantWhereThePhotoReaches(int channels, int bits) {
    int[] values = {37, 190, 101, 250};
    Photo photo = SampleImages.constant(new PhotoShape(150, 120, channels, bits), values);
    Rectified rectified = Rectifier.rectify(photo, mirage(TILTED), 2);
    int[] seen = new int[256];
    for (int y = 0; y < 120; y++) {
      for (int x = 0; x < 150; x++) {
        int code = rectified.mask().at(x, y);
        seen[code]++;
        for (int c = 0; c < channels; c++) {
          assertThat(rectified.picture().sample(x, y, c))
              .isEqualTo(code == MaskPlane.OUTSIDE ? 0 : values[c]);
        }
      }
    }
    assertThat(seen[MaskPlane.UPRIGHT]).isPositive();
    assertThat(seen[MaskPlane.INVERTED]).isPositive();
    assertThat(seen[MaskPlane.NEVER_VISIBLE]).isPositive();
    assertThat(seen[MaskPlane.OUTSIDE]).isPositive();
  }

  @Test
  void anyNumberOfThreadsDrawsTheSame() {
    Photo photo = SampleImages.noise(new PhotoShape(150, 120, 3, 16), 5);
    Rectified one = Rectifier.rectify(photo, mirage(TILTED), 1);
    for (int threads : new int[] {2, 4, 7}) {
      Rectified more = Rectifier.rectify(photo, mirage(TILTED), threads);
      assertThat(more.picture()).isEqualTo(one.picture());
      assertThat(more.mask().codes()).isEqualTo(one.mask().codes());
    }
  }

  @Test
  void whatIsNeverVisibleIsFilledWithTheToneBesideIt() {
    Photo photo = SampleImages.noise(new PhotoShape(150, 120, 1, 8), 5);
    Rectified rectified = Rectifier.rectify(photo, mirage(LEVEL), 1);
    int filled = 0;
    for (int y = 1; y < 120; y++) {
      for (int x = 1; x < 150; x++) {
        MaskPlane mask = rectified.mask();
        if (mask.at(x, y) == MaskPlane.NEVER_VISIBLE
            && mask.at(x - 1, y) == MaskPlane.NEVER_VISIBLE) {
          filled++;
          int step = rectified.picture().sample(x, y, 0) - rectified.picture().sample(x - 1, y, 0);
          // noise of 74 levels, averaged over 97 columns and 6 rows: neighbours all but agree
          assertThat(Math.abs(step)).isLessThanOrEqualTo(3);
          assertThat(rectified.picture().sample(x, y, 0)).isBetween(100, 155);
        }
      }
    }
    assertThat(filled).isGreaterThan(1000);
  }

  @Test
  void theMaskIsAGreyPhotoOfItsCodes() {
    MaskPlane mask = new MaskPlane(2, 2, new byte[] {0, (byte) 128, (byte) 200, (byte) 255});
    Photo photo = mask.photo();
    assertThat(photo.shape()).isEqualTo(new PhotoShape(2, 2, 1, 8));
    assertThat(photo.sample(0, 0, 0)).isZero();
    assertThat(photo.sample(1, 0, 0)).isEqualTo(128);
    assertThat(photo.sample(0, 1, 0)).isEqualTo(200);
    assertThat(photo.sample(1, 1, 0)).isEqualTo(255);
  }

  @Test
  void aPhotoOfAnotherSizeIsRefused() {
    Photo photo = SampleImages.noise(new PhotoShape(120, 150, 1, 8), 5);
    assertThatThrownBy(() -> Rectifier.rectify(photo, mirage(LEVEL), 1))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage(
            "photo is 120 x 150 px, must be 150 x 120 px (size of the camera's pictures);"
                + " use the sight of this photo's camera");
  }

  /** Half of the light of white, by a profile whose curve is a power. */
  @ParameterizedTest
  @CsvSource({"1, 127.5", "2, 180.3", "2.5, 193.3"})
  void linearLightIsThatOfTheEmbeddedProfile(double power, double encoded) {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(150, 120, 1, 8));
    for (int y = 60; y < 120; y++) {
      for (int x = 0; x < 150; x++) {
        builder.sample(x, y, 0, 255);
      }
    }
    byte[] profile = SampleProfiles.grey(SampleProfiles.power(power));
    builder.metadata(PhotoMetadata.none().withIccProfile(profile));
    ApparentBranch halfARow =
        SampleBranches.shifted(STRAIGHT, DISTANCE_M, 0.5 / LEVEL.focalPx(), -0.01, 0.01);
    RedrawOptions options = new RedrawOptions(Interpolation.CUBIC, true);
    Photo drawn = Rectifier.rectify(builder.build(), map(LEVEL, halfARow), options, 1).picture();
    // 255 (1/2)^(1/power)
    assertThat((double) drawn.sample(70, 60, 0)).isCloseTo(encoded, within(1.0));
  }

  /** A board, seen 12 px too high, before a background that is seen 3 px too high. */
  @Test
  void whatOneRegionShowsIsNotDrawnAgainByAnother() {
    double[][] corners = {{49.5, 39.5}, {89.5, 39.5}, {89.5, 69.5}, {49.5, 69.5}};
    double pixelRad = 1 / LEVEL.focalPx();
    RectifyMap map =
        new RectifyMap(
            LEVEL,
            List.of(
                new MappedRegion(Optional.of(new Outline(corners)), higher(12 * pixelRad)),
                new MappedRegion(Optional.empty(), higher(3 * pixelRad))));
    PhotoBuilder photo = new PhotoBuilder(new PhotoShape(150, 120, 1, 8));
    for (int y = 0; y < 120; y++) {
      for (int x = 0; x < 150; x++) {
        boolean board = x >= 50 && x < 90 && y >= 40 && y < 70;
        photo.sample(x, y, 0, board ? 220 : 60);
      }
    }
    Rectified redrawn = Rectifier.rectify(photo.build(), map, 1);
    for (int y = 3; y < 120; y++) {
      boolean board = y >= 52 && y < 82;
      // the board covers rows 40 to 69 of the photo: what shows 3 px lower is not to be known
      boolean hidden = y >= 43 && y < 52;
      int code = redrawn.mask().at(70, y);
      assertThat(code)
          .as("row %d", y)
          .isEqualTo(hidden ? MaskPlane.NEVER_VISIBLE : MaskPlane.UPRIGHT);
      if (!hidden && Math.abs(y - 52) > 2 && Math.abs(y - 82) > 2 && Math.abs(y - 43) > 2) {
        assertThat(redrawn.picture().sample(70, y, 0)).as("row %d", y).isEqualTo(board ? 220 : 60);
      }
      // filled with the tones above and below, and so without a gap
      assertThat(redrawn.picture().sample(70, y, 0)).as("row %d", y).isGreaterThan(40);
    }
  }

  private static ElevationTable higher(double byRad) {
    ApparentBranch branch = SampleBranches.shifted(STRAIGHT, DISTANCE_M, byRad, -0.01, 0.01);
    return MappingTable.of(List.of(branch), STRAIGHT, DISTANCE_M, ElevationSpan.of(LEVEL));
  }
}
