package nightjar.recording;

import java.util.List;

/**
 * Which stimulus came when.
 *
 * @param fileName name for messages
 * @param trials in the file's order
 */
public record EventTable(String fileName, List<Trial> trials) {
  public EventTable {
    trials = List.copyOf(trials);
  }

  /** Names of the stimuli as logged, in alphabetical order. */
  public List<String> stimuli() {
    return trials.stream().map(Trial::stimulus).distinct().sorted().toList();
  }

  /** The trials of one stimulus in the file's order. */
  public List<Trial> of(String stimulus) {
    return trials.stream().filter(t -> t.stimulus().equals(stimulus)).toList();
  }
}
