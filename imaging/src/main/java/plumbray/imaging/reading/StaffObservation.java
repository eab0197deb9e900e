package plumbray.imaging.reading;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import plumbray.calibration.quantity.Parameter;

/**
 * A staff in a photo: its strip against the strip that the sight predicts, through every image.
 *
 * <p>Residuals: one a row in use, and one an edge that the shimmer may displace. Quantities of its
 * own: the point spread (px), and the displacement of each edge (px), which follow the shimmer's
 * Gaussian process. Displacements are estimated, not linearized away, so that shimmer of a pixel
 * and more does no harm; they must not be counted as independent either, which their process sees
 * to.
 */
public final class StaffObservation implements ReferenceObservation {

  private static final double LEAST_SLOPE_SHARE = 1e-3;
  private static final double LEAST_SPREAD_PX = 0.2;
  private static final double MOST_SPREAD_PX = 12.0;

  private final StaffScene scene;
  private final StripModelSettings settings;
  private final List<EdgeImage> edges;
  private final double[][] whitening;

  private StaffObservation(
      StaffScene scene, StripModelSettings settings, List<EdgeImage> edges, double[][] whitening) {
    this.scene = scene;
    this.settings = settings;
    this.edges = edges;
    this.whitening = whitening;
  }

  /** The strip without shimmer. */
  public static StaffObservation still(StaffScene scene, StripModelSettings settings) {
    return new StaffObservation(scene, settings, List.of(), new double[0][]);
  }

  /** The strip with edges displaced by shimmer. */
  public static StaffObservation shimmering(
      StaffScene scene, StripModelSettings settings, List<EdgeImage> edges, Shimmer shimmer) {
    if (edges.isEmpty()) {
      return still(scene, settings);
    }
    RealMatrix k = new Array2DRowRealMatrix(shimmer.covariance(edges), false);
    RealMatrix lower = new CholeskyDecomposition(k, 1e-9, 0.0).getL();
    RealMatrix inverse = MatrixUtils.inverse(lower);
    return new StaffObservation(scene, settings, List.copyOf(edges), inverse.getData());
  }

  /**
   * Settings of a strip's model.
   *
   * @param used indices of the strip's values that count
   * @param noiseFactors factors on the strip's standard deviations, one a value of the strip
   * @param spreadPx where the point spread starts, px
   */
  public record StripModelSettings(int[] used, double[] noiseFactors, double spreadPx) {}

  @Override
  public int count() {
    return settings.used().length + edges.size();
  }

  @Override
  public List<Parameter> ownParameters() {
    List<Parameter> own = new ArrayList<>();
    String name = scene.name();
    own.add(
        new Parameter(
            name + ".spreadPx",
            settings.spreadPx(),
            Double.NaN,
            LEAST_SPREAD_PX,
            MOST_SPREAD_PX,
            0.2));
    for (int i = 0; i < edges.size(); i++) {
      own.add(new Parameter(name + ".shimmerPx[" + i + "]", 0.0, Double.NaN, -30.0, 30.0, 0.2));
    }
    return own;
  }

  @Override
  public void evaluate(TracedSight sight, double[] own, Rows into) {
    Prediction prediction = predict(sight, own);
    double[] residuals = prediction.model().residuals();
    for (int r = 0; r < residuals.length; r++) {
      into.set(r, residuals[r]);
    }
    if (into.wantsJacobian()) {
      for (int r = 0; r < count(); r++) {
        Arrays.fill(into.derivatives(r), 0.0);
      }
      differentiate(prediction, sight, into);
    }
    setShimmer(own, into);
  }

  private record Prediction(StripModel model, List<StripEvent> events, int[] displacementOf) {}

  private Prediction predict(TracedSight sight, double[] own) {
    int[] top = new int[1];
    List<StripEvent> events =
        StripEvents.of(scene.bars(), scene.strip(), sight, scene.place(), top);
    int[] displacementOf = displacements(events);
    double[] rows = new double[events.size()];
    for (int e = 0; e < rows.length; e++) {
      int d = displacementOf[e];
      rows[e] = events.get(e).row() + (d >= 0 ? own[1 + d] : 0.0);
    }
    StripModel model =
        new StripModel(
            scene.bars(),
            scene.strip(),
            settings.used(),
            settings.noiseFactors(),
            new StripModel.Scene(events, rows, top[0], own[0]));
    return new Prediction(model, events, displacementOf);
  }

  /** How the strip looks through a sight. */
  public StripLook look(TracedSight sight, double[] own) {
    StripModel model = predict(sight, own).model();
    return new StripLook(settings.used(), model.predicted(), model.contrast());
  }

  /** The settings of the strip's model. */
  public StripModelSettings settings() {
    return settings;
  }

  /** The staff and its strip. */
  public StaffScene scene() {
    return scene;
  }

  /**
   * The edges that the shimmer may displace, in the order of the own parameters after the first.
   */
  public List<EdgeImage> edges() {
    return edges;
  }

  /** Displacement of an edge among the own values, px; 0 where the edge was not there. */
  public double displacementPx(double[] own, EdgeImage edge) {
    for (int d = 0; d < edges.size(); d++) {
      if (edges.get(d).edge() == edge.edge() && edges.get(d).image() == edge.image()) {
        return own[1 + d];
      }
    }
    return 0.0;
  }

  /**
   * How far each value of the strip is from its prediction, in its standard deviation times {@code
   * noiseFactor}; 0 where the value is not in use.
   */
  public double[] strayed(TracedSight sight, double[] own, double noiseFactor) {
    double[] residuals = predict(sight, own).model().residuals();
    double[] strayed = new double[scene.strip().rows()];
    for (int r = 0; r < residuals.length; r++) {
      int i = settings.used()[r];
      strayed[i] = residuals[r] * settings.noiseFactors()[i] / noiseFactor;
    }
    return strayed;
  }

  /** How many residuals are of rows; the others are of the shimmer. */
  public int rowCount() {
    return settings.used().length;
  }

  private int[] displacements(List<StripEvent> events) {
    return events.stream()
        .mapToInt(
            event ->
                IntStream.range(0, edges.size())
                    .filter(
                        d ->
                            edges.get(d).edge() == event.edge()
                                && edges.get(d).image() == event.image())
                    .findFirst()
                    .orElse(-1))
        .toArray();
  }

  private void setShimmer(double[] own, Rows into) {
    int first = settings.used().length;
    for (int i = 0; i < edges.size(); i++) {
      double sum = 0.0;
      for (int j = 0; j <= i; j++) {
        sum += whitening[i][j] * own[1 + j];
      }
      into.set(first + i, sum);
      if (into.wantsJacobian()) {
        for (int j = 0; j <= i; j++) {
          into.derivatives(first + i)[into.firstOwn() + 1 + j] = whitening[i][j];
        }
      }
    }
  }

  private void differentiate(Prediction prediction, TracedSight sight, Rows into) {
    StripModel model = prediction.model();
    List<StripEvent> events = prediction.events();
    int[] displacementOf = prediction.displacementOf();
    int estimates = sight.estimateCount();
    double[][] columns = new double[estimates][settings.used().length];
    double[] byEstimate = new double[estimates];
    for (int e = 0; e < events.size(); e++) {
      if (!eventDerivatives(events.get(e), sight, byEstimate)) {
        continue;
      }
      double[] byRow = model.byEventRow(e);
      for (int k = 0; k < estimates; k++) {
        for (int r = 0; r < byRow.length; r++) {
          columns[k][r] += byRow[r] * byEstimate[k];
        }
      }
      if (displacementOf[e] >= 0) {
        put(model.levelsFollowing(byRow), into.firstOwn() + 1 + displacementOf[e], into);
      }
    }
    for (int k = 0; k < estimates; k++) {
      put(model.levelsFollowing(columns[k]), k, into);
    }
    put(model.bySpread(), into.firstOwn(), into);
  }

  /** Derivatives of an event's row; false where nothing tells how it moves. */
  private boolean eventDerivatives(StripEvent event, TracedSight sight, double[] out) {
    double azimuth = scene.azimuthRad(sight.camera());
    if (event.branch().isEmpty()) {
      return sight.endDerivatives(event.apparentRad(), azimuth, out);
    }
    sight.rowDerivatives(
        scene.place().reference(),
        new TracedSight.Place(
            event.branch().get(), event.apparentRad(), azimuth, LEAST_SLOPE_SHARE),
        out);
    return true;
  }

  private static void put(double[] column, int at, Rows into) {
    for (int r = 0; r < column.length; r++) {
      into.derivatives(r)[at] = column[r];
    }
  }
}
