package plumbray.imaging.reading;

import java.util.function.IntToDoubleFunction;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoShape;

/** Grey photos of 16 bits with a given brightness. */
public final class StripPhotos {
  /** One step of a sample where the encoding is coarsest, linear light. */
  public static final double QUANTUM = 2.3 / 65535.0;

  private StripPhotos() {}

  /** Brightness of a pixel, linear light 0 to 1. */
  @FunctionalInterface
  public interface Brightness {
    /** Brightness at column u and row v. */
    double at(int u, int v);
  }

  /** A photo in which all columns are alike. */
  public static Photo of(int widthPx, int heightPx, IntToDoubleFunction byRow) {
    return of(widthPx, heightPx, (u, v) -> byRow.applyAsDouble(v));
  }

  /** A photo. */
  public static Photo of(int widthPx, int heightPx, Brightness brightness) {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(widthPx, heightPx, 1, 16));
    for (int v = 0; v < heightPx; v++) {
      for (int u = 0; u < widthPx; u++) {
        builder.sample(u, v, 0, (int) Math.round(65535.0 * encode(brightness.at(u, v))));
      }
    }
    return builder.build();
  }

  /** The sRGB transfer function (IEC 61966-2-1). */
  private static double encode(double linear) {
    return linear <= 0.0031308 ? linear * 12.92 : 1.055 * Math.pow(linear, 1.0 / 2.4) - 0.055;
  }
}
