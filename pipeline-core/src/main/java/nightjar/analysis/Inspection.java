package nightjar.analysis;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.refusal.RefusedInput;

/**
 * What was found in the files of a session, and what would be refused.
 *
 * @param sections facts by section (recording, events, plan, regions, traces, needs), each an
 *     ordered map of plain values, lists and maps
 * @param warnings sentences
 * @param refusals in the order of the files; empty: an analysis would begin
 */
public record Inspection(
    Map<String, Map<String, Object>> sections, List<String> warnings, List<RefusedInput> refusals) {
  public Inspection {
    sections = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(sections));
    warnings = List.copyOf(warnings);
    refusals = List.copyOf(refusals);
  }
}
