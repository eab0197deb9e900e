package plumbray.imaging.photo;

import java.io.IOException;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.IntFunction;

/** Does numbered pieces of work on several threads, and hands on what they give in their order. */
final class OrderedWork {
  /** Pieces begun ahead of the one that is waited for, per thread. */
  private static final int AHEAD = 2;

  private OrderedWork() {}

  /** What takes a finished piece. */
  @FunctionalInterface
  interface Taker<R> {
    void take(R result) throws IOException;
  }

  /**
   * Does pieces 0 to count - 1.
   *
   * @param count how many there are
   * @param threads how many threads to use; with 1 all is done by the caller's own
   * @param piece does one
   * @param taker takes each, in order, on the caller's thread
   */
  static <R> void run(int count, int threads, IntFunction<R> piece, Taker<R> taker)
      throws IOException {
    if (threads <= 1 || count <= 1) {
      for (int i = 0; i < count; i++) {
        taker.take(piece.apply(i));
      }
      return;
    }
    ExecutorService pool = Executors.newFixedThreadPool(Math.min(threads, count));
    try {
      Deque<Future<R>> begun = new ArrayDeque<>();
      int next = 0;
      for (int i = 0; i < count; i++) {
        while (next < count && begun.size() < AHEAD * threads) {
          int number = next++;
          begun.add(pool.submit(() -> piece.apply(number)));
        }
        taker.take(begun.remove().get());
      }
    } catch (ExecutionException e) {
      throw new IOException("packing failed", e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IOException("packing was interrupted", e);
    } finally {
      pool.shutdownNow();
    }
  }
}
