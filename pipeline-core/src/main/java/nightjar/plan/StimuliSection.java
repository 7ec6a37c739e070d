package nightjar.plan;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import nightjar.design.StimulusSettings;

/** Plan section {@code stimuli}: {@code name: ignore} or {@code name: {logged_as: ...}}. */
final class StimuliSection {
  private StimuliSection() {}

  static List<StimulusSettings> read(Section top) {
    List<StimulusSettings> stimuli = new ArrayList<>();
    Map<String, String> logged = new HashMap<>();
    Section all = top.section("stimuli");
    for (String name : List.copyOf(all.names())) {
      StimulusSettings s = entry(all, name);
      String other = logged.put(s.loggedAs(), name);
      if (other != null) {
        throw all.refusal(name, "two stimuli are logged as the same trial_type")
            .found(
                Names.shown(other)
                    + " and "
                    + Names.shown(name)
                    + " as "
                    + Names.shown(s.loggedAs()))
            .remedy("give each its own logged_as");
      }
      stimuli.add(s);
    }
    all.done();
    return stimuli;
  }

  private static StimulusSettings entry(Section all, String name) {
    if (all.isWord(name, "ignore")) {
      return new StimulusSettings(name, name, true);
    }
    Names.check(all, name, name, "a stimulus");
    Section s = all.isNull(name) ? null : all.section(name);
    if (s == null) {
      return new StimulusSettings(name, name, false);
    }
    s.lacks("modulator", "parametric modulators", List.of("null"));
    StimulusSettings settings = new StimulusSettings(name, s.text("logged_as").orElse(name), false);
    s.done();
    return settings;
  }
}
