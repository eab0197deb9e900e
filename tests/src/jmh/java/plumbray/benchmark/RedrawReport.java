package plumbray.benchmark;

import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.Options;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.VerboseMode;

/** Measures redrawing and prints it. Takes some two minutes, of a machine that does nothing else, and 4 GB. */
public final class RedrawReport {
  private RedrawReport() {}

  /** Prints to standard output. */
  public static void main(String[] arguments) throws RunnerException {
    Options options =
        new OptionsBuilder()
            .include(RedrawBenchmark.class.getName() + "\\.")
            .verbosity(VerboseMode.SILENT)
            .build();
    Map<String, Double> times = new TreeMap<>();
    for (RunResult result : new Runner(options).run()) {
      String name = result.getParams().getBenchmark();
      String key =
          name.substring(name.lastIndexOf('.') + 1)
              + " "
              + result.getParams().getParam("bits")
              + " "
              + result.getParams().getParam("interpolation");
      // the fastest run, so that other work on the machine counts little
      times.put(key, result.getPrimaryResult().getStatistics().getMin());
    }
    print(times);
  }

  private static void print(Map<String, Double> times) {
    line("24 megapixels in colour, one thread, fastest run: ms, and share of the native time");
    line("for the same kernel. Ours with the map and the mask, the others with their map ready.");
    line("%-12s %16s %16s %10s", "", "level camera", "rolled, distort.", "native");
    for (String kind : new String[] {"8 CUBIC", "8 LANCZOS", "16 CUBIC", "16 LANCZOS"}) {
      double other = times.get("remapNative " + kind);
      double level = times.get("levelCamera " + kind);
      double rolled = times.get("rolledCamera " + kind);
      line(
          "%-12s %8.0f (%.2f)  %8.0f (%.2f)  %9.0f",
          kind, level, level / other, rolled, rolled / other, other);
    }
    line("Bicubic in Java, 8 bit: %.0f", times.get("remapBicubic null null"));
  }

  private static void line(String format, Object... values) {
    System.out.printf(Locale.ROOT, format + "%n", values);
  }
}
