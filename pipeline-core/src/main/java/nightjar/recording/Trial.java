package nightjar.recording;

import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * One presentation of a stimulus.
 *
 * @param stimulus name as logged
 * @param onsetSeconds from the recording's time zero
 * @param durationSeconds 0 = impulse
 * @param block label that limits relabelling, or null
 * @param values further numeric columns by name; a missing value is NaN
 * @param line line in the event table, from 1
 */
public record Trial(
    String stimulus,
    double onsetSeconds,
    double durationSeconds,
    @Nullable String block,
    Map<String, Double> values,
    int line) {
  public Trial {
    values = Map.copyOf(values);
    if (!(durationSeconds >= 0)) {
      throw new IllegalArgumentException("duration " + durationSeconds + " s of a trial");
    }
  }
}
