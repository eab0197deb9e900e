package plumbray.imaging.light;

import java.awt.color.ColorSpace;
import java.awt.color.ICC_Profile;
import java.nio.ByteBuffer;

/** ICC profiles: the runtime's own, with tone curves put in. */
public final class SampleProfiles {
  private SampleProfiles() {}

  /** Grey with this tone curve. */
  public static byte[] grey(byte[] curve) {
    ICC_Profile profile = copy(ColorSpace.CS_GRAY);
    profile.setData(ICC_Profile.icSigGrayTRCTag, curve);
    return profile.getData();
  }

  /** The primaries of sRGB with this tone curve for each. */
  public static byte[] colour(byte[] curve) {
    ICC_Profile profile = copy(ColorSpace.CS_sRGB);
    profile.setData(ICC_Profile.icSigRedTRCTag, curve);
    profile.setData(ICC_Profile.icSigGreenTRCTag, curve);
    profile.setData(ICC_Profile.icSigBlueTRCTag, curve);
    return profile.getData();
  }

  private static ICC_Profile copy(int space) {
    return ICC_Profile.getInstance(ICC_Profile.getInstance(space).getData());
  }

  /** Light is the value: type curv without entries (ICC.1:2010, 10.5). */
  public static byte[] straight() {
    return ByteBuffer.allocate(12).putInt(0x63757276).array();
  }

  /** A power, in 1/256: type curv with one entry. */
  public static byte[] power(double power) {
    return ByteBuffer.allocate(14)
        .putInt(0x63757276)
        .putInt(0)
        .putInt(1)
        .putShort((short) Math.round(256 * power))
        .array();
  }

  /** A table of 16 bit entries: type curv. */
  static byte[] table(int... entries) {
    ByteBuffer tag = ByteBuffer.allocate(12 + 2 * entries.length);
    tag.putInt(0x63757276).putInt(0).putInt(entries.length);
    for (int entry : entries) {
      tag.putShort((short) entry);
    }
    return tag.array();
  }

  /** A formula with its numbers: type para (ICC.1:2010, 10.15). */
  static byte[] formula(int type, double... numbers) {
    ByteBuffer tag = ByteBuffer.allocate(12 + 4 * numbers.length);
    tag.putInt(0x70617261).putInt(0).putShort((short) type).putShort((short) 0);
    for (double number : numbers) {
      tag.putInt((int) Math.round(65536 * number));
    }
    return tag.array();
  }
}
