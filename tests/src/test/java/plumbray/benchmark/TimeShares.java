package plumbray.benchmark;

import java.util.Arrays;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.ray.Medium;

/**
 * Where the time of one mapping goes.
 *
 * @param totalMs the whole mapping, ms
 * @param airMs of it, for the air at every height where the rays asked for it
 * @param integrationMs for the rays besides
 * @param placingMs for choosing where rays go, and the rest: what is left when as many questions to
 *     the air, asked by evenly spaced rays, are taken from the whole
 */
record TimeShares(double totalMs, double airMs, double integrationMs, double placingMs) {

  private static final int REPEATS = 400;

  /** Measures; the shortest of many runs counts. */
  static TimeShares of(PictureMapping mapping) {
    Recorder fanAir = new Recorder(mapping.air());
    RayFan fan = recorded(mapping, fanAir).trace();
    Recorder plainAir = new Recorder(mapping.air());
    recorded(mapping, plainAir).again(fan);
    double total = shortestMs(mapping::trace);
    double air = shortestMs(() -> fanAir.replay());
    double tracing = shortestMs(() -> mapping.again(fan)) * fanAir.count / plainAir.count;
    return new TimeShares(total, air, tracing - air, Math.max(0.0, total - tracing));
  }

  private static PictureMapping recorded(PictureMapping mapping, Recorder recorder) {
    return new PictureMapping(recorder, mapping.rows(), mapping.distancesM());
  }

  private static double shortestMs(Runnable work) {
    long shortest = Long.MAX_VALUE;
    for (int i = 0; i < REPEATS; i++) {
      long start = System.nanoTime();
      work.run();
      shortest = Math.min(shortest, System.nanoTime() - start);
    }
    return shortest / 1e6;
  }

  /** Keeps the heights at which the air was asked for. */
  private static final class Recorder implements Medium {

    private final Medium air;
    private double[] heightsM = new double[1024];
    private int count;
    private double sink;

    Recorder(Medium air) {
      this.air = air;
    }

    @Override
    public int parameterCount() {
      return air.parameterCount();
    }

    @Override
    public double verticalScaleM(double heightM) {
      return air.verticalScaleM(heightM);
    }

    @Override
    public void evaluate(double heightM, double[] out) {
      if (count == heightsM.length) {
        heightsM = Arrays.copyOf(heightsM, 2 * count);
      }
      heightsM[count++] = heightM;
      air.evaluate(heightM, out);
    }

    void replay() {
      double[] out = new double[3 + 2 * air.parameterCount()];
      double sum = 0.0;
      for (int i = 0; i < count; i++) {
        air.evaluate(heightsM[i], out);
        sum += out[1];
      }
      sink = sum;
    }

    @Override
    public String toString() {
      return "asked " + count + " times, " + sink;
    }
  }
}
