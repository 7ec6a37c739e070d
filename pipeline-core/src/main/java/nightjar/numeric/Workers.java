package nightjar.numeric;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.CompletionService;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorCompletionService;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import nightjar.recording.Progress;

/**
 * A fixed number of threads that share a range in blocks. The blocks depend on the range alone, so
 * a computation that writes per block gives the same result for any number of threads.
 */
public final class Workers implements AutoCloseable {
  /** Work on the positions {@code first} (inclusive) to {@code end} (exclusive). */
  @FunctionalInterface
  public interface Block {
    void run(int first, int end);
  }

  private final int threads;
  private final ExecutorService pool;

  /** Starts {@code threads} daemon threads. */
  public Workers(int threads) {
    if (threads < 1) {
      throw new IllegalArgumentException(threads + " threads");
    }
    this.threads = threads;
    this.pool =
        Executors.newFixedThreadPool(
            threads,
            r -> {
              Thread t = new Thread(r, "nightjar-worker");
              t.setDaemon(true);
              return t;
            });
  }

  /** Number of threads. */
  public int threads() {
    return threads;
  }

  /**
   * Runs {@code block} over [0, {@code total}) in pieces of {@code blockSize}; returns when all are
   * done. The first exception of a block is thrown here, after the others have ended; blocks not
   * yet begun are dropped then.
   */
  public void forEachBlock(int total, int blockSize, Block block) {
    CompletionService<Boolean> done = new ExecutorCompletionService<>(pool);
    List<Future<Boolean>> futures = new ArrayList<>();
    for (int first = 0; first < total; first += blockSize) {
      int from = first;
      int end = Math.min(total, first + blockSize);
      Callable<Boolean> task =
          () -> {
            block.run(from, end);
            return true;
          };
      futures.add(done.submit(task));
    }
    Throwable failure = null;
    for (int i = 0; i < futures.size(); i++) {
      try {
        Future<Boolean> f = done.take();
        if (!f.isCancelled()) {
          f.get();
        }
      } catch (ExecutionException e) {
        if (failure == null) {
          failure = e.getCause();
          futures.forEach(f -> f.cancel(false));
        }
      } catch (InterruptedException e) {
        Thread.currentThread().interrupt();
        futures.forEach(f -> f.cancel(true));
        throw new java.util.concurrent.CancellationException("interrupted");
      }
    }
    if (failure instanceof RuntimeException r) {
      throw r;
    }
    if (failure instanceof Error e) {
      throw e;
    }
    if (failure != null) {
      throw new IllegalStateException(failure);
    }
  }

  /**
   * The same, and {@code progress} hears the share done after each block; what it throws stops the
   * work.
   */
  public void forEachBlock(int total, int blockSize, Progress progress, Block block) {
    AtomicInteger done = new AtomicInteger();
    forEachBlock(
        total,
        blockSize,
        (first, end) -> {
          block.run(first, end);
          progress.report(done.addAndGet(end - first) / (double) total);
        });
  }

  @Override
  public void close() {
    pool.shutdownNow();
  }
}
