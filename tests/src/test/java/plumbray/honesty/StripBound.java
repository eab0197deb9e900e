package plumbray.honesty;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.DecompositionSolver;
import org.apache.commons.math3.linear.RealMatrix;
import plumbray.calibration.camera.Camera;
import plumbray.calibration.camera.RowSensitivity;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.StaffTarget;
import plumbray.imaging.fit.EstimateLayout;
import plumbray.imaging.fit.SightOptics;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.GrazingRay;
import plumbray.raymodel.mapping.Sense;

/**
 * Fisher's information that the strip of a staff holds about a sight, written for drawn photos and
 * without use of the fit's own model.
 *
 * <p>The mean over the box's n columns in row v is b(v) = f(v) + noise, with f what edges in rows
 * r_e, levels and a point spread make of it. Its covariance is C = N + J K J^T: N is diagonal,
 * 0.562 (f + R^2/W) / (W n), W electrons at full white, R of read-out noise, 0.562 the sum of the
 * squared weights of luminance (Rec. 709, from memory); J = df/dr_e; K_ef = s^2 m exp(-(r_e -
 * r_f)^2 / 2 Lv^2) is the covariance of the drawn shimmer (rms s) at two edges, m the mean of
 * exp(-du^2 / 2 Lu^2) over all pairs of the columns. With D the derivatives of f by the sight's
 * quantities and by the nuisance ones, levels and point spread, the information is D^T C^-1 D (Kay
 * 1993, equation 3.31, from memory, C taken as known), and of it the Schur complement that leaves
 * the nuisance quantities out.
 *
 * <p>To first order in the shimmer. The ground's edge counts where it cuts an inverted image of
 * bars, and is believed to 0.5 px, which is what a fit believes it to; beside any other end of an
 * image 8 rows are left out.
 */
final class StripBound {
  private static final double LUMINANCE_SQUARES =
      0.2126 * 0.2126 + 0.7152 * 0.7152 + 0.0722 * 0.0722;
  private static final double RELIEF_PX = 0.5;
  private static final double END_PX = 8.0;
  private static final int BAR_LEVELS = 4;
  private static final int DARK = 0;
  private static final int BRIGHT = 2;
  private static final int SKY = -1;
  private static final int GROUND = -2;
  private static final NormalDistribution NORMAL = new NormalDistribution(null, 0, 1);

  private final KnownSight known;
  private final SightOptics optics;
  private final EstimateLayout layout;
  private final ImageBox box;
  private final double[] edgesM;
  private final List<Event> events = new ArrayList<>();
  private final List<double[]> barred = new ArrayList<>();

  /** A row where what is seen changes: its derivatives, and how far relief may move it (px). */
  private record Event(double row, double[] byQuantity, double reliefPx) {}

  private StripBound(KnownSight known) {
    this.known = known;
    optics = SightOptics.of(known.truth(), known.names());
    layout = EstimateLayout.of(known.truth(), known.names());
    box = known.reference().imageBox().orElseThrow();
    edgesM = ((StaffTarget) known.reference().kind()).edgesM();
    List<Branch> branches = optics.mapping(known.reference().distanceM()).branches();
    branches.forEach(this::edges);
    ground(branches.get(0));
    events.sort(Comparator.comparingDouble(Event::row));
  }

  /** The information, an n by n matrix over the sight's quantities in their order, SI. */
  static double[][] information(KnownSight known) {
    return new StripBound(known).information();
  }

  private void edges(Branch branch) {
    double zeroM =
        known.truth().path().ground().elevationM(known.reference().distanceM())
            + known.reference().footM().value();
    for (double edgeM : edgesM) {
      if (branch.holdsElevation(zeroM + edgeM)) {
        double apparent = branch.apparentRad(zeroM + edgeM);
        double[] derivatives = RowDerivatives.of(camera(), layout, branch, apparent);
        add(new Event(camera().rowAt(apparent), derivatives, 0));
      }
    }
  }

  private void ground(Branch lowest) {
    double row = camera().rowAt(lowest.lowestRad());
    boolean bars = isBar(what(row - 1));
    Optional<GrazingRay> grazing = optics.fan().grazingRay(lowest.lowestRad());
    if (grazing.isPresent() && bars && lowest.sense() == Sense.INVERTED) {
      double[] derivatives = new double[layout.size()];
      for (int i = 0; i < derivatives.length; i++) {
        int index = layout.sensitivityIndex(i);
        derivatives[i] =
            index < 0
                ? RowDerivatives.byCamera(row(lowest.lowestRad()), layout.name(i))
                : row(lowest.lowestRad()).dvdElevation() * grazing.get().byQuantity()[index];
      }
      add(new Event(row, derivatives, RELIEF_PX));
    } else {
      barred.add(new double[] {row - END_PX, row + END_PX});
      add(new Event(row, new double[layout.size()], RELIEF_PX));
    }
  }

  private void add(Event event) {
    if (event.row() >= box.v0() && event.row() <= box.v1()) {
      events.add(event);
    }
  }

  private Camera camera() {
    return optics.camera();
  }

  private RowSensitivity row(double apparentRad) {
    return camera().rowSensitivity(apparentRad, 0);
  }

  /** What is seen in a row: the level's column of a bar, SKY or GROUND. */
  private int what(double row) {
    double apparent = camera().direction(0.5 * (camera().widthPx() - 1), row).elevationRad();
    Optional<Branch> branch = optics.mapping(known.reference().distanceM()).branchAt(apparent);
    if (branch.isEmpty()) {
      return GROUND;
    }
    double heightM =
        branch.get().elevationM(apparent)
            - known.truth().path().ground().elevationM(known.reference().distanceM());
    int bar = -1;
    while (bar + 1 < edgesM.length && edgesM[bar + 1] <= heightM) {
      bar++;
    }
    if (bar < 0 || bar == edgesM.length - 1) {
      return bar < 0 ? GROUND : SKY;
    }
    return bar % 2 == 0 ? DARK : BRIGHT;
  }

  private static boolean isBar(int what) {
    return what >= 0;
  }

  private static double light(int what) {
    return switch (what) {
      case DARK -> KnownSight.DARK;
      case BRIGHT -> KnownSight.BRIGHT;
      case SKY -> KnownSight.SKY;
      default -> KnownSight.GROUND;
    };
  }

  private double[][] information() {
    int[] rows =
        IntStream.rangeClosed((int) Math.ceil(box.v0()), (int) Math.floor(box.v1()))
            .filter(v -> barred.stream().noneMatch(b -> v >= b[0] && v <= b[1]))
            .toArray();
    int columns = (int) Math.floor(box.u1()) - (int) Math.ceil(box.u0()) + 1;
    double alike = alike(columns);
    double rms = known.shimmer().verticalRmsPx();
    double spread = Math.hypot(KnownSight.SENSOR.blurSigmaPx(), rms * Math.sqrt(1 - alike));
    int[] seen = seen();
    double[][] design = new double[rows.length][layout.size() + BAR_LEVELS + seen.length + 1];
    double[][] byRow = new double[rows.length][events.size()];
    double[] light = new double[rows.length];
    for (int i = 0; i < rows.length; i++) {
      fill(rows[i], spread, seen, design[i], byRow[i]);
      light[i] = brightness(rows[i], spread, seen);
    }
    RealMatrix j = new Array2DRowRealMatrix(byRow, false);
    RealMatrix c = j.multiply(shimmer(rms * rms * alike)).multiply(j.transpose());
    for (int i = 0; i < rows.length; i++) {
      double electrons = KnownSight.SENSOR.fullWellElectrons();
      double read = KnownSight.SENSOR.readElectrons();
      c.addToEntry(
          i, i, LUMINANCE_SQUARES * (light[i] + read * read / electrons) / (electrons * columns));
    }
    RealMatrix d = new Array2DRowRealMatrix(used(design), false);
    RealMatrix even = c.add(c.transpose()).scalarMultiply(0.5);
    DecompositionSolver inverse = new CholeskyDecomposition(even).getSolver();
    return leaveOut(d.transpose().multiply(inverse.solve(d)), layout.size());
  }

  /** Without the columns of levels that are nowhere seen. */
  private static double[][] used(double[][] design) {
    int[] filled =
        IntStream.range(0, design[0].length)
            .filter(k -> IntStream.range(0, design.length).anyMatch(i -> design[i][k] != 0))
            .toArray();
    double[][] kept = new double[design.length][];
    for (int i = 0; i < kept.length; i++) {
      double[] row = design[i];
      kept[i] = IntStream.of(filled).mapToDouble(k -> row[k]).toArray();
    }
    return kept;
  }

  /** The Schur complement of all but the first {@code n} quantities. */
  private static double[][] leaveOut(RealMatrix all, int n) {
    int last = all.getRowDimension() - 1;
    RealMatrix cross = all.getSubMatrix(0, n - 1, n, last);
    RealMatrix nuisance = all.getSubMatrix(n, last, n, last);
    return all.getSubMatrix(0, n - 1, 0, n - 1)
        .subtract(
            cross.multiply(
                new CholeskyDecomposition(nuisance, 1e-6, 0).getSolver().solve(cross.transpose())))
        .getData();
  }

  /** What is seen between the events, from the top down. */
  private int[] seen() {
    int[] seen = new int[events.size() + 1];
    for (int s = 0; s < seen.length; s++) {
      double above = s == 0 ? box.v0() : events.get(s - 1).row();
      double below = s == events.size() ? box.v1() : events.get(s).row();
      seen[s] = what(0.5 * (above + below));
    }
    return seen;
  }

  private double brightness(int v, double spread, int[] seen) {
    double sum = light(seen[0]);
    for (int e = 0; e < events.size(); e++) {
      sum += share(v - events.get(e).row(), spread) * (light(seen[e + 1]) - light(seen[e]));
    }
    return sum;
  }

  private void fill(int v, double spread, int[] seen, double[] design, double[] byRow) {
    double along = 2 * (v - box.v0()) / (box.v1() - box.v0()) - 1;
    double above = 1;
    for (int s = 0; s < seen.length; s++) {
      double below = s < events.size() ? share(v - events.get(s).row(), spread) : 0;
      int level = layout.size() + (isBar(seen[s]) ? seen[s] : BAR_LEVELS + s);
      design[level] += above - below;
      if (isBar(seen[s])) {
        design[level + 1] += along * (above - below);
      }
      above = below;
    }
    for (int e = 0; e < events.size(); e++) {
      double x = v - events.get(e).row();
      double step = light(seen[e + 1]) - light(seen[e]);
      byRow[e] =
          -step
              * (NORMAL.cumulativeProbability((x + 0.5) / spread)
                  - NORMAL.cumulativeProbability((x - 0.5) / spread));
      for (int k = 0; k < layout.size(); k++) {
        design[k] += byRow[e] * events.get(e).byQuantity()[k];
      }
      design[design.length - 1] +=
          step * (NORMAL.density((x + 0.5) / spread) - NORMAL.density((x - 0.5) / spread));
    }
  }

  /** Share of what lies below an edge in a pixel whose centre is x px below it. */
  private static double share(double x, double spread) {
    return psi(x + 0.5, spread) - psi(x - 0.5, spread);
  }

  private static double psi(double x, double spread) {
    return x * NORMAL.cumulativeProbability(x / spread) + spread * NORMAL.density(x / spread);
  }

  /** Correlation of the shimmer's mean over the columns with itself: the mean over all pairs. */
  private double alike(int columns) {
    double sum = 0;
    for (int i = 0; i < columns; i++) {
      for (int j = 0; j < columns; j++) {
        double apart = (i - j) / known.shimmer().correlationUPx();
        sum += Math.exp(-0.5 * apart * apart);
      }
    }
    return sum / (columns * columns);
  }

  private RealMatrix shimmer(double variance) {
    double[][] k = new double[events.size()][events.size()];
    for (int i = 0; i < k.length; i++) {
      for (int j = 0; j < k.length; j++) {
        double apart =
            (events.get(i).row() - events.get(j).row()) / known.shimmer().correlationVPx();
        k[i][j] = variance * Math.exp(-0.5 * apart * apart);
      }
      k[i][i] += events.get(i).reliefPx() * events.get(i).reliefPx();
    }
    return new Array2DRowRealMatrix(k, false);
  }
}
