package plumbray.cli.batch;

/** Hears how far a batch has come. Calls come one at a time, from any thread. */
public interface BatchProgress {
  /**
   * A photo is finished.
   *
   * @param outcome what came of it
   * @param finished how many are finished, this one among them
   * @param total how many there are
   */
  void finished(PhotoOutcome outcome, int finished, int total);
}
