package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.apache.commons.math3.stat.correlation.PearsonsCorrelation;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.photo.GreyPlane;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PixelBox;

/**
 * Finds a staff in a photo: the columns whose edges, one below the other, can be read as the
 * staff's bars, upright and inverted.
 */
public final class StaffFinder {

  /** Columns looked at together: a staff must be this wide. */
  private static final int BLOCK_PX = 6;

  private static final int STEP_PX = 3;
  private static final int BAND_PX = 512;
  private static final int CANDIDATES = 24;
  private static final int MOST_EDGES = 240;

  /** Contrast beyond which an edge counts no more for it, linear light. */
  private static final double ENOUGH_CONTRAST = 0.1;

  /** Columns whose brightness goes with that of the block belong to the staff. */
  private static final double ALIKE = 0.8;

  private static final double MARGIN_SHARE = 0.1;
  private static final double GROUND_SHARE = 0.3;
  private static final double LEAST_MARGIN_PX = 30.0;

  private final Photo photo;
  private final StaffBars bars;
  private final double nominalMPerPx;
  private final double shear;

  /**
   * A search.
   *
   * @param photo the photo
   * @param staff the staff
   * @param nominalMPerPx metres a row where rays are straight
   * @param shear rows by which a line of equal elevation falls a column to the right
   */
  public StaffFinder(Photo photo, StaffTarget staff, double nominalMPerPx, double shear) {
    this.photo = photo;
    this.bars = new StaffBars(staff);
    this.nominalMPerPx = nominalMPerPx;
    this.shear = shear;
  }

  /**
   * Where a staff was found.
   *
   * @param box where it is, down to below the ground's edge
   * @param score logarithm of how much likelier its edges are as bars of this staff than as any
   * @param nextScore the same for the best other place
   */
  public record Found(ImageBox box, double score, double nextScore) {}

  private record Place(int left, double score, List<EdgeTrail.Step> steps, StaffStrip strip) {}

  /** The likeliest place that keeps clear of others already taken; empty where there is none. */
  public Optional<Found> find(List<ImageBox> taken) {
    List<Place> places =
        blocks(taken).stream()
            .map(this::place)
            .flatMap(Optional::stream)
            .sorted(Comparator.comparingDouble(p -> -p.score()))
            .toList();
    if (places.isEmpty()) {
      return Optional.empty();
    }
    Place best = places.get(0);
    ImageBox box = box(best);
    double next =
        places.stream()
            .filter(p -> p.left() > box.u1() || p.left() + BLOCK_PX < box.u0())
            .mapToDouble(Place::score)
            .findFirst()
            .orElse(0.0);
    return Optional.of(new Found(box, best.score(), next));
  }

  /** Left columns of the blocks with the most edges across all of their width. */
  private List<Integer> blocks(List<ImageBox> taken) {
    List<double[]> all = new ArrayList<>();
    for (int left = 0; left < photo.width(); left += BAND_PX) {
      int width = Math.min(BAND_PX + BLOCK_PX, photo.width() - left);
      GreyPlane band = photo.linearLuminance(new PixelBox(left, 0, width, photo.height()));
      for (int x = 0; x + BLOCK_PX <= width; x += STEP_PX) {
        all.add(new double[] {left + x, edgeSum(band, x)});
      }
    }
    all.sort(Comparator.comparingDouble(b -> -b[1]));
    List<Integer> chosen = new ArrayList<>();
    for (double[] block : all) {
      int left = (int) block[0];
      boolean free =
          taken.stream().noneMatch(b -> left + BLOCK_PX > b.u0() && left < b.u1())
              && chosen.stream().noneMatch(c -> Math.abs(c - left) < BLOCK_PX);
      if (free && chosen.size() < CANDIDATES) {
        chosen.add(left);
      }
    }
    return chosen;
  }

  private static double edgeSum(GreyPlane band, int left) {
    double[] mean = new double[band.height()];
    for (int y = 0; y < mean.length; y++) {
      for (int x = left; x < left + BLOCK_PX; x++) {
        mean[y] += band.at(x, y) / BLOCK_PX;
      }
    }
    double sum = 0.0;
    for (int y = 2; y < mean.length - 2; y++) {
      sum += Math.min(ENOUGH_CONTRAST, Math.abs(mean[y + 1] - mean[y - 1]));
    }
    return sum;
  }

  private Optional<Place> place(int left) {
    int right = Math.min(photo.width() - 1, left + BLOCK_PX - 1);
    StaffStrip strip =
        StaffStrip.read(photo, new ImageBox(left, 0.0, right, photo.height() - 1.0), shear);
    List<StripEdges.Edge> seen = StripEdges.of(strip);
    if (seen.size() > MOST_EDGES) {
      return Optional.empty();
    }
    return EdgeTrail.scored(bars, seen, nominalMPerPx).stream()
        .findFirst()
        .map(t -> new Place(left, t.score(), t.steps(), strip));
  }

  /** The box about a place: all columns like it, from above its first edge to below its last. */
  private ImageBox box(Place place) {
    List<StripEdges.Edge> seen = StripEdges.of(place.strip());
    double first = seen.get(place.steps().get(0).seen()).row();
    double last = seen.get(place.steps().get(place.steps().size() - 1).seen()).row();
    double above = Math.max(LEAST_MARGIN_PX, MARGIN_SHARE * (last - first));
    double below = Math.max(LEAST_MARGIN_PX, GROUND_SHARE * (last - first));
    int top = (int) first;
    int rows = Math.max(3, (int) last - top + 1);
    int from = Math.max(0, place.left() - BAND_PX);
    int to = Math.min(photo.width(), place.left() + BAND_PX);
    GreyPlane around = photo.linearLuminance(new PixelBox(from, top, to - from, rows));
    double[] model = Arrays.copyOfRange(place.strip().brightness(), top, top + rows);
    double middle = place.left() + 0.5 * (BLOCK_PX - 1);
    int left = place.left();
    while (left > from && alike(around, left - 1 - from, model, middle - left + 1)) {
      left--;
    }
    int right = place.left() + BLOCK_PX - 1;
    while (right < to - 1 && alike(around, right + 1 - from, model, middle - right - 1)) {
      right++;
    }
    return new ImageBox(
        left + 1.0,
        Math.max(0.0, first - above),
        right - 1.0,
        Math.min(photo.height() - 1.0, last + below));
  }

  private boolean alike(GreyPlane around, int column, double[] model, double leftOfMiddle) {
    int shift = (int) Math.round(shear * -leftOfMiddle);
    double[] other =
        IntStream.range(0, model.length)
            .mapToDouble(i -> around.at(column, Math.max(0, Math.min(model.length - 1, i + shift))))
            .toArray();
    return new PearsonsCorrelation().correlation(model, other) > ALIKE;
  }
}
