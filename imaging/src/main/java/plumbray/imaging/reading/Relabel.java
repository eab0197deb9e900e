package plumbray.imaging.reading;

/**
 * Another reading of which edge is which: all edges from some place down are taken for others.
 * Where a start has too few or too many edges in a squeezed part, everything below it is read so.
 *
 * @param from first edge of the strip, counted down from its top, that is read anew
 * @param edges how many edges higher it and the following are taken to be
 */
public record Relabel(int from, int edges) {

  /** Every edge is what it seems to be. */
  public static final Relabel NONE = new Relabel(0, 0);

  int of(int position, EdgeImage edge) {
    return edge.edge() + (position >= from ? edges : 0);
  }
}
