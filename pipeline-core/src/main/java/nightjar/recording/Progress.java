package nightjar.recording;

/** Hears how far a stage is. May be called from several threads. */
@FunctionalInterface
public interface Progress {
  /** Nobody listens. */
  Progress SILENT = share -> {};

  /**
   * Tells how much of the stage is done.
   *
   * @param share of the stage done, 0 to 1
   * @throws java.util.concurrent.CancellationException where the work shall stop
   */
  void report(double share);
}
