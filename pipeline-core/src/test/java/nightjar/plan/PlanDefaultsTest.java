package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.alignment.AlignmentSettings;
import nightjar.design.DriftSettings;
import nightjar.design.GammaKernel;
import nightjar.design.NuisanceSettings;
import nightjar.glm.NoiseSettings;
import nightjar.inference.InferenceSettings;
import nightjar.mask.MaskSettings;
import nightjar.mask.Scale;
import nightjar.regions.RegionSource;
import nightjar.regions.ResponseSettings;
import nightjar.screening.ScreeningSettings;
import nightjar.verdict.VerdictLimits;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.snakeyaml.engine.v2.api.Load;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.schema.CoreSchema;

/** The defaults as the table in {@code shared/plan.md} gives them, written out a second time. */
class PlanDefaultsTest {
  private static final String ALL =
      """
      name: p
      recording: {variable: null, frame_interval_s: null}
      screening: {enabled: true, z_limit: 3.5, min_power_deviation: 0.05, min_change_ratio: 1.5,
        window_frames: 31, max_displacement_mm: 0.3}
      alignment: {model: rigid, scope: plane, reference: typical}
      smoothing: {fwhm_mm: 0}
      mask: {source: auto}
      scale: percent
      kernel: {shape: gamma, peak_s: 2.1, fwhm_s: 2.9, derivative: false}
      stimuli:
        a: {logged_as: a, modulator: null}
        b: {logged_as: b, modulator: null}
      drift: {cutoff_s: 120}
      nuisance: {motion: [], components: 0, noise_region: outside_mask, mask_mean: false,
        segments: true, traces: []}
      traces: {}
      noise: {model: ar1, smoothing_mm: 0, df: effective}
      contrasts:
        - {name: a_over_b, weights: {a: 1, b: -1}}
      inference: {tail: both, method: bh, level: 0.05, randomisations: 0, statistics: [max_t],
        cluster_p: 0.001, seed: 20260301}
      regions: {source: recording}
      responses: {before_s: 5, after_s: 20, window_s: [1, 6]}
      sham_check: {shams: 0}
      verdict: {rejected_review: 0.10, rejected_unusable: 0.30, displacement_voxels: 0.5, tsnr: 5,
        trials: 5, variance_inflation: 5, motion_r: 0.3, effect_change: 0.25,
        sham_p05: [0.03, 0.08], sham_p001: 0.005, sham_discoveries: 0.20, coverage: 0.5}
      """;

  private static final List<String> STIMULI = List.of("a", "b");

  @Test
  void onlyContrastsMustBeThere() {
    Plan plan = Plans.with("");
    assertEquals("p", plan.name());
    assertNull(plan.variable());
    assertNull(plan.frameIntervalSeconds());
    assertEquals(new ScreeningSettings(true, 3.5, 0.05, 1.5, 31, 0.3), plan.screening());
    assertEquals(AlignmentSettings.Model.RIGID, plan.alignment().model());
    assertEquals(AlignmentSettings.Scope.PLANE, plan.alignment().scope());
    assertEquals(AlignmentSettings.Reference.TYPICAL, plan.alignment().reference());
    assertEquals(0, plan.smoothingMillimetres());
    assertEquals(MaskSettings.AUTO, plan.mask());
    assertEquals(Scale.PERCENT, plan.scale());
    assertEquals(GammaKernel.of(2.1, 2.9), plan.kernel());
    assertFalse(plan.kernelDerivative());
    assertEquals(List.of(), plan.stimuli());
    assertEquals(new DriftSettings(120), plan.drift());
    assertEquals(new NuisanceSettings(java.util.Set.of(), true), plan.nuisance());
    assertEquals(
        new NoiseSettings(NoiseSettings.Model.AR1, 0, NoiseSettings.DegreesOfFreedom.EFFECTIVE),
        plan.noise());
    assertEquals(new InferenceSettings(InferenceSettings.Adjustment.BH, 0.05), plan.inference());
    assertEquals(RegionSource.RECORDING, plan.regions());
    assertEquals(new ResponseSettings(5, 20, 1, 6), plan.responses());
    assertEquals(
        new VerdictLimits(0.1, 0.3, 0.5, 5, 5, 5, 0.3, 0.25, 0.03, 0.08, 0.005, 0.2, 0.5),
        plan.verdict());
  }

  @Test
  void theResolvedPlanIsTheWholeContractInItsOrder() {
    Map<String, Object> expected = loaded(ALL);
    Map<String, Object> resolved = ResolvedPlan.toMap(Plans.with(""), STIMULI);
    assertEquals(plain(expected), plain(resolved));
    assertEquals(keys(expected), keys(resolved));
  }

  @Test
  void everyDefaultMayStandInAPlan() {
    Plan written = PlanFile.parse(ALL, "p.yaml");
    assertEquals(ResolvedPlan.toMap(Plans.with(""), STIMULI), ResolvedPlan.toMap(written, STIMULI));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "nuisance: {components: 0.0}",
        "nuisance: {mask_mean: False}",
        "nuisance: {traces: []}",
        "inference: {randomisations: 0, statistics: [max_t], cluster_p: 1e-3}",
        "sham_check: {shams: 0}",
        "sham_check: {}",
        "traces: {}",
        "traces: null",
        "kernel: {file: null, bin_s: null, until_s: null, undershoot_ratio: null}",
        "recording: {frame_interval_s: null, variable: ~}",
      })
  void whatSwitchesAnAbsentFeatureOffChangesNothing(String rest) {
    assertEquals(Plans.with(""), Plans.with(rest));
  }

  @SuppressWarnings("unchecked")
  private static Map<String, Object> loaded(String yaml) {
    LoadSettings settings = LoadSettings.builder().setSchema(new CoreSchema()).build();
    return (Map<String, Object>) new Load(settings).loadFromString(yaml);
  }

  /** Numbers of any type as doubles, so that 5 equals 5.0. */
  private static Object plain(Object value) {
    if (value instanceof Map<?, ?> m) {
      Map<Object, Object> all = new LinkedHashMap<>();
      m.forEach((k, v) -> all.put(k, v == null ? "null" : plain(v)));
      return all;
    }
    if (value instanceof List<?> l) {
      return l.stream().map(PlanDefaultsTest::plain).toList();
    }
    return value instanceof Number n ? n.doubleValue() : value;
  }

  private static List<String> keys(Map<?, ?> map) {
    List<String> all = new ArrayList<>();
    map.forEach(
        (k, v) -> {
          all.add(String.valueOf(k));
          if (v instanceof Map<?, ?> m) {
            all.addAll(keys(m));
          }
        });
    return all;
  }
}
