package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import nightjar.alignment.AlignmentSettings;
import nightjar.design.DoubleGammaKernel;
import nightjar.design.DriftSettings;
import nightjar.design.GammaKernel;
import nightjar.design.NuisanceSettings.MotionColumns;
import nightjar.design.StimulusSettings;
import nightjar.glm.Contrast;
import nightjar.glm.NoiseSettings;
import nightjar.inference.InferenceSettings;
import nightjar.mask.MaskSettings;
import nightjar.mask.Scale;
import nightjar.regions.RegionSource;
import nightjar.regions.ResponseSettings;
import nightjar.screening.ScreeningSettings;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Values that a plan gives reach the settings that they are meant for. */
class PlanValuesTest {
  @Test
  void recordingKeysAreRead() {
    Plan plan = Plans.with("recording: {variable: pd, frame_interval_s: 0.4}");
    assertEquals("pd", plan.variable());
    assertEquals(0.4, plan.frameInterval().orElseThrow());
  }

  @Test
  void screeningKeysAreRead() {
    Plan plan =
        Plans.with(
            "screening: {enabled: false, z_limit: 4, min_power_deviation: 0.1,"
                + " min_change_ratio: 2, window_frames: 15, max_displacement_mm: 0.2}");
    assertEquals(new ScreeningSettings(false, 4, 0.1, 2, 15, 0.2), plan.screening());
  }

  @ParameterizedTest
  @CsvSource({"typical, -1", "first, 0", "0, 0", "17, 17"})
  void theReferenceIsAWordOrAFrame(String word, int frame) {
    assertEquals(
        new AlignmentSettings(
            AlignmentSettings.Model.TRANSLATION,
            AlignmentSettings.Scope.VOLUME,
            new AlignmentSettings.Reference(frame)),
        Plans.with("alignment: {model: translation, scope: volume, reference: " + word + "}")
            .alignment());
  }

  @ParameterizedTest
  @EnumSource(MaskSettings.class)
  void masksAreRead(MaskSettings mask) {
    assertEquals(mask, Plans.with("mask: {source: " + word(mask) + "}").mask());
  }

  @ParameterizedTest
  @EnumSource(Scale.class)
  void scalesAreRead(Scale scale) {
    assertEquals(scale, Plans.with("scale: " + word(scale)).scale());
  }

  @ParameterizedTest
  @EnumSource(RegionSource.class)
  void regionSourcesAreRead(RegionSource source) {
    assertEquals(source, Plans.with("regions: {source: " + word(source) + "}").regions());
  }

  @ParameterizedTest
  @EnumSource(InferenceSettings.Adjustment.class)
  void adjustmentsAreRead(InferenceSettings.Adjustment method) {
    assertEquals(
        new InferenceSettings(method, 0.1),
        Plans.with("inference: {method: " + word(method) + ", level: 0.1}").inference());
  }

  @Test
  void kernelsAreRead() {
    Plan gamma = Plans.with("kernel: {peak_s: 3, fwhm_s: 2, derivative: true}");
    assertEquals(GammaKernel.of(3, 2), gamma.kernel());
    assertTrue(gamma.kernelDerivative());
    Plan twice =
        Plans.with(
            "kernel: {shape: double_gamma, peak_s: 5, fwhm_s: 5, undershoot_peak_s: 12,"
                + " undershoot_fwhm_s: 8, undershoot_ratio: 0.2}");
    assertEquals(
        new DoubleGammaKernel(GammaKernel.of(5, 5), GammaKernel.of(12, 8), 0.2), twice.kernel());
  }

  @Test
  void stimuliAreRead() {
    Plan plan =
        Plans.with(
            "stimuli: {left: {logged_as: 'puff, left'}, b: null, c: {}, calibration click: ignore}");
    assertEquals(
        List.of(
            new StimulusSettings("left", "puff, left", false),
            new StimulusSettings("b", "b", false),
            new StimulusSettings("c", "c", false),
            new StimulusSettings("calibration click", "calibration click", true)),
        plan.stimuli());
  }

  @Test
  void noCutoffMeansNoDriftColumns() {
    DriftSettings none = new DriftSettings(Double.POSITIVE_INFINITY);
    assertEquals(none, Plans.with("drift: {cutoff_s: null}").drift());
    assertEquals(none, Plans.with("drift: null").drift());
    assertEquals(new DriftSettings(90.5), Plans.with("drift: {cutoff_s: 90.5}").drift());
  }

  @Test
  void nuisanceAndNoiseAreRead() {
    Plan plan =
        Plans.with(
            """
            nuisance: {motion: [square, position], segments: false}
            noise: {model: white, smoothing_mm: 0.5, df: residual}
            smoothing: {fwhm_mm: 0.25}
            """);
    assertEquals(
        EnumSet.of(MotionColumns.POSITION, MotionColumns.SQUARE), plan.nuisance().motion());
    assertEquals(false, plan.nuisance().segments());
    assertEquals(
        new NoiseSettings(NoiseSettings.Model.WHITE, 0.5, NoiseSettings.DegreesOfFreedom.RESIDUAL),
        plan.noise());
    assertEquals(0.25, plan.smoothingMillimetres());
  }

  @Test
  void responsesAndVerdictAreRead() {
    Plan plan =
        Plans.with(
            """
            responses: {before_s: 2, after_s: 12, window_s: [-1, 3.5]}
            verdict: {trials: 8, sham_p05: [0.02, 0.1], coverage: 0.75}
            """);
    assertEquals(new ResponseSettings(2, 12, -1, 3.5), plan.responses());
    assertEquals(8, plan.verdict().trials());
    assertEquals(0.02, plan.verdict().shamP05Low());
    assertEquals(0.1, plan.verdict().shamP05High());
    assertEquals(0.75, plan.verdict().coverage());
  }

  @Test
  void contrastsKeepTheirOrderAndTakeAnyColumn() {
    Plan plan =
        PlanFile.parse(
            """
            contrasts:
              - {name: z, weights: {a: 0.5, slow_1: 0, 'a:slope': -2e-1}}
              - {name: y, weights: {'square:shift_depth': 1}}
            """,
            "p.yaml");
    assertEquals(
        List.of(
            new Contrast("z", Map.of("a", 0.5, "slow_1", 0.0, "a:slope", -0.2)),
            new Contrast("y", Map.of("square:shift_depth", 1.0))),
        plan.contrasts());
    assertEquals(
        List.of("a", "slow_1", "a:slope"), List.copyOf(plan.contrasts().get(0).weights().keySet()));
  }

  @ParameterizedTest
  @CsvSource({"whisker-puff.yaml, whisker-puff", "my plan (2).yml, my_plan__2_", ".yaml, plan"})
  void anUnnamedPlanIsCalledAfterItsFile(String file, String name) {
    assertEquals(name, PlanFile.parse(Plans.CONTRASTS, file).name());
  }

  private static String word(Enum<?> value) {
    return value.name().toLowerCase(java.util.Locale.ROOT);
  }
}
