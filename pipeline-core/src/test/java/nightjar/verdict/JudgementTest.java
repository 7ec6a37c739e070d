package nightjar.verdict;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import nightjar.design.GammaKernel;
import nightjar.design.ModelledStimulus;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.Trial;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Each reason on both sides of its limit (limits: common practice, no source). */
class JudgementTest {
  private static SessionFacts facts(int rejected, double tsnr, double coverage) {
    return new SessionFacts(
        1000,
        rejected,
        300,
        0,
        0.1,
        tsnr,
        List.of(new TrialCount("left", 12, 12)),
        List.of(new SessionFacts.Inflation("left", 1.2)),
        coverage);
  }

  private static Verdict judge(SessionFacts facts) {
    return Judgement.of(facts, VerdictLimits.DEFAULT);
  }

  @ParameterizedTest
  @CsvSource({"0, USABLE", "100, USABLE", "101, REVIEW", "300, REVIEW", "301, UNUSABLE"})
  void rejectedFramesGradeTheSession(int rejected, Verdict.Word word) {
    Verdict v = judge(facts(rejected, 10, 0.9));
    assertEquals(word, v.word());
    assertEquals(word == Verdict.Word.USABLE ? 0 : 1, v.reasons().size());
  }

  @Test
  void reasonsCarryNumberAndLimit() {
    Reason r = judge(facts(101, 10, 0.9)).reasons().get(0);
    assertEquals("rejected_frames", r.code());
    assertEquals("101 of 1000 frames (10.1 %) were rejected; the limit is 10 %.", r.sentence());
    assertEquals(0.101, r.value(), 1e-15);
    assertEquals(0.10, r.limit());
  }

  @Test
  void lowSignalAndLowCoverageAskForReview() {
    assertEquals(List.of("tsnr", "coverage"), codes(judge(facts(0, 4.9, 0.49))));
    assertEquals(List.of(), codes(judge(facts(0, 5, 0.5))));
  }

  @Test
  void rejectionDuringResponsesCountsFromFiveFramesOn() {
    assertEquals(List.of(), codes(judge(inResponses(4, 4))));
    assertEquals(List.of("rejected_in_responses"), codes(judge(inResponses(5, 5))));
    // 12 of 300 against 10 of 700: 2.8 times.
    assertEquals(List.of(), codes(judge(inResponses(22, 12))));
    assertEquals(List.of("rejected_in_responses"), codes(judge(inResponses(24, 14))));
  }

  private static SessionFacts inResponses(int rejected, int within) {
    return new SessionFacts(1000, rejected, 300, within, 0, 10, List.of(), List.of(), 1);
  }

  @Test
  void motionTrialsAndOverlapAreReasons() {
    SessionFacts f =
        new SessionFacts(
            1000,
            0,
            300,
            0,
            0.51,
            10,
            List.of(new TrialCount("left", 4, 9), new TrialCount("right", 0, 9)),
            List.of(new SessionFacts.Inflation("left", 5.1)),
            1);
    Verdict v = judge(f);
    assertEquals(Verdict.Word.UNUSABLE, v.word());
    assertEquals(List.of("trials", "displacement", "trials", "variance_inflation"), codes(v));
    assertEquals(
        "The stimulus right has no complete trials of 9; at least 5 are wanted.",
        v.reasons().get(0).sentence());
  }

  private static List<String> codes(Verdict v) {
    return v.reasons().stream().map(Reason::code).toList();
  }

  @Test
  void aTrialIsCompleteWithFourFifthsOfItsFrames() {
    FrameTimes times = FrameTimes.of(IntStream.range(0, 400).mapToDouble(t -> t * 0.1).toArray());
    // Two seconds of stimulus, 2.1 s to the peak, 2.9 s of width: 70 frames from the onset.
    ModelledStimulus s =
        new ModelledStimulus(
            "left",
            List.of(
                new Trial("left", 2.05, 2, null, Map.of(), 2),
                new Trial("left", 20.05, 2, null, Map.of(), 3),
                new Trial("left", 38, 2, null, Map.of(), 4)));
    TrialCount whole =
        TrialCount.of(List.of(s), GammaKernel.of(2.1, 2.9), KeptFrames.all(times)).get(0);
    assertEquals(2, whole.complete());
    assertEquals(3, whole.all());
    assertEquals(2, count(s, times, 14));
    assertEquals(1, count(s, times, 15));
  }

  private static int count(ModelledStimulus s, FrameTimes times, int lost) {
    List<@Nullable String> reasons = new ArrayList<>();
    for (int t = 0; t < times.size(); t++) {
      reasons.add(t >= 30 && t < 30 + lost ? "power" : null);
    }
    return TrialCount.of(List.of(s), GammaKernel.of(2.1, 2.9), new KeptFrames(times, reasons))
        .get(0)
        .complete();
  }

  @Test
  void aVerdictIsPureAndHasOneWord() {
    assertEquals(judge(facts(101, 4, 0.4)), judge(facts(101, 4, 0.4)));
    assertTrue(judge(facts(0, 10, 1)).reasons().isEmpty());
  }
}
