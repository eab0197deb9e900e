package plumbray.imaging.light;

import java.nio.ByteBuffer;

/** How light follows from an encoded value, both from 0 to 1. */
@FunctionalInterface
interface ToneCurve {
  /**
   * The curve of sRGB: L = V / 12.92 up to V = 0.04045, above it L = ((V + 0.055) / 1.055)^2.4 (IEC
   * 61966-2-1:1999).
   */
  ToneCurve SRGB =
      encoded -> encoded <= 0.04045 ? encoded / 12.92 : Math.pow((encoded + 0.055) / 1.055, 2.4);

  /** Light of an encoded value. */
  double light(double encoded);

  /**
   * The curve of a profile's tag: type curv (ICC.1:2010, 10.5) or para (10.15).
   *
   * @param tag the tag's bytes
   * @throws IllegalArgumentException where they are none of these
   */
  static ToneCurve ofTag(byte[] tag) {
    ByteBuffer bytes = ByteBuffer.wrap(tag);
    if (tag.length >= 12 && bytes.getInt(0) == 0x63757276) {
      return ofTable(bytes);
    }
    if (tag.length >= 16 && bytes.getInt(0) == 0x70617261) {
      return ofFormula(bytes);
    }
    throw new IllegalArgumentException("a tone curve of an unknown type");
  }

  /** No entry: light is the value; one: a power in 1/256; more: a table over equal steps. */
  private static ToneCurve ofTable(ByteBuffer tag) {
    int count = tag.getInt(8);
    if (count < 0 || tag.limit() < 12 + 2L * count) {
      throw new IllegalArgumentException("a tone curve cut short");
    }
    if (count == 0) {
      return encoded -> encoded;
    }
    if (count == 1) {
      double power = (tag.getShort(12) & 0xffff) / 256.0;
      return encoded -> Math.pow(encoded, power);
    }
    double[] table = new double[count];
    for (int i = 0; i < count; i++) {
      table[i] = (tag.getShort(12 + 2 * i) & 0xffff) / 65535.0;
    }
    return encoded -> between(table, encoded);
  }

  private static double between(double[] table, double encoded) {
    double place = Math.max(0, Math.min(1, encoded)) * (table.length - 1);
    int below = Math.min(table.length - 2, (int) place);
    return table[below] + (place - below) * (table[below + 1] - table[below]);
  }

  /** Types 0 to 4 with their numbers g, a, b, c, d, e, f in 1/65536 (ICC.1:2010, table 65). */
  private static ToneCurve ofFormula(ByteBuffer tag) {
    int type = tag.getShort(8);
    int[] counts = {1, 3, 4, 5, 7};
    if (type < 0 || type >= counts.length || tag.limit() < 12 + 4 * counts[type]) {
      throw new IllegalArgumentException("a tone curve of an unknown form");
    }
    double[] p = new double[7];
    for (int i = 0; i < counts[type]; i++) {
      p[i] = tag.getInt(12 + 4 * i) / 65536.0;
    }
    return switch (type) {
      case 0 -> x -> Math.pow(x, p[0]);
      case 1 -> x -> x >= -p[2] / p[1] ? power(p, x) : 0;
      case 2 -> x -> x >= -p[2] / p[1] ? power(p, x) + p[3] : p[3];
      case 3 -> x -> x >= p[4] ? power(p, x) : p[3] * x;
      default -> x -> x >= p[4] ? power(p, x) + p[5] : p[3] * x + p[6];
    };
  }

  private static double power(double[] p, double x) {
    return Math.pow(Math.max(0, p[1] * x + p[2]), p[0]);
  }
}
