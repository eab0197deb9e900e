package plumbray.imaging.rectify;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicInteger;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;

/**
 * Redraws photos. Rows are shared out among threads; each pixel depends on the photo and the map
 * alone, so the result is the same, to the bit, for any number of them.
 */
public final class Rectifier {
  private static final int BAND_ROWS = 64;

  private final Photo photo;
  private final RectifyMap map;
  private final PhotoBuilder picture;
  private final byte[] codes;
  private final RedrawOptions options;
  private final Optional<LightCurve> curve;
  private final AtomicBoolean someNeverVisible = new AtomicBoolean();

  private Rectifier(Photo photo, RectifyMap map, RedrawOptions options) {
    this.photo = photo;
    this.map = map;
    this.options = options;
    this.curve = options.linearLight() ? Optional.of(new LightCurve(photo)) : Optional.empty();
    this.picture = new PhotoBuilder(photo.shape()).metadata(photo.metadata());
    this.codes = new byte[photo.width() * photo.height()];
  }

  /** Redraws a photo in the standard way. */
  public static Rectified rectify(Photo photo, RectifyMap map, int threads) {
    return rectify(photo, map, RedrawOptions.standard(), threads);
  }

  /**
   * Redraws a photo.
   *
   * @param photo the photo, of the size of the map's camera
   * @param map where everything is seen
   * @param options how to redraw it
   * @param threads how many threads to use, at least 1
   * @throws IllegalArgumentException where the photo's size is not that of the camera
   */
  public static Rectified rectify(Photo photo, RectifyMap map, RedrawOptions options, int threads) {
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
    Rectifier rectifier = new Rectifier(photo, map, options);
    rectifier.drawBands(threads);
    MaskPlane mask = new MaskPlane(photo.width(), photo.height(), rectifier.codes);
    if (rectifier.someNeverVisible.get()) {
      new NeverVisibleFill(mask, rectifier.picture, photo.shape()).fill();
    }
    return new Rectified(rectifier.picture.build(), mask);
  }

  private void drawBands(int threads) {
    AtomicInteger nextBand = new AtomicInteger();
    ExecutorService pool = Executors.newFixedThreadPool(threads);
    try {
      List<Future<?>> workers = new ArrayList<>();
      for (int i = 0; i < threads; i++) {
        workers.add(pool.submit(() -> paintBands(nextBand)));
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

  private void paintBands(AtomicInteger nextBand) {
    RowPainter painter = new RowPainter(photo, map, options, curve);
    int from;
    while ((from = nextBand.getAndIncrement() * BAND_ROWS) < photo.height()) {
      for (int y = from; y < Math.min(photo.height(), from + BAND_ROWS); y++) {
        if (painter.paint(y, picture, codes)) {
          someNeverVisible.set(true);
        }
      }
    }
  }
}
