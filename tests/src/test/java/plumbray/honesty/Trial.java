package plumbray.honesty;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.TemperatureRow;
import plumbray.imaging.measure.HeightReader;
import plumbray.imaging.measure.HeightReading;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.Sense;

/**
 * Many fits of one sight, each of a photo with noise and shimmer of its own, held against the truth
 * and the Cramer-Rao bound.
 *
 * <p>No unbiased estimate has a covariance below the inverse of Fisher's information, to which
 * Gaussian priors that the sight gives add their precision; a function g of the quantities has the
 * variance (dg)^T C (dg) at least (Kay 1993, equations 3.20 and 3.30, from memory). The weak priors
 * that a fit puts on free quantities of the profile are not counted: where the photo leaves much
 * open, errors may lie below the bound.
 */
final class Trial {
  private static final double[] HEIGHTS_M = {0.3, 0.7, 1.3, 2.1, 2.9};
  private static final int[] TEMPERATURE_ROWS = {0, 17, 33, 44, 54};

  private final KnownSight known;
  private final Estimates truth;
  private final List<TemperatureRow> trueAir;
  private final List<Tally> tallies = new ArrayList<>();
  private final List<double[]> heights = new ArrayList<>();
  private final int[] verdicts = new int[FitStatus.values().length];

  private Trial(KnownSight known) {
    this.known = known;
    truth = Estimates.of(known.names(), known.trueValues(), bound(known));
    trueAir = TemperatureRow.of(known.truth(), truth);
    for (int k = 0; k < truth.names().size(); k++) {
      tallies.add(new Tally(truth.names().get(k), truth.sigmas()[k]));
    }
    heights();
    for (int i : TEMPERATURE_ROWS) {
      TemperatureRow row = trueAir.get(i);
      tallies.add(new Tally(name("T at %.3f m", row.heightM()), row.sigmaK()));
    }
  }

  /** Fits so many photos, with seeds that count on from {@code firstSeed}. */
  static Trial of(KnownSight known, int draws, long firstSeed) {
    Trial trial = new Trial(known);
    IntStream.range(0, draws)
        .parallel()
        .mapToObj(i -> known.fit(firstSeed + i))
        .toList()
        .forEach(trial::add);
    return trial;
  }

  private static String name(String format, double heightM) {
    return String.format(Locale.ROOT, format, heightM);
  }

  /** The bound as a covariance. */
  private static double[][] bound(KnownSight known) {
    RealMatrix information =
        new Array2DRowRealMatrix(
            known.ofPoints() ? PointBound.information(known) : StripBound.information(known));
    List<Parameter> parameters = SightParameters.of(known.asked()).parameters();
    for (int k = 0; k < parameters.size(); k++) {
      if (parameters.get(k).hasPrior()) {
        double sigma = parameters.get(k).sigma();
        information.addToEntry(k, k, 1 / (sigma * sigma));
      }
    }
    return scaledInverse(information).getData();
  }

  /** Inverse of a matrix whose quantities differ widely in size. */
  private static RealMatrix scaledInverse(RealMatrix information) {
    int n = information.getRowDimension();
    double[] scale = new double[n];
    for (int i = 0; i < n; i++) {
      scale[i] = 1 / Math.sqrt(information.getEntry(i, i));
    }
    RealMatrix s = MatrixUtils.createRealDiagonalMatrix(scale);
    return s.multiply(MatrixUtils.inverse(s.multiply(information).multiply(s))).multiply(s);
  }

  /** Chooses the rows in which heights will be read: where the upright image truly shows them. */
  private void heights() {
    SightOptics optics = SightOptics.of(known.truth());
    HeightReader reader = reader(known.truth(), truth);
    for (double heightM : HEIGHTS_M) {
      for (Branch branch : optics.mapping(known.reference().distanceM()).branches()) {
        if (branch.sense() == Sense.UPRIGHT && branch.holdsElevation(heightM + known.groundM())) {
          double row = optics.camera().rowAt(branch.apparentRad(heightM + known.groundM()));
          heights.add(new double[] {heightM, row});
          tallies.add(new Tally(name("height %.1f m", heightM), read(reader, row).sigmaM()));
        }
      }
    }
  }

  private HeightReader reader(Sight sight, Estimates estimates) {
    return new HeightReader(sight, estimates, new double[0]);
  }

  private HeightReading read(HeightReader reader, double row) {
    double middle = 0.5 * (known.asked().camera().widthPx() - 1);
    return reader.read(middle, row, known.reference().distanceM(), 0);
  }

  private void add(FitResult result) {
    verdicts[result.status().ordinal()]++;
    if (result.status() == FitStatus.FAILED) {
      return;
    }
    Estimates estimates = result.estimates();
    int at = 0;
    for (int k = 0; k < estimates.names().size(); k++) {
      tallies.get(at++).add(estimates.values()[k] - known.trueValues()[k], estimates.sigmas()[k]);
    }
    HeightReader reader = reader(result.sight(), estimates);
    for (double[] height : heights) {
      HeightReading reading = read(reader, height[1]);
      tallies.get(at++).add(reading.heightM() - height[0], reading.sigmaM());
    }
    List<TemperatureRow> air = TemperatureRow.of(result.sight(), estimates);
    for (int i : TEMPERATURE_ROWS) {
      tallies
          .get(at++)
          .add(air.get(i).temperatureK() - trueAir.get(i).temperatureK(), air.get(i).sigmaK());
    }
  }

  KnownSight known() {
    return known;
  }

  /** What was said of each quantity, height and temperature. */
  List<Tally> tallies() {
    return List.copyOf(tallies);
  }

  /** How many fits came to a verdict. */
  int count(FitStatus status) {
    return verdicts[status.ordinal()];
  }
}
