package nightjar.plan;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import nightjar.alignment.AlignmentSettings;
import nightjar.design.DoubleGammaKernel;
import nightjar.design.Kernel;
import nightjar.design.NuisanceSettings;
import nightjar.design.StimulusSettings;
import nightjar.verdict.VerdictLimits;
import org.jspecify.annotations.Nullable;
import org.snakeyaml.engine.v2.api.Dump;
import org.snakeyaml.engine.v2.api.DumpSettings;
import org.snakeyaml.engine.v2.common.FlowStyle;
import org.snakeyaml.engine.v2.schema.CoreSchema;

/** A plan with all defaults written out, in the order of the contract. */
public final class ResolvedPlan {
  private ResolvedPlan() {}

  /**
   * The plan as ordered maps, lists and plain values.
   *
   * @param stimuli names of the modelled stimuli in order
   */
  public static Map<String, Object> toMap(Plan plan, List<String> stimuli) {
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("name", plan.name());
    m.put(
        "recording",
        map("variable", plan.variable(), "frame_interval_s", plan.frameIntervalSeconds()));
    m.put("screening", screening(plan));
    m.put("alignment", alignment(plan.alignment()));
    m.put("smoothing", map("fwhm_mm", plan.smoothingMillimetres()));
    m.put("mask", map("source", word(plan.mask())));
    m.put("scale", word(plan.scale()));
    m.put("kernel", kernel(plan.kernel(), plan.kernelDerivative()));
    m.put("stimuli", stimuli(plan, stimuli));
    double cutoff = plan.drift().cutoffSeconds();
    m.put("drift", map("cutoff_s", Double.isInfinite(cutoff) ? null : cutoff));
    m.put("nuisance", nuisance(plan.nuisance()));
    m.put("traces", map());
    m.put(
        "noise",
        map(
            "model", word(plan.noise().model()),
            "smoothing_mm", plan.noise().smoothingMillimetres(),
            "df", word(plan.noise().degreesOfFreedom())));
    m.put(
        "contrasts",
        plan.contrasts().stream()
            .map(c -> map("name", c.name(), "weights", new LinkedHashMap<>(c.weights())))
            .toList());
    m.put(
        "inference",
        map(
            "tail",
            "both",
            "method",
            word(plan.inference().adjustment()),
            "level",
            plan.inference().level(),
            "randomisations",
            0,
            "statistics",
            List.of("max_t"),
            "cluster_p",
            0.001,
            "seed",
            20260301));
    m.put("regions", map("source", word(plan.regions())));
    m.put(
        "responses",
        map(
            "before_s", plan.responses().beforeSeconds(),
            "after_s", plan.responses().afterSeconds(),
            "window_s",
                List.of(plan.responses().windowFromSeconds(), plan.responses().windowToSeconds())));
    m.put("sham_check", map("shams", 0));
    m.put("verdict", verdict(plan.verdict()));
    return m;
  }

  /**
   * The same as YAML. {@link PlanFile#parse} reads back an equal plan, in which every stimulus has
   * an entry.
   */
  public static String toYaml(Plan plan, List<String> stimuli) {
    DumpSettings settings =
        DumpSettings.builder()
            .setSchema(new CoreSchema())
            .setDefaultFlowStyle(FlowStyle.AUTO)
            .setWidth(120)
            .setDereferenceAliases(true)
            .build();
    return new Dump(settings).dumpToString(toMap(plan, stimuli));
  }

  private static Map<String, Object> map(@Nullable Object... keysAndValues) {
    Map<String, @Nullable Object> m = new LinkedHashMap<>();
    for (int i = 0; i < keysAndValues.length; i += 2) {
      m.put(String.valueOf(keysAndValues[i]), keysAndValues[i + 1]);
    }
    @SuppressWarnings({"unchecked", "NullAway"})
    Map<String, Object> plain = (Map<String, Object>) (Map<String, ?>) m;
    return plain;
  }

  private static String word(Enum<?> value) {
    return value.name().toLowerCase(Locale.ROOT);
  }

  private static Map<String, Object> screening(Plan plan) {
    return map(
        "enabled", plan.screening().enabled(),
        "z_limit", plan.screening().zLimit(),
        "min_power_deviation", plan.screening().minPowerDeviation(),
        "min_change_ratio", plan.screening().minChangeRatio(),
        "window_frames", plan.screening().windowFrames(),
        "max_displacement_mm", plan.screening().maxDisplacementMillimetres());
  }

  private static Map<String, Object> alignment(AlignmentSettings a) {
    Object reference =
        a.reference().isTypical()
            ? "typical"
            : a.reference().equals(AlignmentSettings.Reference.FIRST)
                ? "first"
                : (Object) a.reference().frame();
    return map("model", word(a.model()), "scope", word(a.scope()), "reference", reference);
  }

  private static Map<String, Object> kernel(Kernel kernel, boolean derivative) {
    Map<String, Object> m =
        map(
            "shape", kernel instanceof DoubleGammaKernel ? "double_gamma" : "gamma",
            "peak_s", kernel.peakSeconds(),
            "fwhm_s", kernel.widthSeconds());
    if (kernel instanceof DoubleGammaKernel d) {
      m.put("undershoot_peak_s", d.undershoot().peakSeconds());
      m.put("undershoot_fwhm_s", d.undershoot().widthSeconds());
      m.put("undershoot_ratio", d.ratio());
    }
    m.put("derivative", derivative);
    return m;
  }

  /** The plan's entries in its order, then the modelled ones that have none. */
  private static Map<String, Object> stimuli(Plan plan, List<String> names) {
    Map<String, Object> m = new LinkedHashMap<>();
    for (StimulusSettings s : plan.stimuli()) {
      m.put(s.name(), s.ignored() ? "ignore" : stimulus(s.loggedAs()));
    }
    names.forEach(name -> m.putIfAbsent(name, stimulus(name)));
    return m;
  }

  private static Map<String, Object> stimulus(String loggedAs) {
    return map("logged_as", loggedAs, "modulator", null);
  }

  private static Map<String, Object> nuisance(NuisanceSettings n) {
    List<String> motion =
        Arrays.stream(NuisanceSettings.MotionColumns.values())
            .filter(n.motion()::contains)
            .map(ResolvedPlan::word)
            .toList();
    return map(
        "motion",
        motion,
        "components",
        0,
        "noise_region",
        "outside_mask",
        "mask_mean",
        false,
        "segments",
        n.segments(),
        "traces",
        List.of());
  }

  private static Map<String, Object> verdict(VerdictLimits v) {
    return map(
        "rejected_review", v.rejectedReview(),
        "rejected_unusable", v.rejectedUnusable(),
        "displacement_voxels", v.displacementVoxels(),
        "tsnr", v.tsnr(),
        "trials", v.trials(),
        "variance_inflation", v.varianceInflation(),
        "motion_r", v.motionR(),
        "effect_change", v.effectChange(),
        "sham_p05", List.of(v.shamP05Low(), v.shamP05High()),
        "sham_p001", v.shamP001(),
        "sham_discoveries", v.shamDiscoveries(),
        "coverage", v.coverage());
  }
}
