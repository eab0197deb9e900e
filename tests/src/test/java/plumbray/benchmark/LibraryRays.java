package plumbray.benchmark;

import java.util.Arrays;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;

/**
 * The fan by Dormand and Prince's pair of orders 8, 5 and 3 as a general-purpose library has it:
 * dy/dx = (1 + y/R) t, dt/dx = (1 + t^2) [1/R + (1 + y/R) L'(y)], L = ln n, with the derivatives of
 * y and t by each parameter. The error of y and t alone chooses the steps, as with the program's
 * tracer.
 */
record LibraryRays(Medium air) implements Tracing {

  /** Longest step: the whole way; shorter ones make it slower. */
  private static final double LONGEST_M = HotGround.REACH_M;

  private static final double SHORTEST_M = 1e-9;

  /** Tolerance of what shall not choose the steps. */
  private static final double ANY = 1e10;

  @Override
  public double[] heightsM(double tolerance) {
    Equations equations = new Equations(air);
    double[] absolute = new double[equations.getDimension()];
    Arrays.fill(absolute, ANY);
    absolute[0] = tolerance;
    absolute[1] = tolerance;
    DormandPrince853Integrator integrator =
        new DormandPrince853Integrator(
            SHORTEST_M, LONGEST_M, absolute, new double[absolute.length]);
    double[] heights = new double[HotGround.RAYS];
    double[] state = new double[absolute.length];
    for (int i = 0; i < heights.length; i++) {
      Arrays.fill(state, 0.0);
      state[0] = HotGround.CAMERA_M;
      state[1] = Math.tan(HotGround.angleRad(i));
      integrator.integrate(equations, 0.0, state, HotGround.REACH_M, state);
      heights[i] = state[0];
    }
    return heights;
  }

  private static final class Equations implements FirstOrderDifferentialEquations {

    private static final double CURVATURE = 1.0 / SightPath.MEAN_EARTH_RADIUS_M;

    private final Medium air;
    private final double[] log;

    Equations(Medium air) {
      this.air = air;
      log = new double[3 + 2 * air.parameterCount()];
    }

    @Override
    public int getDimension() {
      return 2 + 2 * air.parameterCount();
    }

    @Override
    public void computeDerivatives(double x, double[] state, double[] rates) {
      air.evaluate(state[0], log);
      double t = state[1];
      double b = 1.0 + state[0] * CURVATURE;
      double square = 1.0 + t * t;
      double bend = CURVATURE + b * log[1];
      double bendByY = log[1] * CURVATURE + b * log[2];
      rates[0] = b * t;
      rates[1] = square * bend;
      for (int k = 0; k < air.parameterCount(); k++) {
        double y = state[2 + 2 * k];
        double slope = state[3 + 2 * k];
        rates[2 + 2 * k] = y * CURVATURE * t + b * slope;
        rates[3 + 2 * k] = 2.0 * t * slope * bend + square * (bendByY * y + b * log[4 + 2 * k]);
      }
    }
  }
}
