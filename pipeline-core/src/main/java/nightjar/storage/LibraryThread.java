package nightjar.storage;

import java.time.Duration;
import java.util.concurrent.Callable;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import nightjar.refusal.RefusedInput;

/**
 * The one daemon thread that makes all calls of the NetCDF library for a file: its handles bear one
 * thread only, and damaged files have made it loop for ever, overflow the stack and exhaust memory.
 * Whatever it does, the caller gets a value or a refusal in time.
 */
final class LibraryThread implements AutoCloseable {
  private static final long STACK_BYTES = 4L << 20;

  private final String fileName;
  private final ExecutorService thread;

  LibraryThread(String fileName) {
    this.fileName = fileName;
    this.thread =
        Executors.newSingleThreadExecutor(
            task -> {
              Thread t = new Thread(null, task, "nightjar-netcdf4", STACK_BYTES);
              t.setDaemon(true);
              return t;
            });
  }

  /**
   * The value of a call.
   *
   * @throws RefusedInput if the call fails in any way or takes longer than {@code deadline}
   */
  <T> T call(Duration deadline, Callable<T> task) {
    Future<T> result = thread.submit(task);
    try {
      return result.get(deadline.toMillis(), TimeUnit.MILLISECONDS);
    } catch (ExecutionException e) {
      if (e.getCause() instanceof RefusedInput refused) {
        throw refused;
      }
      throw refusal(String.valueOf(e.getCause()));
    } catch (TimeoutException e) {
      result.cancel(true);
      throw refusal("no end after " + deadline.toSeconds() + " s");
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      result.cancel(true);
      throw new CancellationException("interrupted");
    }
  }

  private RefusedInput refusal(String found) {
    return RefusedInput.because("the netCDF-4 file cannot be read, it seems to be damaged")
        .in(fileName)
        .found(found.substring(0, Math.min(200, found.length())))
        .remedy("copy it again from where it was recorded, or convert it to 64-bit offset");
  }

  @Override
  public void close() {
    thread.shutdownNow();
  }
}
