package plumbray.calibration.estimate;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import plumbray.calibration.quantity.Parameter;

/** A nonlinear regression problem with certified results, read from a resource file. */
final class ReferenceProblem {
  private final List<String> lines;
  private final List<double[]> data = new ArrayList<>();

  ReferenceProblem(String name) {
    try (InputStream in = ReferenceProblem.class.getResourceAsStream(name + ".txt")) {
      lines = new String(in.readAllBytes(), StandardCharsets.UTF_8).lines().toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    for (String line : lines) {
      if (line.startsWith("data ")) {
        data.add(numbers(line));
      }
    }
  }

  double[] row(String key) {
    return lines.stream()
        .filter(line -> line.startsWith(key + " "))
        .map(ReferenceProblem::numbers)
        .findFirst()
        .orElseThrow();
  }

  private static double[] numbers(String line) {
    return Arrays.stream(line.split(" ")).skip(1).mapToDouble(Double::parseDouble).toArray();
  }

  int count() {
    return data.size();
  }

  /** Starts at the given vector, without bounds and priors, scaled by the start itself. */
  Problem problem(RegressionModel model, double[] start) {
    List<Parameter> parameters =
        IntStream.range(0, start.length)
            .mapToObj(
                k ->
                    new Parameter(
                        "b" + (k + 1),
                        start[k],
                        Double.NaN,
                        Double.NEGATIVE_INFINITY,
                        Double.POSITIVE_INFINITY,
                        Math.abs(start[k])))
            .toList();
    return Problem.of(parameters, new Regression(model), Loss.NONE);
  }

  /** Residuals of the data, not whitened: the noise is to be estimated from them. */
  private final class Regression implements Observation {
    private final RegressionModel model;

    Regression(RegressionModel model) {
      this.model = model;
    }

    @Override
    public int count() {
      return data.size();
    }

    @Override
    public void evaluate(double[] b, double[] residuals, double[][] jacobian) {
      double[] slopes = new double[b.length];
      for (int i = 0; i < residuals.length; i++) {
        residuals[i] = model.evaluate(data.get(i)[1], b, slopes) - data.get(i)[0];
        if (jacobian != null) {
          System.arraycopy(slopes, 0, jacobian[i], 0, b.length);
        }
      }
    }
  }
}
