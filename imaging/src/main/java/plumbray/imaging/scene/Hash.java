package plumbray.imaging.scene;

/**
 * Random numbers that depend on a seed and a place alone, so that a picture is the same however the
 * work is shared out.
 *
 * <p>The mixing is that of SplitMix64 (Steele, Lea and Flood 2014).
 */
final class Hash {
  private static final long GOLDEN = 0x9E3779B97F4A7C15L;
  private static final long OTHER = 0xC2B2AE3D27D4EB4FL;
  private static final double UNIT = 0x1.0p-53;

  private Hash() {}

  static long mix(long seed, long i, long j) {
    return mix(mix(seed + GOLDEN * i) + OTHER * j);
  }

  static long mix(long value) {
    long z = value + GOLDEN;
    z = (z ^ (z >>> 30)) * 0xBF58476D1CE4E5B9L;
    z = (z ^ (z >>> 27)) * 0x94D049BB133111EBL;
    return z ^ (z >>> 31);
  }

  /** A number in [0, 1) out of a mixed value. */
  static double unit(long mixed) {
    return (mixed >>> 11) * UNIT;
  }

  /** A draw from the standard normal distribution out of a mixed value (Box and Muller 1958). */
  static double normal(long mixed) {
    double radius = Math.sqrt(-2 * Math.log(1 - unit(mixed)));
    return radius * Math.cos(2 * Math.PI * unit(mix(mixed)));
  }
}
