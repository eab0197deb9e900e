package plumbray.benchmark;

import boofcv.alg.distort.ImageDistort;
import boofcv.alg.interpolate.InterpolationType;
import boofcv.factory.distort.FactoryDistort;
import boofcv.struct.border.BorderType;
import boofcv.struct.distort.PixelTransform;
import boofcv.struct.image.GrayU8;
import boofcv.struct.image.ImageType;
import boofcv.struct.image.Planar;
import georegression.struct.point.Point2D_F32;
import java.util.concurrent.TimeUnit;
import nu.pattern.OpenCV;
import org.opencv.core.Core;
import org.opencv.core.CvType;
import org.opencv.core.Mat;
import org.opencv.imgproc.Imgproc;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.openjdk.jmh.infra.BenchmarkParams;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.rectify.Interpolation;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.Rectifier;
import plumbray.imaging.rectify.RectifyMap;
import plumbray.imaging.rectify.RedrawOptions;

/**
 * Redrawing 24 megapixels in colour, one thread each: a level camera, whose map depends on the row
 * alone, and a rolled one that distorts; beside general remapping by other libraries. Ours includes
 * the map and the mask; the others find their map ready.
 */
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 1, time = 2)
@Measurement(iterations = 3, time = 1)
@Fork(value = 1, jvmArgs = "-Xmx4g")
public class RedrawBenchmark {
  /** Ours. */
  @State(Scope.Benchmark)
  public static class Ours {
    /** Bits per sample. */
    @Param({"8", "16"})
    public int bits;

    /** The kernel. */
    @Param({"CUBIC", "LANCZOS"})
    public Interpolation interpolation;

    Photo photo;
    RectifyMap map;

    /** Draws the photo and makes the map that is wanted. */
    @Setup
    public void prepare(BenchmarkParams benchmark) {
      PhotoShape shape = new PhotoShape(Redrawn.WIDTH, Redrawn.HEIGHT, Redrawn.CHANNELS, bits);
      PhotoBuilder builder = new PhotoBuilder(shape);
      float[] row = new float[shape.rowSamples()];
      for (int y = 0; y < Redrawn.HEIGHT; y++) {
        Redrawn.row(y, shape.highestSample(), row);
        builder.row(y, row);
      }
      photo = builder.build();
      map = Redrawn.map(benchmark.getBenchmark().endsWith("rolledCamera"));
    }
  }

  /** Native remapping. */
  @State(Scope.Benchmark)
  public static class Native {
    /** Bits per sample. */
    @Param({"8", "16"})
    public int bits;

    /** The kernel: 4 and 8 pixels each way. */
    @Param({"CUBIC", "LANCZOS"})
    public Interpolation interpolation;

    private final Mat u = new Mat(Redrawn.HEIGHT, Redrawn.WIDTH, CvType.CV_32FC1);
    private final Mat v = new Mat(Redrawn.HEIGHT, Redrawn.WIDTH, CvType.CV_32FC1);
    private Mat photo;
    private Mat drawn;

    static {
      OpenCV.loadLocally();
    }

    /** Copies map and photo over. */
    @Setup
    public void prepare() {
      Core.setNumThreads(1);
      float[][] places = Redrawn.places();
      u.put(0, 0, places[0]);
      v.put(0, 0, places[1]);
      int type = bits == 8 ? CvType.CV_8UC3 : CvType.CV_16UC3;
      photo = new Mat(Redrawn.HEIGHT, Redrawn.WIDTH, type);
      drawn = new Mat(Redrawn.HEIGHT, Redrawn.WIDTH, type);
      float[] row = new float[Redrawn.WIDTH * Redrawn.CHANNELS];
      for (int y = 0; y < Redrawn.HEIGHT; y++) {
        Redrawn.row(y, (1 << bits) - 1, row);
        put(y, row);
      }
    }

    private void put(int y, float[] row) {
      short[] shorts = new short[row.length];
      byte[] bytes = new byte[row.length];
      for (int i = 0; i < row.length; i++) {
        shorts[i] = (short) (int) row[i];
        bytes[i] = (byte) (int) row[i];
      }
      if (bits == 8) {
        photo.put(y, 0, bytes);
      } else {
        photo.put(y, 0, shorts);
      }
    }

    Mat remap() {
      int kernel =
          interpolation == Interpolation.CUBIC ? Imgproc.INTER_CUBIC : Imgproc.INTER_LANCZOS4;
      Imgproc.remap(photo, drawn, u, v, kernel, Core.BORDER_REPLICATE);
      return drawn;
    }
  }

  /** Dense bicubic distortion in Java, which knows 8 bit alone. */
  @State(Scope.Benchmark)
  public static class Bicubic {
    private final Planar<GrayU8> photo =
        new Planar<>(GrayU8.class, Redrawn.WIDTH, Redrawn.HEIGHT, Redrawn.CHANNELS);
    private final Planar<GrayU8> drawn =
        new Planar<>(GrayU8.class, Redrawn.WIDTH, Redrawn.HEIGHT, Redrawn.CHANNELS);
    private ImageDistort<Planar<GrayU8>, Planar<GrayU8>> distort;

    /** Copies map and photo over. */
    @Setup
    public void prepare() {
      float[][] places = Redrawn.places();
      ImageType<Planar<GrayU8>> type = ImageType.pl(Redrawn.CHANNELS, GrayU8.class);
      distort =
          FactoryDistort.distort(
              false, InterpolationType.BICUBIC, BorderType.EXTENDED, type, type);
      distort.setModel(
          new PixelTransform<Point2D_F32>() {
            @Override
            public void compute(int x, int y, Point2D_F32 output) {
              output.x = places[0][y * Redrawn.WIDTH + x];
              output.y = places[1][y * Redrawn.WIDTH + x];
            }

            @Override
            public PixelTransform<Point2D_F32> copyConcurrent() {
              return this;
            }
          });
      float[] row = new float[Redrawn.WIDTH * Redrawn.CHANNELS];
      for (int y = 0; y < Redrawn.HEIGHT; y++) {
        Redrawn.row(y, 255, row);
        for (int i = 0; i < row.length; i++) {
          photo.getBand(i % Redrawn.CHANNELS).set(i / Redrawn.CHANNELS, y, (int) row[i]);
        }
      }
    }

    Planar<GrayU8> distort() {
      distort.apply(photo, drawn);
      return drawn;
    }
  }

  /** A level camera. */
  @Benchmark
  public Rectified levelCamera(Ours ours) {
    RedrawOptions options = new RedrawOptions(ours.interpolation, false);
    return Rectifier.rectify(ours.photo, ours.map, options, 1);
  }

  /** A rolled camera that distorts. */
  @Benchmark
  public Rectified rolledCamera(Ours ours) {
    RedrawOptions options = new RedrawOptions(ours.interpolation, false);
    return Rectifier.rectify(ours.photo, ours.map, options, 1);
  }

  /** General remapping in native code. */
  @Benchmark
  public Mat remapNative(Native other) {
    return other.remap();
  }

  /** General bicubic remapping in Java. */
  @Benchmark
  public Planar<GrayU8> remapBicubic(Bicubic other) {
    return other.distort();
  }
}
