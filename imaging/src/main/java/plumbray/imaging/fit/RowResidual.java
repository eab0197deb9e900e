package plumbray.imaging.fit;

import plumbray.raymodel.mapping.Sense;

/**
 * One mark of a reference as seen in one image.
 *
 * @param heightM height of the mark above the reference's foot, m
 * @param sense image in which it was seen
 * @param observedRowPx row where it was found
 * @param predictedRowPx row where the fit puts it
 * @param sigmaPx standard deviation of the observed row
 */
public record RowResidual(
    double heightM, Sense sense, double observedRowPx, double predictedRowPx, double sigmaPx) {

  /** Observed minus predicted, px, positive downwards. */
  public double residualPx() {
    return observedRowPx - predictedRowPx;
  }
}
