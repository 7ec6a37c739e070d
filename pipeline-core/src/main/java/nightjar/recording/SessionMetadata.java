package nightjar.recording;

import java.util.Map;

/**
 * What the recording says of itself beyond its numbers: the global attributes {@code animal, study,
 * cohort, acquired, ensemble_duration_s, probe_frequency_mhz, title} that are present, as text.
 *
 * @param attributes by name
 */
public record SessionMetadata(Map<String, String> attributes) {
  public SessionMetadata {
    attributes = java.util.Collections.unmodifiableMap(new java.util.TreeMap<>(attributes));
  }
}
