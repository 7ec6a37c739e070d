package nightjar.analysis;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.recording.EventTable;
import nightjar.recording.Trial;

/** What an event table holds, stimulus by stimulus. */
final class EventFacts {
  private EventFacts() {}

  static Map<String, Object> of(EventTable events) {
    Map<String, Object> stimuli = new LinkedHashMap<>();
    for (String name : events.stimuli()) {
      List<Trial> trials = events.of(name);
      Map<String, Object> s = new LinkedHashMap<>();
      s.put("trials", trials.size());
      s.put("shortest_s", trials.stream().mapToDouble(Trial::durationSeconds).min().orElse(0));
      s.put("longest_s", trials.stream().mapToDouble(Trial::durationSeconds).max().orElse(0));
      s.put("first_onset_s", trials.stream().mapToDouble(Trial::onsetSeconds).min().orElse(0));
      s.put("last_onset_s", trials.stream().mapToDouble(Trial::onsetSeconds).max().orElse(0));
      stimuli.put(name, s);
    }
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("file", events.fileName());
    m.put("trials", events.trials().size());
    m.put("stimuli", stimuli);
    return m;
  }
}
