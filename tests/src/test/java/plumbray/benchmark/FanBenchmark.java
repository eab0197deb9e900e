package plumbray.benchmark;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import plumbray.raymodel.air.AirColumn;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.TabulatedMedium;

/** 400 rays over a kilometre with derivatives by five parameters, all good to a micrometre. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
public class FanBenchmark {

  /** Worst error of an end height, m. */
  static final double ALLOWED_M = 1e-6;

  static final int PARAMETERS = 5;

  /** Local error of the reference's steps, m. */
  private static final double REFERENCE_M = 1e-13;

  /** Scale height of the profile, m. */
  @Param({"0.03", "0.1", "0.3"})
  public double scaleHeightM;

  private Fan fan;

  /** The ways to trace one fan, and the tolerance that each needs. */
  record Fan(Way own, Way library, Way libraryOnAir) {

    record Way(Tracing tracing, double tolerance, double worstM) {
      static Way of(Tracing tracing, double[] truthM) {
        double tolerance = tracing.loosest(truthM, ALLOWED_M);
        return new Way(tracing, tolerance, tracing.worstM(truthM, tolerance));
      }

      double[] run() {
        return tracing.heightsM(tolerance);
      }
    }

    /** The reference takes the air itself, without a table, in very short steps. */
    static Fan over(double scaleHeightM) {
      AirColumn air = new HotGround(scaleHeightM).air(PARAMETERS);
      double[] truthM = new OwnRays(air).heightsM(REFERENCE_M);
      Medium table = new TabulatedMedium(air);
      return new Fan(
          Way.of(new OwnRays(table), truthM),
          Way.of(new LibraryRays(table), truthM),
          Way.of(new LibraryRays(air), truthM));
    }
  }

  /** Finds the tolerances. */
  @Setup
  public void choose() {
    fan = Fan.over(scaleHeightM);
  }

  /** The program's tracer on tabulated air. */
  @Benchmark
  public double[] own() {
    return fan.own().run();
  }

  /** The library's integrator on the same table. */
  @Benchmark
  public double[] library() {
    return fan.library().run();
  }

  /** The library's integrator on the air itself. */
  @Benchmark
  public double[] libraryOnAir() {
    return fan.libraryOnAir().run();
  }
}
