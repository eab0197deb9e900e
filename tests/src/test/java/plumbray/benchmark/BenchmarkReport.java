package plumbray.benchmark;

import java.util.Collection;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.Options;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;
import org.openjdk.jmh.runner.options.VerboseMode;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.ray.TabulatedMedium;

/**
 * Measures everything and prints it. Takes some two minutes of a machine that does nothing else.
 */
public final class BenchmarkReport {

  /** The faster runs are taken, so that other work on the machine counts little. */
  private static final double FASTEST_PERCENT = 10.0;

  private static final double[] SCALES_M = {0.03, 0.1, 0.3};

  private BenchmarkReport() {}

  /** Prints to standard output. */
  public static void main(String[] arguments) throws RunnerException {
    fans();
    costs();
    raysNeeded();
    shares();
  }

  private static void print(String format, Object... values) {
    System.out.printf(Locale.ROOT, format + "%n", values);
  }

  private static void fans() throws RunnerException {
    print("400 rays over 1 km through an exponential profile of 25 K, with derivatives by 5");
    print("parameters, every height good to 1e-6 m. Fast ms (worst error, m), and how many times");
    print("as long the library takes: Dormand-Prince 8(5,3) with the same 12 equations, on the");
    print("same table of the air, and on the air itself.");
    print("%-8s %-18s %-25s %-25s", "scale m", "own", "library", "library, no table");
    Map<String, Double> times = run(FanBenchmark.class, "scaleHeightM");
    for (double scaleM : SCALES_M) {
      FanBenchmark.Fan fan = FanBenchmark.Fan.over(scaleM);
      double own = times.get("own " + scaleM);
      double library = times.get("library " + scaleM);
      double onAir = times.get("libraryOnAir " + scaleM);
      print(
          "%-8s %6.2f (%.0e) %9.2f (%.0e) x%4.1f %9.2f (%.0e) x%4.1f",
          scaleM,
          own,
          fan.own().worstM(),
          library,
          fan.library().worstM(),
          library / own,
          onAir,
          fan.libraryOnAir().worstM(),
          onAir / own);
    }
  }

  private static void costs() throws RunnerException {
    print("");
    print("A mapping good to 0.01 px, 4000 rows, 1 km, no derivatives, unless said otherwise.");
    print("%-16s %5s %10s %20s", "", "rays", "tracing ms", "and reading rows ms");
    Map<String, Double> times = run(CostBenchmark.class, "grown");
    times.keySet().stream()
        .filter(key -> key.startsWith("mapping "))
        .map(key -> key.substring("mapping ".length()))
        .forEach(
            grown ->
                print(
                    "%-16s %5d %10.3f %20.3f",
                    grown,
                    CostBenchmark.mapping(grown).trace().rayCount(),
                    times.get("mapping " + grown),
                    times.get("mappingAndRows " + grown)));
  }

  private static void raysNeeded() {
    print("");
    print(
        "Rays kept for a mapping good to 0.01 px (4000 rows, 1 km), those to the ground among them");
    for (double scaleM : SCALES_M) {
      RayFan fan = picture(scaleM, 0).trace();
      print("scale %-5s %4d", scaleM, fan.rayCount());
    }
  }

  private static PictureMapping picture(double scaleM, int parameters) {
    return new PictureMapping(
        new TabulatedMedium(new HotGround(scaleM).air(parameters)),
        4000,
        new double[] {HotGround.REACH_M});
  }

  private static void shares() {
    print("");
    print("Where the time of a mapping goes (scale 0.1 m, shortest of many runs), ms");
    print("%-14s %6s %6s %12s %8s", "", "all", "air", "integration", "placing");
    for (int parameters : new int[] {0, FanBenchmark.PARAMETERS}) {
      TimeShares shares = TimeShares.of(picture(0.1, parameters));
      print(
          "%-14s %6.3f %6.3f %12.3f %8.3f",
          parameters + " parameters",
          shares.totalMs(),
          shares.airMs(),
          shares.integrationMs(),
          shares.placingMs());
    }
  }

  /** Times in ms by the benchmark's name and its parameter. */
  private static Map<String, Double> run(Class<?> benchmarks, String parameter)
      throws RunnerException {
    Options options =
        new OptionsBuilder()
            .include(benchmarks.getName() + "\\.")
            .forks(1)
            .warmupIterations(1)
            .warmupTime(TimeValue.milliseconds(1000))
            .measurementIterations(3)
            .measurementTime(TimeValue.milliseconds(300))
            .timeUnit(TimeUnit.MILLISECONDS)
            .verbosity(VerboseMode.SILENT)
            .build();
    Collection<RunResult> results = new Runner(options).run();
    Map<String, Double> times = new TreeMap<>();
    for (RunResult result : results) {
      String name = result.getParams().getBenchmark();
      times.put(
          name.substring(name.lastIndexOf('.') + 1) + " " + result.getParams().getParam(parameter),
          result.getPrimaryResult().getStatistics().getPercentile(FASTEST_PERCENT));
    }
    return times;
  }
}
