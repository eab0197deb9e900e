package plumbray.wholejob;

import static org.assertj.core.api.Assertions.assertThat;

import boofcv.alg.distort.ImageDistort;
import boofcv.alg.interpolate.InterpolationType;
import boofcv.factory.distort.FactoryDistort;
import boofcv.struct.border.BorderType;
import boofcv.struct.distort.PixelTransform;
import boofcv.struct.image.GrayU8;
import boofcv.struct.image.ImageType;
import georegression.struct.point.Point2D_F32;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import plumbray.calibration.camera.Camera;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.rectify.Interpolation;
import plumbray.imaging.rectify.MaskPlane;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.Rectifier;
import plumbray.imaging.rectify.RedrawOptions;
import plumbray.imaging.scene.Sensor;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;

/** A redrawn picture against the same view along straight rays. */
class RedrawnPictureTest {
  /** What was asked of pictures whose air is known, px. */
  private static final double MEDIAN_PX = 0.3;

  private static final double NINETEEN_OF_TWENTY_PX = 0.6;

  /** Above cubic remapping in 8 bit that rounds down, dB. */
  private static final double BETTER_DB = 1.0;

  /** Over hot ground: the foot is never seen. */
  private static final TexturedBoard BOARD = new TexturedBoard(DrawnSight.of(12, 0.2, 600));

  private static final int BLOCK_PX = 12;

  private static final Sensor CLEAN = new Sensor(0.8, 1, Double.POSITIVE_INFINITY, 0, 8);

  private static Rectified redrawn(Photo photo, Interpolation interpolation) {
    return Rectifier.rectify(photo, BOARD.map(), new RedrawOptions(interpolation, false), 2);
  }

  @ParameterizedTest
  @EnumSource(Interpolation.class)
  void whatIsRestoredStandsWhereStraightRaysPutIt(Interpolation interpolation) {
    Photo straight = BOARD.drawn(CLEAN).straightPhoto();
    Rectified redrawn = redrawn(BOARD.drawn(CLEAN).photo(), interpolation);
    double[] shifts = shifts(redrawn, straight);
    assertThat(shifts.length).isGreaterThan(60);
    assertThat(shifts[shifts.length / 2]).isLessThan(MEDIAN_PX);
    assertThat(shifts[shifts.length * 19 / 20]).isLessThan(NINETEEN_OF_TWENTY_PX);
  }

  /** Vertical shifts of blocks that are restored throughout, px, without sign, rising. */
  private static double[] shifts(Rectified redrawn, Photo straight) {
    double[] shifts = new double[4096];
    int count = 0;
    for (int top = 1; top + BLOCK_PX < straight.height(); top += BLOCK_PX) {
      for (int left = 0; left + BLOCK_PX <= straight.width(); left += BLOCK_PX) {
        double steep = 0;
        double moved = 0;
        boolean restored = true;
        for (int y = top; y < top + BLOCK_PX; y++) {
          for (int x = left; x < left + BLOCK_PX; x++) {
            restored &= redrawn.mask().at(x, y) == MaskPlane.UPRIGHT;
            double slope = 0.5 * (straight.sample(x, y + 1, 0) - straight.sample(x, y - 1, 0));
            steep += slope * slope;
            moved += slope * (redrawn.picture().sample(x, y, 0) - straight.sample(x, y, 0));
          }
        }
        if (restored) {
          shifts[count++] = Math.abs(moved / steep);
        }
      }
    }
    double[] found = Arrays.copyOf(shifts, count);
    Arrays.sort(found);
    return found;
  }

  @ParameterizedTest
  @EnumSource(Interpolation.class)
  void itComesNearerThanCubicRemappingThatRoundsDown(Interpolation interpolation) {
    Photo photo = BOARD.drawn(CLEAN).photo();
    Photo straight = BOARD.drawn(CLEAN).straightPhoto();
    Rectified redrawn = redrawn(photo, interpolation);
    GrayU8 other = remapped(photo);
    double ours = 0;
    double others = 0;
    int count = 0;
    for (int y = 0; y < photo.height(); y++) {
      for (int x = 0; x < photo.width(); x++) {
        if (redrawn.mask().at(x, y) == MaskPlane.UPRIGHT) {
          double right = straight.sample(x, y, 0);
          ours += Math.pow(redrawn.picture().sample(x, y, 0) - right, 2);
          others += Math.pow(other.get(x, y) - right, 2);
          count++;
        }
      }
    }
    assertThat(psnr(ours / count)).isGreaterThan(psnr(others / count) + BETTER_DB);
  }

  private static double psnr(double meanSquare) {
    return 10 * Math.log10(255.0 * 255.0 / meanSquare);
  }

  /** A library's bicubic distortion with the true map. */
  private static GrayU8 remapped(Photo photo) {
    SightOptics optics = BOARD.optics();
    GrayU8 from = new GrayU8(photo.width(), photo.height());
    for (int y = 0; y < photo.height(); y++) {
      for (int x = 0; x < photo.width(); x++) {
        from.set(x, y, photo.sample(x, y, 0));
      }
    }
    ImageType<GrayU8> type = ImageType.single(GrayU8.class);
    ImageDistort<GrayU8, GrayU8> distort =
        FactoryDistort.distort(false, InterpolationType.BICUBIC, BorderType.EXTENDED, type, type);
    distort.setModel(
        new PixelTransform<Point2D_F32>() {
          @Override
          public void compute(int x, int y, Point2D_F32 output) {
            output.x = x;
            output.y = (float) seenRow(optics, x, y);
          }

          @Override
          public PixelTransform<Point2D_F32> copyConcurrent() {
            return this;
          }
        });
    GrayU8 to = new GrayU8(photo.width(), photo.height());
    distort.apply(from, to);
    return to;
  }

  /** The row in which the upright image shows what belongs at a pixel; -1 where none does. */
  private static double seenRow(SightOptics optics, int x, int y) {
    Camera camera = optics.camera();
    double[] direction = new double[2];
    camera.direction(x, y, direction);
    double distanceM = BOARD.distanceM();
    double elevationM = optics.straight().elevationM(direction[0], distanceM);
    for (Branch branch : optics.mapping(distanceM).branches()) {
      if (branch.sense() == Sense.UPRIGHT && branch.holdsElevation(elevationM)) {
        return camera.rowAt(branch.apparentRad(elevationM));
      }
    }
    return -1;
  }

  @Test
  void theMaskIsRightToARow() {
    SightOptics optics = BOARD.optics();
    Rectified redrawn = redrawn(BOARD.drawn(CLEAN).photo(), Interpolation.CUBIC);
    double lowestM =
        optics.mapping(BOARD.distanceM()).branches().stream()
            .mapToDouble(Branch::lowestElevationM)
            .min()
            .orElseThrow();
    double row = optics.camera().rowAt(optics.straight().apparentRad(lowestM, BOARD.distanceM()));
    for (int x = 0; x < redrawn.mask().widthPx(); x++) {
      assertThat(redrawn.mask().at(x, (int) Math.floor(row))).isEqualTo(MaskPlane.UPRIGHT);
      assertThat(redrawn.mask().at(x, (int) Math.ceil(row))).isEqualTo(MaskPlane.NEVER_VISIBLE);
    }
  }
}
