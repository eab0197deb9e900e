package plumbray.raymodel.diagnosis;

/**
 * A part of a line of sight over which it is bent one way.
 *
 * @param fromM distance at which the part begins, m
 * @param toM distance at which it ends, m
 * @param curving which way it is bent
 */
public record Bend(double fromM, double toM, Curving curving) {

  /** Ways in which a line of sight is bent. */
  public enum Curving {
    /** Curved like the Earth or straight: the refraction coefficient is not below 0. */
    CONCAVE,
    /** Bulging towards the ground: the refraction coefficient is below 0. */
    CONVEX
  }
}
