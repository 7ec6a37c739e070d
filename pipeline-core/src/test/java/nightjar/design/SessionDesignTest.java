package nightjar.design;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import nightjar.checks.CheckValues;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.NamedSeries;
import nightjar.recording.RigidMotion;
import nightjar.recording.Trial;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;

class SessionDesignTest {
  private static final Kernel KERNEL = GammaKernel.of(2.1, 2.9);

  private static FrameTimes times(int n, double dt, double offset) {
    double[] t = new double[n];
    for (int i = 0; i < n; i++) {
      t[i] = offset + (i + 0.5) * dt;
    }
    return FrameTimes.of(t);
  }

  private static ModelledStimulus stimulus(String name, double offset, double... onsets) {
    List<Trial> trials = new ArrayList<>();
    for (double o : onsets) {
      trials.add(new Trial(name, o + offset, 2, null, Map.of(), 2));
    }
    return new ModelledStimulus(name, trials);
  }

  private static DesignRequest request(List<ModelledStimulus> stimuli, double cutoff) {
    return new DesignRequest(stimuli, KERNEL, false, new DriftSettings(cutoff), true, List.of());
  }

  private static final double[] ONE_CLOCK = {0};

  @Test
  void aLongStimulusReachesAPlateauOfOne() {
    FrameTimes times = times(200, 0.4, 0);
    ModelledStimulus s =
        new ModelledStimulus("long", List.of(new Trial("long", 10, 40, null, Map.of(), 2)));
    double[] column = StimulusColumns.response(s, KERNEL, times, 0);
    assertEquals(1, column[112], 1e-9);
    assertEquals(0, column[24]);
  }

  @Test
  void aStimulusColumnIsTheConvolutionOnAFineGrid() {
    FrameTimes times = times(100, 0.4, 0);
    ModelledStimulus s = stimulus("a", 0, 3.07, 11.3, 12.9);
    double[] column = StimulusColumns.response(s, KERNEL, times, 0);
    double h = 1e-3;
    for (int t = 0; t < column.length; t += 7) {
      double sum = 0;
      for (Trial trial : s.trials()) {
        for (double u = h / 2; u < trial.durationSeconds(); u += h) {
          sum += h * KERNEL.at(times.at(t) - trial.onsetSeconds() - u);
        }
      }
      // Midpoint rule with steps of 1 ms.
      assertEquals(sum, column[t], 1e-6);
    }
  }

  @Test
  void anImpulseAddsTheKernelTimesOneSecond() {
    FrameTimes times = times(50, 0.4, 0);
    ModelledStimulus s =
        new ModelledStimulus("i", List.of(new Trial("i", 4, 0, null, Map.of(), 2)));
    double[] column = StimulusColumns.response(s, KERNEL, times, 0);
    assertEquals(KERNEL.at(times.at(15) - 4), column[15], 1e-15);
  }

  @Test
  void driftIsTheDiscreteCosineTransformsBasis() {
    for (CheckValues.Row row : CheckValues.read("design/dct2_orthonormal.csv")) {
      int n = (int) row.number("N");
      int k = (int) row.number("k");
      if (k > 0 && n > 1) {
        FrameTimes times = times(n, 0.4, 7);
        List<DesignColumn> columns =
            DriftColumns.of(times, new DriftSettings(2 * n * 0.4 / (n - 0.5)), 0);
        double scale = Math.sqrt(2.0 / n);
        assertEquals(row.number("b"), scale * columns.get(k - 1).at((int) row.number("n")), 1e-12);
      }
    }
  }

  @Test
  void theNumberOfDriftColumnsFollowsLengthAndCutoff() {
    for (CheckValues.Row row : CheckValues.read("design/dct_highpass_order.csv")) {
      double length = row.number("n_frames") * row.number("dt_s");
      assertEquals(
          (int) row.number("n_regressors_without_constant"),
          DriftColumns.count(length, new DriftSettings(row.number("cutoff_s"))));
    }
    assertEquals(0, DriftColumns.count(1000, new DriftSettings(Double.POSITIVE_INFINITY)));
  }

  @Test
  void columnsStandInTheContractsOrder() {
    double[] t = new double[300];
    for (int i = 0; i < t.length; i++) {
      t[i] = 0.4 * i + (i > 150 ? 20 : 0);
    }
    FrameTimes times = FrameTimes.of(t);
    double[] run = new SplittableRandom(3).doubles(t.length).toArray();
    DesignRequest r =
        new DesignRequest(
            List.of(stimulus("b", 0, 5, 30, 90), stimulus("a", 0, 15, 45, 100)),
            KERNEL,
            true,
            new DriftSettings(120),
            true,
            List.of(new NamedSeries("shift_depth", run)));
    SessionDesign d = SessionDesign.build(r, KeptFrames.all(times), ONE_CLOCK);
    assertEquals(
        List.of(
            "b",
            "a",
            "b:slope",
            "a:slope",
            "slow_1",
            "slow_2",
            "shift_depth",
            "segment_2",
            "level"),
        d.ofPlane(0).names());
    assertEquals(List.of(), d.warnings());
  }

  @Test
  void aConstantAddedToAllTimesChangesNothing() {
    SessionDesign a =
        SessionDesign.build(
            request(List.of(stimulus("a", 0, 5, 30, 60)), 60),
            KeptFrames.all(times(250, 0.4, 0)),
            ONE_CLOCK);
    SessionDesign b =
        SessionDesign.build(
            request(List.of(stimulus("a", 4096, 5, 30, 60)), 60),
            KeptFrames.all(times(250, 0.4, 4096)),
            ONE_CLOCK);
    for (int j = 0; j < a.ofPlane(0).columns().size(); j++) {
      for (int t = 0; t < 250; t++) {
        // Times near 4096 s carry 1e-12 s; the columns' slopes are of order 1 per second.
        assertEquals(
            a.ofPlane(0).columns().get(j).at(t), b.ofPlane(0).columns().get(j).at(t), 1e-10);
      }
    }
  }

  @Test
  void refusesDriftThatTakesTheStimuliAway() {
    DesignRequest r = request(List.of(stimulus("a", 0, 5, 15, 25, 35)), 2);
    RefusedInput e =
        assertThrows(
            RefusedInput.class,
            () -> SessionDesign.build(r, KeptFrames.all(times(120, 0.4, 0)), ONE_CLOCK));
    assertTrue(
        e.getMessage().contains("drift cutoff_s 2: drift removal would take the stimulus a"));
  }

  @Test
  void warnsWhereDriftTakesMuchOfAStimulus() {
    double[] onsets = new double[5];
    for (int i = 0; i < onsets.length; i++) {
      onsets[i] = 5 + 16 * i;
    }
    SessionDesign d =
        SessionDesign.build(
            request(List.of(stimulus("a", 0, onsets)), 9),
            KeptFrames.all(times(220, 0.4, 0)),
            ONE_CLOCK);
    assertEquals(1, d.warnings().size());
    assertTrue(d.warnings().get(0).contains("of the variance of the stimulus a"));
  }

  @Test
  void refusesStimuliThatCannotBeToldApartAndNamesBoth() {
    DesignRequest r =
        request(
            List.of(stimulus("a", 0, 5, 30), stimulus("b", 0, 12, 40), stimulus("c", 0, 5, 30)),
            60);
    RefusedInput e =
        assertThrows(
            RefusedInput.class,
            () -> SessionDesign.build(r, KeptFrames.all(times(120, 0.4, 0)), ONE_CLOCK));
    assertTrue(e.getMessage().contains("the stimulus columns a and c cannot be told apart"));
  }

  @Test
  void refusesAStimulusWithoutAKeptFrame() {
    FrameTimes times = times(120, 0.4, 0);
    List<String> reasons = new ArrayList<>(Collections.nCopies(120, ""));
    DesignRequest r = request(List.of(stimulus("a", 0, 5, 15), stimulus("late", 0, 44)), 60);
    RefusedInput e =
        assertThrows(
            RefusedInput.class,
            () ->
                SessionDesign.build(
                    r,
                    new KeptFrames(
                        times,
                        java.util.stream.IntStream.range(0, reasons.size())
                            .<String>mapToObj(i -> i > 109 ? "change" : null)
                            .collect(
                                java.util.ArrayList::new, java.util.ArrayList::add, List::addAll)),
                    ONE_CLOCK));
    assertTrue(e.getMessage().contains("column late: no kept frame shows a response"));
  }

  @Test
  void dropsDependentNuisanceWithAWarning() {
    FrameTimes times = times(120, 0.4, 0);
    double[] ones = new double[120];
    java.util.Arrays.fill(ones, 3);
    DesignRequest r =
        request(List.of(stimulus("a", 0, 5, 15)), 60)
            .withNuisance(List.of(new NamedSeries("constant", ones)));
    SessionDesign d = SessionDesign.build(r, KeptFrames.all(times), ONE_CLOCK);
    assertEquals(-1, d.ofPlane(0).indexOf("constant"));
    assertEquals(
        List.of("The nuisance column constant depends on other columns and was left out."),
        d.warnings());
  }

  @Test
  void refusesMoreColumnsThanFrames() {
    DesignRequest r = request(List.of(stimulus("a", 0, 1, 4)), 1);
    assertThrows(
        RefusedInput.class,
        () -> SessionDesign.build(r, KeptFrames.all(times(20, 0.4, 0)), ONE_CLOCK));
  }

  @Test
  void sweptPlanesHaveTheirOwnClocks() {
    FrameTimes times = times(120, 0.8, 0);
    SessionDesign d =
        SessionDesign.build(
            request(List.of(stimulus("a", 0, 5, 25, 60)), 60),
            KeptFrames.all(times),
            new double[] {-0.4, 0, 0.4});
    assertEquals(3, d.planes().size());
    double[] late = StimulusColumns.response(stimulus("a", -0.4, 5, 25, 60), KERNEL, times, 0);
    for (int t = 0; t < 120; t++) {
      assertEquals(late[t], d.ofPlane(2).columns().get(0).at(t), 1e-12);
    }
    DesignMatrix mean = DesignMatrix.average(d.planes(), new double[] {0.5, 0, 0.5});
    assertEquals(
        (d.ofPlane(0).columns().get(0).at(9) + d.ofPlane(2).columns().get(0).at(9)) / 2,
        mean.columns().get(0).at(9),
        1e-15);
  }

  @Test
  void motionColumnsArePositionSquareAndDifference() {
    List<List<RigidMotion>> m = new ArrayList<>();
    for (int t = 0; t < 4; t++) {
      m.add(
          List.of(
              new RigidMotion(t * 0.1, 0, 0, 0, 0, 0), new RigidMotion(t * 0.3, 0, 0, 0, 0, 0)));
    }
    FrameMotion motion = new FrameMotion(false, m, new double[4][2]);
    FrameTimes times = FrameTimes.of(new double[] {0, 1, 2, 30});
    List<NamedSeries> columns =
        MotionColumns.of(
            motion,
            times,
            new NuisanceSettings(
                java.util.EnumSet.allOf(NuisanceSettings.MotionColumns.class), true));
    assertEquals(
        List.of("shift_depth", "square:shift_depth", "difference:shift_depth"),
        columns.stream().map(NamedSeries::name).toList());
    assertArrayEquals(new double[] {0, 0.2, 0.4, 0.6}, columns.get(0).toArray(), 1e-15);
    assertArrayEquals(new double[] {0, 0.04, 0.16, 0.36}, columns.get(1).toArray(), 1e-15);
    // The last frame begins a segment.
    assertArrayEquals(new double[] {0, 0.2, 0.2, 0}, columns.get(2).toArray(), 1e-15);
  }
}
