package plumbray.imaging.fit;

/** How far a fit can be trusted. */
public enum FitStatus {
  /** Nothing speaks against it. */
  GOOD("good"),
  /** Usable, with warnings that say why not to trust it blindly. */
  DOUBTFUL("doubtful"),
  /** No result. */
  FAILED("failed");

  private final String key;

  FitStatus(String key) {
    this.key = key;
  }

  /** The word used in result files. */
  public String key() {
    return key;
  }
}
