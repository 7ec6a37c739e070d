package nightjar.analysis;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.design.StimulusSettings;
import nightjar.plan.Plan;
import nightjar.plan.ResolvedPlan;

/** A plan in short: what its results depend on most, as resolved. */
final class PlanFacts {
  private static final List<String> SECTIONS =
      List.of("screening", "alignment", "smoothing", "mask", "kernel", "drift", "noise");

  private PlanFacts() {}

  static Map<String, Object> of(Plan plan) {
    List<String> modelled =
        plan.stimuli().stream().filter(s -> !s.ignored()).map(StimulusSettings::name).toList();
    Map<String, Object> resolved = ResolvedPlan.toMap(plan, modelled);
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("file", plan.fileName());
    m.put("name", plan.name());
    m.put("contrasts", plan.contrasts().stream().map(c -> c.name()).toList());
    for (String section : SECTIONS) {
      m.put(section, resolved.getOrDefault(section, Map.of()));
    }
    m.put("scale", resolved.getOrDefault("scale", ""));
    m.put("inference", Map.of("method", method(plan)));
    m.put("regions", resolved.getOrDefault("regions", Map.of()));
    return m;
  }

  private static String method(Plan plan) {
    return plan.inference().adjustment().name().toLowerCase(java.util.Locale.ROOT);
  }
}
