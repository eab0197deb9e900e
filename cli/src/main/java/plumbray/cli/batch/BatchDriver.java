package plumbray.cli.batch;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import plumbray.cli.document.Digest;
import plumbray.cli.document.FitDocument;
import plumbray.cli.document.SummaryCsv;
import plumbray.cli.document.WholeFile;
import plumbray.cli.work.PhotoTask;
import plumbray.cli.work.PhotoWorker;
import plumbray.cli.work.ResultFiles;

/**
 * Works through the photos of a batch, several at a time. The results don't depend on how many, nor
 * on the order in which photos are finished.
 */
public final class BatchDriver {
  private static final int LOG_PARTS = 100;

  private final PhotoWorker worker;
  private final Path folder;
  private final int jobs;
  private final BatchProgress progress;

  /**
   * Creates a driver.
   *
   * @param worker what does one photo
   * @param folder where the results go
   * @param jobs how many photos are worked on at a time, at least 1
   * @param progress hears of each photo that is finished
   */
  public BatchDriver(PhotoWorker worker, Path folder, int jobs, BatchProgress progress) {
    if (jobs < 1) {
      throw new IllegalArgumentException(
          "jobs is " + jobs + ", must be at least 1 (photos at a time)");
    }
    this.worker = Objects.requireNonNull(worker, "worker");
    this.folder = Objects.requireNonNull(folder, "folder");
    this.jobs = jobs;
    this.progress = Objects.requireNonNull(progress, "progress");
  }

  /**
   * Works through the photos and writes the log, the summary and the batch's page.
   *
   * @param batch what the batch is called
   * @param inputs digests of the batch's own files
   * @param tasks the photos
   * @return what came of each, in their order
   * @throws IOException when the log, the summary or the page cannot be written
   */
  public List<PhotoOutcome> run(String batch, List<Digest> inputs, List<PhotoTask> tasks)
      throws IOException {
    PhotoOutcome[] outcomes = worked(tasks);
    new BatchIndex(folder).write(batch, inputs, outcomes);
    return List.of(outcomes);
  }

  private PhotoOutcome[] worked(List<PhotoTask> tasks) throws IOException {
    Run run = new Run(tasks);
    ExecutorService pool = Executors.newFixedThreadPool(jobs);
    try {
      List<Future<?>> waiting = new ArrayList<>();
      for (int i = 0; i < tasks.size(); i++) {
        int index = i;
        waiting.add(pool.submit(() -> run.finish(index, outcome(tasks.get(index)))));
      }
      for (Future<?> each : waiting) {
        each.get();
      }
    } catch (ExecutionException e) {
      throw new IllegalStateException("the batch stopped", e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException("the batch was interrupted", e);
    } finally {
      pool.shutdownNow();
    }
    return run.end();
  }

  private PhotoOutcome outcome(PhotoTask task) {
    ResultFiles files = new ResultFiles(folder, task.name());
    try {
      Optional<FitDocument> finished = worker.finished(task, files);
      if (finished.isPresent()) {
        return PhotoOutcome.of(task.name(), task.label(), finished.get(), true);
      }
      return PhotoOutcome.of(task.name(), task.label(), worker.work(task, files), false);
    } catch (IOException e) {
      return broken(task, "reading or writing failed: " + e.getMessage());
    } catch (OutOfMemoryError e) {
      return broken(task, "memory is used up; allow more, or fewer photos at a time with --jobs");
    } catch (RuntimeException | StackOverflowError e) {
      // A defect in one photo's work must not cost the night's batch.
      return broken(task, "this should not have happened: " + e);
    }
  }

  private static PhotoOutcome broken(PhotoTask task, String error) {
    return PhotoOutcome.broken(task.name(), task.label(), error.strip().replaceAll("\\s+", " "));
  }

  /** What has come of the photos so far; used by one thread at a time. */
  private final class Run {
    private final PhotoOutcome[] outcomes;
    private int finished;

    Run(List<PhotoTask> tasks) {
      outcomes = new PhotoOutcome[tasks.size()];
    }

    synchronized void finish(int index, PhotoOutcome outcome) {
      outcomes[index] = outcome;
      finished++;
      progress.finished(outcome, finished, outcomes.length);
      if (finished % Math.max(1, outcomes.length / LOG_PARTS) == 0) {
        writeLogOrGoOn();
      }
    }

    private void writeLogOrGoOn() {
      try {
        writeLog();
      } catch (IOException e) {
        // It is written again further on, and the last time a failure is an error.
        return;
      }
    }

    synchronized PhotoOutcome[] end() throws IOException {
      writeLog();
      SummaryCsv summary = new SummaryCsv();
      for (PhotoOutcome outcome : outcomes) {
        outcome
            .fit()
            .ifPresentOrElse(
                fit -> summary.add(outcome.name(), outcome.photo(), fit),
                () ->
                    summary.addFailed(outcome.name(), outcome.photo(), outcome.error().orElse("")));
      }
      WholeFile.write(folder.resolve("summary.csv"), summary.text());
      return outcomes.clone();
    }

    private void writeLog() throws IOException {
      StringBuilder log = new StringBuilder();
      Arrays.stream(outcomes)
          .filter(Objects::nonNull)
          .forEach(outcome -> log.append(outcome.line()).append('\n'));
      log.append(finished).append(" of ").append(outcomes.length).append(" photos are finished\n");
      WholeFile.write(folder.resolve("batch.log"), log.toString());
    }
  }
}
