package plumbray.imaging.photo;

/** How finely a JPEG stores its two differences of colour. */
public enum JpegSampling {
  /** As finely as its brightness, "4:4:4". */
  FULL(1, 1),
  /** Half as finely along rows, "4:2:2". */
  HALF(2, 1),
  /** Half as finely along rows and columns, "4:2:0". */
  QUARTER(2, 2);

  private final int across;
  private final int down;

  JpegSampling(int across, int down) {
    this.across = across;
    this.down = down;
  }

  /** Horizontal sampling factor of the brightness, where the colours have 1. */
  int across() {
    return across;
  }

  /** Vertical sampling factor of the brightness, where the colours have 1. */
  int down() {
    return down;
  }
}
