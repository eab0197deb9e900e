package plumbray.calibration.estimate;

import static java.lang.Math.exp;
import static java.lang.Math.log;
import static java.lang.Math.pow;

/** The models of the reference problems, with derivatives worked out by hand. */
enum RegressionModel {
  MISRA1A {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double decay = exp(-b[1] * x);
      slopes[0] = 1 - decay;
      slopes[1] = b[0] * x * decay;
      return b[0] * (1 - decay);
    }
  },
  BOXBOD {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      return MISRA1A.evaluate(x, b, slopes);
    }
  },
  MISRA1D {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double denominator = 1 + b[1] * x;
      slopes[0] = b[1] * x / denominator;
      slopes[1] = b[0] * x / (denominator * denominator);
      return b[0] * slopes[0];
    }
  },
  DANWOOD {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      slopes[0] = pow(x, b[1]);
      slopes[1] = b[0] * slopes[0] * log(x);
      return b[0] * slopes[0];
    }
  },
  LANCZOS3 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double y = 0;
      for (int k = 0; k < 6; k += 2) {
        slopes[k] = exp(-b[k + 1] * x);
        slopes[k + 1] = -x * b[k] * slopes[k];
        y += b[k] * slopes[k];
      }
      return y;
    }
  },
  ROSZMAN1 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double distance = x - b[3];
      double scale = Math.PI * (distance * distance + b[2] * b[2]);
      slopes[0] = 1;
      slopes[1] = -x;
      slopes[2] = -distance / scale;
      slopes[3] = -b[2] / scale;
      return b[0] - b[1] * x - Math.atan(b[2] / distance) / Math.PI;
    }
  },
  MGH17 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      slopes[0] = 1;
      slopes[1] = exp(-b[3] * x);
      slopes[2] = exp(-b[4] * x);
      slopes[3] = -x * b[1] * slopes[1];
      slopes[4] = -x * b[2] * slopes[2];
      return b[0] + b[1] * slopes[1] + b[2] * slopes[2];
    }
  },
  RAT42 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double growth = exp(b[1] - b[2] * x);
      slopes[0] = 1 / (1 + growth);
      slopes[1] = -b[0] * growth * slopes[0] * slopes[0];
      slopes[2] = -x * slopes[1];
      return b[0] * slopes[0];
    }
  },
  RAT43 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double growth = exp(b[1] - b[2] * x);
      slopes[0] = pow(1 + growth, -1 / b[3]);
      double y = b[0] * slopes[0];
      slopes[1] = -y * growth / (b[3] * (1 + growth));
      slopes[2] = -x * slopes[1];
      slopes[3] = y * log(1 + growth) / (b[3] * b[3]);
      return y;
    }
  },
  MGH09 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double numerator = x * x + x * b[1];
      double denominator = x * x + x * b[2] + b[3];
      slopes[0] = numerator / denominator;
      slopes[1] = b[0] * x / denominator;
      slopes[3] = -b[0] * numerator / (denominator * denominator);
      slopes[2] = x * slopes[3];
      return b[0] * slopes[0];
    }
  },
  MGH10 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double distance = x + b[2];
      slopes[0] = exp(b[1] / distance);
      slopes[1] = b[0] * slopes[0] / distance;
      slopes[2] = -slopes[1] * b[1] / distance;
      return b[0] * slopes[0];
    }
  },
  THURBER {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double numerator = b[0] + x * (b[1] + x * (b[2] + x * b[3]));
      double denominator = 1 + x * (b[4] + x * (b[5] + x * b[6]));
      double y = numerator / denominator;
      for (int k = 0; k < 4; k++) {
        slopes[k] = pow(x, k) / denominator;
      }
      for (int k = 4; k < 7; k++) {
        slopes[k] = -y * pow(x, k - 3) / denominator;
      }
      return y;
    }
  },
  ECKERLE4 {
    @Override
    double evaluate(double x, double[] b, double[] slopes) {
      double offset = (x - b[2]) / b[1];
      slopes[0] = exp(-0.5 * offset * offset) / b[1];
      double y = b[0] * slopes[0];
      slopes[1] = y / b[1] * (offset * offset - 1);
      slopes[2] = y * offset / b[1];
      return y;
    }
  };

  /** The model at x; fills in its derivatives with respect to the parameters. */
  abstract double evaluate(double x, double[] b, double[] slopes);
}
