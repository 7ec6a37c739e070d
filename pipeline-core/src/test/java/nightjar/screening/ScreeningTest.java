package nightjar.screening;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import nightjar.checks.Grids;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ScreeningTest {
  private static final Grid GRID = Grids.of(1, 24, 26);
  private static final int FRAMES = 300;
  private static final FrameTimes TIMES = Grids.everyFrame(FRAMES);
  private static final ScreeningSettings OFF =
      new ScreeningSettings(false, 3.5, 0.05, 1.5, 31, 0.3);

  private static Map<Integer, String> rejected(FrameJudgement j) {
    Map<Integer, String> reasons = new TreeMap<>();
    for (int t = 0; t < j.kept().frames(); t++) {
      int frame = t;
      j.kept().reason(t).ifPresent(r -> reasons.put(frame, r));
    }
    return reasons;
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void keepsEveryFrameOfACleanFilm(long seed) {
    float[][] film = Films.power(FRAMES, GRID, seed, t -> 1);
    assertEquals(Map.of(), rejected(Films.judge(Films.input(film, GRID, TIMES))));
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void findsEveryFlashAndDimFrameAndNothingElse(long seed) {
    Map<Integer, Double> gains = Map.of(0, 1.5, 40, 2.9, 47, 2.2, 130, 0.6, 299, 1.6);
    float[][] film = Films.power(FRAMES, GRID, seed, t -> gains.getOrDefault(t, 1.0));
    Map<Integer, String> reasons = rejected(Films.judge(Films.input(film, GRID, TIMES)));
    assertEquals(gains.keySet(), reasons.keySet());
    assertTrue(reasons.values().stream().allMatch("power+change"::equals), reasons::toString);
  }

  @Test
  void aFrameWhoseImageDiffersAtTheSamePowerIsRejectedForChange() {
    float[][] film = Films.power(FRAMES, GRID, 6, t -> 1);
    for (int v = 0; v < GRID.voxels(); v++) {
      film[90][v] *= v % 2 == 0 ? 1.5f : 1 / 1.5f;
    }
    assertEquals(Map.of(90, "change"), rejected(Films.judge(Films.input(film, GRID, TIMES))));
  }

  /** Twenty responses of two seconds' width every twelve seconds, plateau 1. */
  private static double[] response() {
    double[] r = new double[FRAMES];
    for (int t = 0; t < FRAMES; t++) {
      double s = (t - 7 - 30 * Math.floor((t - 7) / 30.0)) * 0.4 / 1.2;
      r[t] = t < 7 ? 0 : s * s * Math.exp(2 - 2 * s);
    }
    return r;
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void aResponseOfTheWholeFieldIsNoArtefactOnceTheStimuliAreFittedOut(long seed) {
    double[] r = response();
    float[][] film =
        Films.power(FRAMES, GRID, seed, t -> (1 + 0.1 * r[t]) * (t == 100 || t == 222 ? 2 : 1));
    ScreeningInput in = Films.input(film, GRID, TIMES);
    List<NamedSeries> stimuli = List.of(new NamedSeries("puff", r));
    assertEquals(
        List.of(100, 222), List.copyOf(rejected(Films.judge(Films.with(in, stimuli))).keySet()));
    // Without the columns the peaks fall: the case is not an easy one.
    assertTrue(rejected(Films.judge(in)).size() > 10);
  }

  @Test
  void aFrameWithMoreThanHalfOfTheMaskMissingIsADropOutScreeningOnOrOff() {
    float[][] film = Films.power(FRAMES, GRID, 9, t -> t == 50 ? 2 : 1);
    Arrays.fill(film[20], 0, GRID.voxels() / 2, Float.NaN);
    Arrays.fill(film[30], 0, GRID.voxels() / 2 + 1, Float.NaN);
    Arrays.fill(film[31], Float.NaN);
    ScreeningInput in = Films.input(film, GRID, TIMES);
    assertEquals(
        Map.of(30, "missing", 31, "missing", 50, "power+change"), rejected(Films.judge(in)));
    FrameJudgement off = Films.judge(in, OFF, 1);
    assertEquals(Map.of(30, "missing", 31, "missing"), rejected(off));
    // The figures are there all the same.
    assertTrue(off.logPower(50) > off.logPower(49) + 0.5);
    assertTrue(off.change(50) > 3 * off.change(49));
    assertTrue(Double.isNaN(off.logPower(31)) && Double.isNaN(off.change(31)));
  }

  @Test
  void whatLeftTheFieldIsOutsideNotMissing() {
    float[][] film = Films.power(FRAMES, GRID, 10, t -> 1);
    Arrays.fill(film[20], 0, GRID.voxels() / 2 + 1, Float.NaN);
    Arrays.fill(film[60], 0, GRID.voxels() / 2 + 1, Float.NaN);
    ScreeningInput in = Films.with(Films.input(film, GRID, TIMES), (t, v) -> t == 20 || v < 100);
    assertEquals(Map.of(20, "outside", 60, "missing"), rejected(Films.judge(in)));
  }

  @Test
  void missingVoxelsDoNotShiftTheMeanOfThoseThatAreThere() {
    float[][] film = Films.power(FRAMES, GRID, 11, t -> 1);
    for (int t = 100; t < 200; t++) {
      // The brightest third is gone.
      for (int v = 0; v < GRID.voxels(); v++) {
        film[t][v] = film[0][v] > 1.4f ? Float.NaN : film[t][v];
      }
    }
    assertEquals(Map.of(), rejected(Films.judge(Films.input(film, GRID, TIMES))));
  }

  @Test
  void displacementCountsFromTheMedianPosition() {
    float[][] film = Films.power(FRAMES, GRID, 12, t -> t == 71 ? 2 : 1);
    ScreeningInput in = Films.input(film, GRID, TIMES);
    ScreeningInput moved =
        Films.shifted(in, t -> t < 10 ? 0.75 : t == 70 || t == 71 ? 1.32 : 1 + 0.01 * (t % 3));
    assertEquals(
        Map.of(70, "displacement", 71, "power+change+displacement"), rejected(Films.judge(moved)));
    assertEquals(Map.of(), rejected(Films.judge(moved, OFF, 1)));
  }

  @Test
  void aFrameRejectedInOnePlaneIsRejectedInAll() {
    Grid grid = Grids.of(3, 24, 26);
    float[][] film = Films.power(FRAMES, grid, 13, t -> 1);
    for (int v = 2 * grid.planeVoxels(); v < grid.voxels(); v++) {
      film[120][v] *= 1.4f;
    }
    FrameJudgement all = Films.judge(Films.input(film, grid, TIMES));
    assertEquals(Map.of(120, "power+change"), rejected(all));
  }

  @Test
  void aPlaneWithoutMaskIsNotJudged() {
    Grid grid = Grids.of(2, 24, 26);
    float[][] film = Films.power(FRAMES, grid, 14, t -> 1);
    Arrays.fill(film[120], grid.planeVoxels(), grid.voxels(), Float.NaN);
    ScreeningInput in = Films.input(film, grid, TIMES);
    ScreeningInput masked =
        new ScreeningInput(
            in.film(),
            grid,
            TIMES,
            Mask.of(grid.voxels(), v -> grid.planeOf(v) == 0),
            in.motion(),
            in.outside(),
            in.stimuli(),
            1);
    assertEquals(Map.of(), rejected(Films.judge(masked)));
  }

  @Test
  void aStepOfPowerAtAGapIsNoArtefact() {
    FrameTimes gap = Grids.withGap(FRAMES, 150);
    float[][] film = Films.power(FRAMES, GRID, 15, t -> t < 150 ? 1 : 1.3);
    assertEquals(Map.of(), rejected(Films.judge(Films.input(film, GRID, gap))));
  }

  @ParameterizedTest
  @ValueSource(floats = {1e-6f, 0.37f, 4096f})
  void keptFramesDoNotDependOnTheUnitOfPower(float unit) {
    float[][] film = Films.power(FRAMES, GRID, 16, t -> t % 50 == 7 ? 1.7 : 1);
    ScreeningInput in = Films.input(film, GRID, TIMES);
    for (float[] frame : film) {
      for (int v = 0; v < frame.length; v++) {
        frame[v] *= unit;
      }
    }
    ScreeningInput scaled =
        new ScreeningInput(
            Films.rows(film),
            GRID,
            TIMES,
            in.mask(),
            in.motion(),
            in.outside(),
            in.stimuli(),
            unit);
    assertEquals(rejected(Films.judge(in)), rejected(Films.judge(scaled)));
    assertEquals(6, rejected(Films.judge(scaled)).size());
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 4})
  void isTheSameForAnyNumberOfThreads(int threads) {
    Grid grid = Grids.of(2, 24, 26);
    float[][] film = Films.power(FRAMES, grid, 17, t -> t % 60 == 3 ? 1.5 : 1);
    ScreeningInput in = Films.input(film, grid, TIMES);
    FrameJudgement a = Films.judge(in, ScreeningSettings.DEFAULT, threads);
    FrameJudgement b = Films.judge(in, ScreeningSettings.DEFAULT, 3);
    assertEquals(rejected(a), rejected(b));
    for (int t = 0; t < FRAMES; t++) {
      assertEquals(a.logPower(t), b.logPower(t));
      assertEquals(a.change(t), b.change(t));
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2})
  void figuresEqualThoseOfThePlainDefinition(int planes) {
    Grid grid = Grids.of(planes, 16, 15);
    FrameTimes gap = Grids.withGap(90, 66);
    float[][] film = Films.power(90, grid, 18, t -> t == 30 ? 2 : 1);
    film[40][100] = 0;
    if (planes == 1) {
      // In several planes each counts by all its voxels, missing or not.
      film[66][101] = Float.NaN;
      film[23][102] = Float.NaN;
    }
    FrameJudgement judged = Films.judge(Films.input(film, grid, gap));
    List<Integer> inner = new ArrayList<>();
    for (int v = 0; v < grid.voxels(); v++) {
      int z = grid.depthOf(v);
      int x = grid.lateralOf(v);
      if (z >= 2 && z < 14 && x >= 2 && x < 13) {
        inner.add(v);
      }
    }
    for (int t = 0; t < 90; t++) {
      double sum = 0;
      double square = 0;
      int n = 0;
      for (int v : inner) {
        double ln = Math.log(Math.max(film[t][v], 1e-3));
        sum += ln;
        int from = Math.max(t < 66 ? 0 : 66, t - 2);
        int to = Math.min(t < 66 ? 65 : 89, t + 2);
        List<Double> around = new ArrayList<>();
        for (int i = from; i <= to; i++) {
          if (!Float.isNaN(film[i][v])) {
            around.add(Math.log(Math.max(film[i][v], 1e-3)));
          }
        }
        around.sort(null);
        int m = around.size();
        double median =
            m % 2 == 1 ? around.get(m / 2) : 0.5 * (around.get(m / 2) + around.get(m / 2 - 1));
        square += Double.isNaN(ln) ? 0 : (ln - median) * (ln - median);
        n += Double.isNaN(ln) ? 0 : 1;
      }
      // Differences are kept as float32.
      assertEquals(Math.sqrt(square / n), judged.change(t), 1e-6, "change of " + t);
      if (n == inner.size()) {
        assertEquals(sum / n, judged.logPower(t), 1e-6, "log power of " + t);
      }
    }
  }
}
