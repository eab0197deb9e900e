package plumbray.benchmark;

import java.util.concurrent.TimeUnit;
import java.util.stream.IntStream;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import plumbray.raymodel.ray.TabulatedMedium;

/** What a mapping costs as one thing about it grows. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
public class CostBenchmark {

  /** What grows, and to how much. */
  @Param({
    "distanceM 250",
    "distanceM 1000",
    "distanceM 4000",
    "parameters 0",
    "parameters 3",
    "parameters 6",
    "distances 1",
    "distances 4",
    "distances 16",
    "rows 1000",
    "rows 4000",
    "rows 16000"
  })
  public String grown;

  private PictureMapping mapping;

  /** Makes the sight. */
  @Setup
  public void choose() {
    mapping = mapping(grown);
  }

  static PictureMapping mapping(String grown) {
    String[] words = grown.split(" ");
    int much = Integer.parseInt(words[1]);
    int parameters = words[0].equals("parameters") ? much : 0;
    int distances = words[0].equals("distances") ? much : 1;
    double reachM = words[0].equals("distanceM") ? much : HotGround.REACH_M;
    return new PictureMapping(
        new TabulatedMedium(new HotGround(0.1).air(parameters)),
        words[0].equals("rows") ? much : 4000,
        IntStream.rangeClosed(1, distances).mapToDouble(i -> reachM * i / distances).toArray());
  }

  /** Traces the mapping. */
  @Benchmark
  public Object mapping() {
    return mapping.trace();
  }

  /** Traces the mapping and reads it at every row. */
  @Benchmark
  public double mappingAndRows() {
    return mapping.rows(mapping.trace());
  }
}
