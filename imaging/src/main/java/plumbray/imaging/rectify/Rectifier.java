package plumbray.imaging.rectify;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;

/**
 * Redraws photos. Rows are shared out among threads; each pixel depends on the photo and the map
 * alone, so the result is the same, to the bit, for any number of them.
 */
public final class Rectifier {
  private static final int BAND_ROWS = 32;

  private final Photo photo;
  private final RectifyMap map;
  private final PhotoBuilder picture;
  private final byte[] codes;

  private Rectifier(Photo photo, RectifyMap map) {
    this.photo = photo;
    this.map = map;
    this.picture = new PhotoBuilder(photo.shape()).metadata(photo.metadata());
    this.codes = new byte[photo.width() * photo.height()];
  }

  /**
   * Redraws a photo.
   *
   * @param photo the photo, of the size of the map's camera
   * @param map where everything is seen
   * @param threads how many threads to use, at least 1
   * @throws IllegalArgumentException where the photo's size is not that of the camera
   */
  public static Rectified rectify(Photo photo, RectifyMap map, int threads) {
    if (photo.width() != map.widthPx() || photo.height() != map.heightPx()) {
      throw new IllegalArgumentException(
          "photo is %d x %d px, must be %d x %d px (size of the camera's pictures); %s"
              .formatted(
                  photo.width(),
                  photo.height(),
                  map.widthPx(),
                  map.heightPx(),
                  "use the sight of this photo's camera"));
    }
    Rectifier rectifier = new Rectifier(photo, map);
    rectifier.drawBands(threads);
    MaskPlane mask = new MaskPlane(photo.width(), photo.height(), rectifier.codes);
    new NeverVisibleFill(mask, rectifier.picture, photo.shape()).fill();
    return new Rectified(rectifier.picture.build(), mask);
  }

  private void drawBands(int threads) {
    AtomicInteger nextBand = new AtomicInteger();
    ExecutorService pool = Executors.newFixedThreadPool(threads);
    try {
      List<Future<?>> workers = new ArrayList<>();
      for (int i = 0; i < threads; i++) {
        workers.add(pool.submit(() -> new BandPainter().paint(nextBand)));
      }
      for (Future<?> worker : workers) {
        worker.get();
      }
    } catch (ExecutionException e) {
      throw new IllegalStateException("redrawing failed", e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException("redrawing was interrupted", e);
    } finally {
      pool.shutdownNow();
    }
  }

  /** Paints bands of rows until there are no more; one for each thread. */
  private final class BandPainter {
    private final RowReader reader = new RowReader(map);
    private final Resampler resampler = new Resampler(photo);
    private final TileResampler tiles = new TileResampler(photo);
    private final int channels = photo.channels();
    private final float[] row = new float[photo.shape().rowSamples()];

    void paint(AtomicInteger nextBand) {
      int from;
      while ((from = nextBand.getAndIncrement() * BAND_ROWS) < photo.height()) {
        for (int y = from; y < Math.min(photo.height(), from + BAND_ROWS); y++) {
          paintRow(y);
        }
      }
    }

    private void paintRow(int y) {
      RowMap sources = reader.read(y);
      for (int x = 0; x < photo.width(); x++) {
        codes[y * photo.width() + x] = (byte) sources.codes[x];
      }
      Arrays.fill(row, 0f);
      for (int from = 0; from < photo.width(); from += RowReader.TILE) {
        int to = Math.min(photo.width(), from + RowReader.TILE);
        boolean whole = !photo.hasAlpha() && sources.allShown(from, to);
        if (!whole || !tiles.sample(sources, from, to, row)) {
          paintPixels(sources, from, to);
        }
      }
      picture.row(y, row);
    }

    private void paintPixels(RowMap sources, int from, int to) {
      for (int x = from; x < to; x++) {
        if (sources.isShown(x)) {
          resampler.sample(sources.u[x], sources.v[x], sources.stretch[x], row, x * channels);
        }
      }
    }
  }
}
