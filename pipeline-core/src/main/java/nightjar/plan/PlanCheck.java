package nightjar.plan;

import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import nightjar.design.ModelledStimulus;
import nightjar.design.StimulusSettings;
import nightjar.glm.Contrast;
import nightjar.recording.EventTable;
import nightjar.refusal.NearestName;
import nightjar.refusal.RefusedInput;

/** Holds a plan against an event table. */
public final class PlanCheck {
  private static final String SLOPE = ":slope";

  /** Columns of the model that are no stimuli. */
  private static final String OTHER_COLUMNS =
      "slow_[0-9]+|segment_[0-9]+|level|((square|difference):)?(shift_depth|shift_lateral"
          + "|shift_plane|rotation|tilt_depth|tilt_lateral)";

  /** Columns of design.csv that are none of the model. */
  private static final String FRAME_COLUMNS = "frame|plane|time_s|kept";

  private PlanCheck() {}

  /**
   * The stimuli of the model with their trials: those that the plan names, in its order, then the
   * others of the table in alphabetical order.
   *
   * @throws RefusedInput where the plan names what the table does not have
   */
  public static List<ModelledStimulus> against(Plan plan, EventTable events) {
    Map<String, String> names = new LinkedHashMap<>();
    for (StimulusSettings s : plan.stimuli()) {
      if (events.of(s.loggedAs()).isEmpty()) {
        throw RefusedInput.because("the stimulus " + Names.shown(s.name()) + " has no trial")
            .in(plan.fileName())
            .at("stimuli." + Names.shown(s.name()))
            .found("no trial_type " + Names.shown(s.loggedAs()) + " in " + events.fileName())
            .expected("one of " + Names.listed(events.stimuli()))
            .remedy(suggestion(s.loggedAs(), events.stimuli(), "leave the entry out"));
      }
      if (!s.ignored()) {
        names.put(s.name(), s.loggedAs());
      }
    }
    for (String logged : events.stimuli()) {
      if (plan.stimuli().stream().noneMatch(s -> s.loggedAs().equals(logged))) {
        addUnnamed(names, logged, events);
      }
    }
    if (names.isEmpty()) {
      throw RefusedInput.because("every stimulus is ignored")
          .in(plan.fileName())
          .at("stimuli")
          .remedy("model at least one");
    }
    names.forEach((name, logged) -> refuseNameOfOtherColumn(name, logged, plan));
    plan.contrasts().forEach(c -> check(c, plan, names.keySet()));
    List<ModelledStimulus> stimuli = new ArrayList<>();
    names.forEach((name, logged) -> stimuli.add(new ModelledStimulus(name, events.of(logged))));
    return stimuli;
  }

  private static void addUnnamed(Map<String, String> names, String logged, EventTable events) {
    if (!Names.isName(logged)) {
      throw RefusedInput.because("the trial_type is no name that results can carry")
          .in(events.fileName())
          .at("line " + events.of(logged).get(0).line())
          .found(Names.shown(logged))
          .expected("1 to 64 of letters, digits, _ - .")
          .remedy("map it in the plan, stimuli: {a_name: {logged_as: ...}}, or ignore it");
    }
    if (names.put(logged, logged) != null) {
      throw RefusedInput.because("a stimulus of the plan has the name of another trial_type")
          .in(events.fileName())
          .found(logged)
          .remedy("give the plan's entry another name");
    }
  }

  private static void refuseNameOfOtherColumn(String name, String logged, Plan plan) {
    if (name.matches(OTHER_COLUMNS + "|" + FRAME_COLUMNS)) {
      throw RefusedInput.because("a stimulus has the name of another column of design.csv")
          .in(plan.fileName())
          .at("stimuli")
          .found(name)
          .remedy("add a_name: {logged_as: " + Names.shown(logged) + "} there");
    }
  }

  private static void check(Contrast contrast, Plan plan, Set<String> stimuli) {
    Set<String> columns = new LinkedHashSet<>(stimuli);
    if (plan.kernelDerivative()) {
      stimuli.forEach(s -> columns.add(s + SLOPE));
    }
    for (String column : contrast.weights().keySet()) {
      if (isOfStimulus(column, stimuli) || column.matches(OTHER_COLUMNS)) {
        continue;
      }
      throw RefusedInput.because("the contrast names an unknown stimulus")
          .in(plan.fileName())
          .at("contrast " + contrast.name())
          .found(Names.shown(column))
          .expected("one of " + Names.listed(columns))
          .remedy(suggestion(column, columns, "name a stimulus of the event table"));
    }
  }

  private static boolean isOfStimulus(String column, Set<String> stimuli) {
    return stimuli.contains(
        column.endsWith(SLOPE) ? column.substring(0, column.length() - SLOPE.length()) : column);
  }

  private static String suggestion(String name, Collection<String> known, String otherwise) {
    return NearestName.of(name, known).map(n -> "did you mean " + Names.shown(n)).orElse(otherwise);
  }
}
