package plumbray.imaging.scene;

import java.util.stream.IntStream;
import plumbray.calibration.camera.Camera;

/**
 * Draws a scene in linear light: every sample of the picture is a direction, and the direction's
 * ray decides what is seen there.
 *
 * <p>A pixel that shows one surface takes one sample at its centre; any other is the mean of 32, in
 * eight rows and four columns, whose rows are staggered from column to column so that an edge's
 * place is caught to about 1/128 px in a pixel and finer in the mean over columns.
 */
final class SceneRenderer {
  private static final int ROWS = 8;
  private static final int COLUMNS = 4;
  private static final long VERTICAL = 3;
  private static final long HORIZONTAL = 4;

  private final SeenScene seen;
  private final Camera camera;
  private final ShiftField vertical;
  private final ShiftField horizontal;

  SceneRenderer(SeenScene seen, Camera camera) {
    this.seen = seen;
    this.camera = camera;
    Shimmer shimmer = seen.scene().shimmer();
    this.vertical = shimmer.isNone() ? null : field(VERTICAL, shimmer);
    this.horizontal = shimmer.isNone() ? null : field(HORIZONTAL, shimmer);
  }

  private ShiftField field(long stream, Shimmer shimmer) {
    long seed = Hash.mix(seen.scene().seed(), stream, 0);
    return new ShiftField(seed, shimmer, camera.widthPx(), camera.heightPx());
  }

  LinearPicture render() {
    LinearPicture picture = new LinearPicture(camera.widthPx(), camera.heightPx());
    IntStream.range(0, camera.heightPx()).parallel().forEach(v -> new Row(v, picture).render());
    return picture;
  }

  /** One row of the picture; rows know nothing of each other. */
  private final class Row {
    private final int v;
    private final LinearPicture picture;
    private final float[] shiftU = new float[camera.widthPx()];
    private final float[] shiftV = new float[camera.widthPx()];
    private final Tile tile = new Tile(camera.projection());
    private final Contents tileContents = new Contents(seen);
    private final Contents pixelContents = new Contents(seen);
    private final Shader shader = new Shader(seen, camera.radPerPx());
    private Contents contents;
    private final double[] sum = new double[LinearPicture.CHANNELS];

    Row(int v, LinearPicture picture) {
      this.v = v;
      this.picture = picture;
      if (vertical != null) {
        vertical.row(v, seen.scene().shimmer().verticalRmsPx(), shiftV);
        horizontal.row(v, seen.scene().shimmer().horizontalRmsPx(), shiftU);
      }
    }

    void render() {
      for (int left = 0; left < camera.widthPx(); left += Tile.WIDTH_PX) {
        int right = Math.min(camera.widthPx(), left + Tile.WIDTH_PX);
        tile.moveTo(left, right, v);
        tileContents.find(seen.things(), tile.window(left, right, greatestShiftPx(left, right)));
        for (int u = left; u < right; u++) {
          picture.set(u, v, pixel(u));
        }
      }
    }

    private double greatestShiftPx(int left, int right) {
      double greatest = 0;
      for (int u = left; u < right; u++) {
        greatest = Math.max(greatest, Math.max(Math.abs(shiftU[u]), Math.abs(shiftV[u])));
      }
      return greatest;
    }

    private double[] pixel(int u) {
      contents = tileContents;
      if (!contents.isEven()) {
        pixelContents.find(tileContents.things(), tile.window(u, u + 1, greatestShiftPx(u, u + 1)));
        contents = pixelContents;
      }
      return contents.isEven() ? single(u) : mean(u);
    }

    private double[] single(int u) {
      return light(u + (double) shiftU[u], v + (double) shiftV[u], 1);
    }

    private double[] mean(int u) {
      sum[0] = sum[1] = sum[2] = 0;
      for (int column = 0; column < COLUMNS; column++) {
        double stagger = (column + ((u & 3) + 0.5) / 4) / COLUMNS;
        double sampleU = u + shiftU[u] + (column + 0.5) / COLUMNS - 0.5;
        for (int row = 0; row < ROWS; row++) {
          double sampleV = v + shiftV[u] + (row + stagger) / ROWS - 0.5;
          double[] light = light(sampleU, sampleV, 1.0 / COLUMNS);
          for (int channel = 0; channel < sum.length; channel++) {
            sum[channel] += light[channel];
          }
        }
      }
      for (int channel = 0; channel < sum.length; channel++) {
        sum[channel] /= ROWS * COLUMNS;
      }
      return sum;
    }

    private double[] light(double u, double sampleV, double widthPx) {
      return shader.light(
          contents.things(), tile.apparentRad(u, sampleV), tile.tanAzimuth(u, sampleV), widthPx);
    }
  }
}
