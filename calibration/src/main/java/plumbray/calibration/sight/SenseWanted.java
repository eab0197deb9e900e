package plumbray.calibration.sight;

/** Which image of a mark was pointed at. */
public enum SenseWanted {
  /** The image that stands the right way up. */
  UPRIGHT,
  /** The image that stands on its head. */
  INVERTED,
  /** Whichever image fits best. */
  ANY
}
