package nightjar.results;

import java.time.Instant;
import java.util.List;

/**
 * How a run went on its machine.
 *
 * @param begun when it began
 * @param host machine's name
 * @param threads threads used
 * @param stages in order
 */
public record RunRecord(Instant begun, String host, int threads, List<Stage> stages) {
  public RunRecord {
    stages = List.copyOf(stages);
  }

  /**
   * One stage.
   *
   * @param name as shown while it ran
   * @param seconds wall clock
   * @param peakHeapMegabytes largest heap use during the stage
   */
  public record Stage(String name, double seconds, double peakHeapMegabytes) {}
}
