package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import nightjar.recording.EventTable;
import nightjar.recording.Trial;
import nightjar.refusal.RefusedInput;

/** Plans and event tables for the tests of this package. */
final class Plans {
  /** The only key that a plan must have, on its first line. */
  static final String CONTRASTS = "contrasts: [{name: a_over_b, weights: {a: 1, b: -1}}]\n";

  private Plans() {}

  /** A plan with the contrast on line 1 and {@code rest} from line 2. */
  static Plan with(String rest) {
    return PlanFile.parse(CONTRASTS + rest, "p.yaml");
  }

  /** The sentence that refuses the contrast on line 1 with {@code rest} from line 2. */
  static String refusalWith(String rest) {
    return refusalOf(CONTRASTS + rest);
  }

  /** The sentence that refuses {@code text}. */
  static String refusalOf(String text) {
    return assertThrows(RefusedInput.class, () -> PlanFile.parse(text, "p.yaml")).getMessage();
  }

  /** An event table with two trials of each stimulus, from line 2. */
  static EventTable events(String... stimuli) {
    List<Trial> trials = new ArrayList<>();
    for (int i = 0; i < 2 * stimuli.length; i++) {
      String stimulus = stimuli[i % stimuli.length];
      trials.add(new Trial(stimulus, 10.0 * i + 5, 2, null, Map.of(), i + 2));
    }
    return new EventTable("e.tsv", trials);
  }
}
