package plumbray.raymodel.profile;

/** Which universal function for heat the surface-layer similarity family uses. */
public enum Stability {
  /** Dyer (1974): unstable (1 - 16 zeta)^(-1/2), stable 1 + 5 zeta. */
  DYER("dyer"),
  /**
   * Wilson (2001), with the two-thirds power that free convection asks for: unstable (1 + 7.9
   * |zeta|^(2/3))^(-1/2); on the stable side, of which that paper does not treat, Dyer's 1 + 5
   * zeta.
   */
  TWO_THIRDS("twoThirds");

  private final String key;

  Stability(String key) {
    this.key = key;
  }

  /** The name used in sight files. */
  public String key() {
    return key;
  }
}
