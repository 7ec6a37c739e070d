package nightjar.design;

import java.util.List;
import nightjar.recording.Trial;

/**
 * A stimulus of the model with its trials.
 *
 * @param name column name
 * @param trials at least one
 */
public record ModelledStimulus(String name, List<Trial> trials) {
  public ModelledStimulus {
    trials = List.copyOf(trials);
  }
}
