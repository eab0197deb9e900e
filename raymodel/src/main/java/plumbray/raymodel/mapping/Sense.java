package plumbray.raymodel.mapping;

/** Whether an image stands upright or on its head. */
public enum Sense {
  /** Higher things are seen higher. */
  UPRIGHT,
  /** Higher things are seen lower. */
  INVERTED
}
