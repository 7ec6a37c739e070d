package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.design.ModelledStimulus;
import nightjar.recording.EventTable;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PlanCheckTest {
  private static String refusal(Plan plan, EventTable events) {
    return assertThrows(RefusedInput.class, () -> PlanCheck.against(plan, events)).getMessage();
  }

  private static List<String> names(Plan plan, EventTable events) {
    return PlanCheck.against(plan, events).stream().map(ModelledStimulus::name).toList();
  }

  private static Plan weighing(String column) {
    return PlanFile.parse("contrasts: [{name: c, weights: {'" + column + "': 1}}]", "p.yaml");
  }

  @Test
  void everyStimulusIsModelledThoseOfThePlanFirst() {
    EventTable events = Plans.events("d", "b", "c", "a");
    assertEquals(List.of("a", "b", "c", "d"), names(Plans.with(""), events));
    assertEquals(List.of("c", "a", "b", "d"), names(Plans.with("stimuli: {c: {}, a: {}}"), events));
  }

  @Test
  void aStimulusTakesTheTrialsThatWereLoggedUnderItsOtherName() {
    EventTable events = Plans.events("puff (left)", "b");
    ModelledStimulus a =
        PlanCheck.against(Plans.with("stimuli: {a: {logged_as: puff (left)}}"), events).get(0);
    assertEquals("a", a.name());
    assertEquals(events.of("puff (left)"), a.trials());
  }

  @Test
  void ignoredTrialsAreNotModelled() {
    assertEquals(
        List.of("a", "b"),
        names(Plans.with("stimuli: {a click: ignore}"), Plans.events("a", "b", "a click")));
  }

  @Test
  void namesMayBeSwapped() {
    EventTable events = Plans.events("a", "b");
    List<ModelledStimulus> swapped =
        PlanCheck.against(Plans.with("stimuli: {a: {logged_as: b}, b: {logged_as: a}}"), events);
    assertEquals(events.of("b"), swapped.get(0).trials());
    assertEquals(events.of("a"), swapped.get(1).trials());
  }

  @Test
  void anEntryWithoutTrialsIsRefusedWithTheNearestName() {
    assertEquals(
        "p.yaml, stimuli.a: the stimulus a has no trial (found no trial_type left_pufff in e.tsv,"
            + " expected one of b, left_puff); did you mean left_puff.",
        refusal(
            Plans.with("stimuli: {a: {logged_as: left_pufff}}"), Plans.events("left_puff", "b")));
    assertTrue(
        refusal(Plans.with("stimuli: {clik: ignore}"), Plans.events("a", "b", "click"))
            .endsWith("did you mean click."));
  }

  @Test
  void aContrastWithAnUnknownStimulusIsRefusedWithTheNearestName() {
    assertEquals(
        "p.yaml, contrast c: the contrast names an unknown stimulus (found left_puf, expected one"
            + " of left_puff, sham_puff); did you mean left_puff.",
        refusal(weighing("left_puf"), Plans.events("left_puff", "sham_puff")));
  }

  @Test
  void aMistypedSlopeIsRefusedWithTheNearestColumn() {
    String contrasts = "contrasts: [{name: c, weights: {'left_puff:slop': 1}}]\n";
    EventTable events = Plans.events("left_puff");
    assertEquals(
        "p.yaml, contrast c: the contrast names an unknown stimulus (found left_puff:slop, expected"
            + " one of left_puff, left_puff:slope); did you mean left_puff:slope.",
        refusal(PlanFile.parse(contrasts + "kernel: {derivative: true}", "p.yaml"), events));
    assertTrue(
        refusal(PlanFile.parse(contrasts, "p.yaml"), events)
            .contains("expected one of left_puff); "));
  }

  @Test
  void endlessNamesAndListsAreCutInTheSentence() {
    String endless = "x".repeat(100_000);
    EventTable many =
        Plans.events(IntStream.range(0, 500).mapToObj(i -> "s" + i).toArray(String[]::new));
    for (String rest :
        List.of(
            "stimuli: {a: {logged_as: " + endless + "}}",
            "stimuli: {? " + endless + " : ignore}")) {
      String sentence = refusal(Plans.with(rest), many);
      assertTrue(sentence.contains("has no trial"), sentence);
      assertTrue(sentence.length() < 600, sentence);
    }
    String column = refusal(weighing("s0:" + "x".repeat(1000)), many);
    assertTrue(column.length() < 600, column);
  }

  @Test
  void whatWouldNotShowIsReplacedInTheSentence() {
    String sentence =
        refusal(Plans.with("stimuli: {\"q\\e[2J\\n\\u202E\\u2028\": ignore}"), Plans.events("a"));
    assertTrue(
        sentence.startsWith("p.yaml, stimuli.q?[2J???: the stimulus q?[2J??? has no trial"),
        sentence);
  }

  @Test
  void aContrastWithAnIgnoredStimulusIsRefused() {
    assertTrue(
        refusal(Plans.with("stimuli: {b: ignore}"), Plans.events("a", "b"))
            .contains("the contrast names an unknown stimulus (found b, expected one of a)"));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "a",
        "a:slope",
        "slow_1",
        "slow_12",
        "segment_2",
        "level",
        "shift_depth",
        "shift_lateral",
        "rotation",
        "square:shift_depth",
        "difference:rotation"
      })
  void aWeightMayNameAnyColumnOfTheDesign(String column) {
    assertEquals(List.of("a"), names(weighing(column), Plans.events("a")));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "x:slope",
        ":slope",
        "slow_",
        "slow_x",
        "square:level",
        "cube:rotation",
        "a:slop",
        "a:foo",
        "a:slope:slope",
        "a:",
        "frame",
        "time_s",
        "kept"
      })
  void aWeightThatNamesNoColumnIsRefused(String column) {
    assertTrue(
        refusal(weighing(column), Plans.events("a"))
            .contains("the contrast names an unknown stimulus (found " + column));
  }

  @ParameterizedTest
  @ValueSource(strings = {"a b", "päff", "a:slope", "a/b", "../a"})
  void aTrialTypeThatIsNoNameMustBeMapped(String logged) {
    String sentence = refusal(Plans.with(""), Plans.events("a", "b", logged));
    assertTrue(sentence.startsWith("e.tsv, line 4: the trial_type is no name"), sentence);
    assertTrue(sentence.contains("found " + logged), sentence);
    assertEquals(
        List.of("c", "a", "b"),
        names(
            Plans.with("stimuli: {c: {logged_as: '" + logged + "'}}"),
            Plans.events("a", "b", logged)));
  }

  @Test
  void aTrialTypeOfMoreThan64LettersMustBeMapped() {
    assertTrue(
        refusal(Plans.with(""), Plans.events("a", "b", "x".repeat(65)))
            .contains("the trial_type is no name"));
    assertEquals(3, names(Plans.with(""), Plans.events("a", "b", "x".repeat(64))).size());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"level", "slow_1", "rotation", "segment_2", "frame", "plane", "time_s", "kept"})
  void aStimulusMayNotBeCalledLikeAnotherColumn(String logged) {
    String sentence = refusal(Plans.with(""), Plans.events("a", "b", logged));
    assertEquals(
        "p.yaml, stimuli: a stimulus has the name of another column of design.csv (found "
            + logged
            + "); add a_name: {logged_as: "
            + logged
            + "} there.",
        sentence);
  }

  @Test
  void anEntryMayNotTakeTheNameOfAnotherTrialType() {
    assertTrue(
        refusal(Plans.with("stimuli: {a: {logged_as: b}}"), Plans.events("a", "b"))
            .contains("a stimulus of the plan has the name of another trial_type (found a)"));
  }

  @Test
  void atLeastOneStimulusIsModelled() {
    assertTrue(
        refusal(Plans.with("stimuli: {a: ignore, b: ignore}"), Plans.events("a", "b"))
            .contains("every stimulus is ignored"));
  }
}
