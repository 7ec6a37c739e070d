package nightjar.results;

import java.util.List;
import java.util.Map;
import nightjar.recording.Grid;
import nightjar.recording.SessionMetadata;

/**
 * Where results come from.
 *
 * @param version of Nightjar
 * @param inputs files read
 * @param plan as resolved, all defaults written out, by section
 * @param grid of the recording
 * @param metadata what the recording says of itself
 */
public record Provenance(
    String version,
    List<InputFile> inputs,
    Map<String, Object> plan,
    Grid grid,
    SessionMetadata metadata) {
  public Provenance {
    inputs = List.copyOf(inputs);
  }

  /** The plan's name. */
  public String planName() {
    return String.valueOf(plan.get("name"));
  }
}
