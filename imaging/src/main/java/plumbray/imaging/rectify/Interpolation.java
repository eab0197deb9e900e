package plumbray.imaging.rectify;

/** How a redrawn picture is read between the pixels of the photo. */
public enum Interpolation {
  /** Cubic convolution with a = -1/2 over four pixels each way. */
  CUBIC,

  /** Lanczos' windowed sinc over six pixels each way: sharper, with fainter second ripples. */
  LANCZOS;

  Kernel kernel() {
    return this == CUBIC ? new CubicKernel() : new LanczosKernel();
  }
}
