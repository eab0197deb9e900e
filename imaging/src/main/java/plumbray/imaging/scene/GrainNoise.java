package plumbray.imaging.scene;

/**
 * The procedural texture of uneven surfaces: a sum of octaves of smoothly interpolated lattice
 * noise, each octave half as large and half as coarse as the last.
 *
 * <p>Octaves that are finer than the sample's footprint are faded to their mean, so that a sample
 * stands for the mean over its footprint and nothing aliases.
 */
final class GrainNoise {
  private static final int OCTAVES = 5;

  /** Brings the sum of the octaves to a standard deviation of about one half. */
  private static final double SCALE = 1.15;

  private final long seed;

  GrainNoise(long seed) {
    this.seed = seed;
  }

  /**
   * The factor on the reflectance at a point of a surface, not below 0.
   *
   * @param grain the surface's unevenness
   * @param place {across (m), along (m), footprint across (m), footprint along (m)}
   */
  double factor(Grain grain, double[] place) {
    double x = place[0] / grain.acrossM();
    double y = place[1] / grain.alongM();
    double footprint = Math.max(place[2] / grain.acrossM(), place[3] / grain.alongM());
    double sum = 0;
    double amplitude = 1;
    for (int octave = 0; octave < OCTAVES; octave++) {
      double kept = Math.exp(-footprint * footprint);
      if (kept < 1e-3) {
        break;
      }
      sum += amplitude * kept * lattice(octave, x, y);
      amplitude *= 0.5;
      x = 2 * x + 0.37;
      y = 2 * y + 0.71;
      footprint *= 2;
    }
    return Math.max(0, 1 + grain.contrast() * SCALE * sum);
  }

  private double lattice(int octave, double x, double y) {
    long i = (long) Math.floor(x);
    long j = (long) Math.floor(y);
    double fx = ease(x - i);
    double fy = ease(y - j);
    long layer = seed + octave;
    double bottom = (1 - fx) * node(layer, i, j) + fx * node(layer, i + 1, j);
    double top = (1 - fx) * node(layer, i, j + 1) + fx * node(layer, i + 1, j + 1);
    return (1 - fy) * bottom + fy * top;
  }

  private static double ease(double t) {
    return t * t * t * (t * (6 * t - 15) + 10);
  }

  private static double node(long layer, long i, long j) {
    return 2 * Hash.unit(Hash.mix(layer, i, j)) - 1;
  }
}
