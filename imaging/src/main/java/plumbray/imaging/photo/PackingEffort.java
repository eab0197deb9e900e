package plumbray.imaging.photo;

/** How much time to spend on making a PNG or a packed TIFF small; the samples are the same. */
public enum PackingEffort {
  /** Quick, and for photographs nearly as small as can be. */
  FAST,
  /** Everything is tried; several times slower. */
  SMALL
}
