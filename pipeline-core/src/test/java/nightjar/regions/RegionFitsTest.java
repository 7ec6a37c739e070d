package nightjar.regions;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.function.IntToDoubleFunction;
import java.util.stream.IntStream;
import nightjar.design.DesignBasis;
import nightjar.design.DesignRequest;
import nightjar.design.DriftSettings;
import nightjar.design.GammaKernel;
import nightjar.design.ModelledStimulus;
import nightjar.design.SessionDesign;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.glm.Contrast;
import nightjar.glm.LinearModel;
import nightjar.glm.NoiseSettings;
import nightjar.inference.InferenceSettings;
import nightjar.numeric.Workers;
import nightjar.recording.Axis;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.PlaneOffsets;
import nightjar.recording.Region;
import nightjar.recording.Trial;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** Regions of films whose responses are known. */
class RegionFitsTest {
  private static final double DT = 0.5;
  private static final int FRAMES = 400;

  /** Noise, percent, that leaves residuals to fit; a mean of two voxels stays within 5 times it. */
  private static final double FAINT = 1e-3;

  private static final GammaKernel KERNEL = GammaKernel.of(2.1, 2.9);
  private static final Grid GRID =
      new Grid(Axis.of(0), Axis.of(0, 0.1), Axis.of(0, 0.1, 0.2), false);
  private static final Region FIRST = new Region("first", Mask.of(6, v -> v < 2));
  private static final Region REST = new Region("rest", Mask.of(6, v -> v >= 2));
  private static final Region NOWHERE = new Region("nowhere", Mask.of(6, v -> false));

  private static final List<Trial> LEFT =
      List.of(trial("left", 10), trial("left", 44), trial("left", 100), trial("left", 150));
  private static final List<Trial> SHAM =
      List.of(trial("sham", 14), trial("sham", 70), trial("sham", 104), trial("sham", 175));

  private static final List<Contrast> CONTRASTS =
      List.of(new Contrast("left_over_sham", Map.of("left", 1.0, "sham", -1.0)));

  private static Trial trial(String name, double onset) {
    return new Trial(name, onset, 2, null, Map.of(), 2);
  }

  private static RegionModel model(KeptFrames kept) {
    DesignRequest request =
        new DesignRequest(
            List.of(new ModelledStimulus("left", LEFT), new ModelledStimulus("sham", SHAM)),
            KERNEL,
            false,
            DriftSettings.DEFAULT,
            true,
            List.of());
    SessionDesign design = SessionDesign.build(request, kept, new double[] {0});
    return new RegionModel(
        LinearModel.of(
            DesignBasis.of(design.ofPlane(0), kept), CONTRASTS, List.of(), NoiseSettings.DEFAULT),
        design,
        request,
        PlaneOffsets.of(0),
        kept,
        CONTRASTS,
        NoiseSettings.DEFAULT,
        InferenceSettings.DEFAULT);
  }

  private static KeptFrames kept(int... rejected) {
    FrameTimes times = FrameTimes.of(IntStream.range(0, FRAMES).mapToDouble(t -> t * DT).toArray());
    List<@Nullable String> reasons = new ArrayList<>();
    for (int t = 0; t < FRAMES; t++) {
      int frame = t;
      reasons.add(IntStream.of(rejected).anyMatch(r -> r == frame) ? "power" : null);
    }
    return new KeptFrames(times, reasons);
  }

  /** Response of the stimuli by the definition: sum of differences of the cumulative kernel. */
  private static double response(List<Trial> trials, double t) {
    return trials.stream()
        .mapToDouble(
            x ->
                KERNEL.cumulative(t - x.onsetSeconds())
                    - KERNEL.cumulative(t - x.onsetSeconds() - 2))
        .sum();
  }

  private static FloatRows film(
      KeptFrames kept, IntToDoubleFunction first, long seed, double noise) {
    SplittableRandom random = new SplittableRandom(seed);
    FloatRows rows = Scratch.ofThisMachine().allocate(kept.count(), 6);
    for (int i = 0; i < kept.count(); i++) {
      float[] row = new float[6];
      for (int v = 0; v < 6; v++) {
        double signal = v < 2 ? first.applyAsDouble(kept.frame(i)) : 0;
        row[v] = (float) (signal + noise * random.nextGaussian());
      }
      rows.write(i, 0, 6, row, 0);
    }
    return rows;
  }

  private static RegionFits fit(KeptFrames kept, FloatRows film, List<Region> regions) {
    try (Workers workers = new Workers(2)) {
      RegionSeries series =
          RegionSeries.of(
              film, Mask.all(6).order(), GRID, regions, Scratch.ofThisMachine(), workers);
      return RegionFits.of(model(kept), series, workers);
    }
  }

  @Test
  void findsThePlantedEffectAndKeepsRegionsWithoutVoxels() {
    KeptFrames kept = kept(3, 50, 51);
    FloatRows film =
        film(kept, t -> 6 * response(LEFT, t * DT) + 2 * response(SHAM, t * DT), 5, 0.3);
    RegionFits fits = fit(kept, film, List.of(FIRST, NOWHERE, REST));
    List<RegionContrast> rows = fits.contrasts(List.of(FIRST, NOWHERE, REST));
    assertEquals(List.of("first", "nowhere", "rest"), rows.stream().map(r -> r.region()).toList());
    RegionContrast first = rows.get(0);
    assertEquals(4, first.effectPercent(), 3.5 * first.standardErrorPercent());
    assertTrue(first.lowPercent() < 4 && 4 < first.highPercent());
    assertEquals(2, first.voxels());
    assertEquals(0, rows.get(1).voxels());
    assertTrue(Double.isNaN(rows.get(1).p()));
    assertTrue(Math.abs(rows.get(2).t()) < 4);
    // Two tests: the smaller p doubles at most, the larger stays.
    List<RegionContrast> byP =
        rows.stream()
            .filter(r -> r.voxels() > 0)
            .sorted(Comparator.comparingDouble(RegionContrast::p))
            .toList();
    assertEquals(byP.get(1).p(), byP.get(1).q(), 1e-15);
    assertEquals(Math.min(2 * byP.get(0).p(), byP.get(1).p()), byP.get(0).q(), 1e-15);
  }

  @Test
  void timeCoursesLoseTheDriftAndKeepTheResponse() {
    KeptFrames kept = kept();
    double length = FRAMES * DT;
    FloatRows film =
        film(
            kept,
            t ->
                5 * response(LEFT, t * DT)
                    + 30 * Math.cos(Math.PI * 2 * (t + 0.5) * DT / length)
                    - 7 * Math.cos(Math.PI * (t + 0.5) * DT / length),
            1,
            FAINT);
    double[][] courses = fit(kept, film, List.of(FIRST)).timeCourses();
    for (int t = 0; t < FRAMES; t++) {
      assertEquals(5 * response(LEFT, t * DT), courses[0][t], 5 * FAINT);
    }
  }

  @Test
  void aNeighboursResponseDoesNotReachTheEventLockedMean() {
    KeptFrames kept = kept();
    // Sham trials follow left ones after 4 s twice; only left responds.
    FloatRows film = film(kept, t -> 6 * response(LEFT, t * DT), 2, FAINT);
    RegionFits fits = fit(kept, film, List.of(FIRST));
    EventLockedResponses e = EventLockedResponses.of(fits, ResponseSettings.DEFAULT);
    for (ResponseBin b : e.bins()) {
      if (b.stimulus().equals("sham")) {
        assertEquals(0, b.meanPercent(), 5 * FAINT);
      } else {
        List<Trial> one = List.of(trial("left", 0));
        assertEquals(6 * response(one, b.lagSeconds()), b.meanPercent(), 5 * FAINT);
      }
      assertEquals(4, b.trials());
    }
    assertEquals(8, e.trials().size());
    assertEquals(2 * 51, e.bins().size());
    assertEquals(-5, e.bins().get(0).lagSeconds(), 1e-12);
    assertEquals(20, e.bins().get(50).lagSeconds(), 1e-12);
    double window =
        IntStream.rangeClosed(2, 12)
            .mapToDouble(j -> 6 * response(List.of(trial("left", 0)), j * DT))
            .average()
            .orElseThrow();
    assertEquals(window, e.trials().get(0).meanPercent(), 5 * FAINT);
    assertEquals(11, e.trials().get(0).frames());
  }

  @Test
  void aTrialWithoutAFrameBeforeItsOnsetIsLeftOut() {
    int[] before = IntStream.range(10, 20).toArray();
    KeptFrames kept = kept(before);
    FloatRows film = film(kept, t -> 6 * response(LEFT, t * DT), 3, 0.1);
    EventLockedResponses e =
        EventLockedResponses.of(fit(kept, film, List.of(FIRST)), ResponseSettings.DEFAULT);
    TrialValue first = e.trials().get(0);
    assertEquals(0, first.frames());
    assertTrue(Double.isNaN(first.meanPercent()));
    assertTrue(
        e.bins().stream().filter(b -> b.stimulus().equals("left")).allMatch(b -> b.trials() <= 3));
  }
}
