package nightjar.analysis;

import nightjar.film.Scratch;

/**
 * What the machine gives to a run; no result depends on it.
 *
 * @param threads number of threads
 * @param scratch where large arrays live
 */
public record RunSettings(int threads, Scratch scratch) {
  /** All processors and a quarter of the heap. */
  public static RunSettings ofThisMachine() {
    return new RunSettings(Runtime.getRuntime().availableProcessors(), Scratch.ofThisMachine());
  }

  /** The same with another number of threads. */
  public RunSettings withThreads(int number) {
    return new RunSettings(number, scratch);
  }
}
