package nightjar.plan;

import java.util.List;
import java.util.Locale;
import nightjar.inference.InferenceSettings;
import nightjar.regions.ResponseSettings;
import nightjar.verdict.VerdictLimits;

/** Plan sections {@code inference}, {@code responses} and {@code verdict}. */
final class OutcomeSections {
  private static final Range SHARE = Range.of(0, 1);

  private OutcomeSections() {}

  static InferenceSettings inference(Section top) {
    Section s = top.section("inference");
    s.lacks("randomisations", "inference by randomisation", List.of("0"));
    s.word("tail", "both", List.of("both"));
    String method = s.word("method", "bh", List.of("bh", "by", "bonferroni", "sidak"));
    double level = s.number("level", InferenceSettings.DEFAULT.level(), Range.above(0, 0.5));
    s.lacks("statistics", "statistics of randomisation", List.of("[max_t]"));
    s.lacks("cluster_p", "clusters", List.of("0.001"));
    s.lacks("seed", "inference by randomisation", List.of("20260301"));
    s.done();
    return new InferenceSettings(
        InferenceSettings.Adjustment.valueOf(method.toUpperCase(Locale.ROOT)), level);
  }

  static ResponseSettings responses(Section top) {
    Section s = top.section("responses");
    ResponseSettings d = ResponseSettings.DEFAULT;
    double[] window =
        s.pair(
            "window_s",
            new double[] {d.windowFromSeconds(), d.windowToSeconds()},
            Range.of(-600, 600));
    ResponseSettings settings =
        new ResponseSettings(
            s.number("before_s", d.beforeSeconds(), Range.above(0, 600)),
            s.number("after_s", d.afterSeconds(), Range.above(0, 600)),
            window[0],
            window[1]);
    s.done();
    return settings;
  }

  static VerdictLimits verdict(Section top) {
    Section s = top.section("verdict");
    VerdictLimits d = VerdictLimits.DEFAULT;
    double[] sham = s.pair("sham_p05", new double[] {d.shamP05Low(), d.shamP05High()}, SHARE);
    VerdictLimits limits =
        new VerdictLimits(
            s.number("rejected_review", d.rejectedReview(), SHARE),
            s.number("rejected_unusable", d.rejectedUnusable(), SHARE),
            s.number("displacement_voxels", d.displacementVoxels(), Range.above(0, 100)),
            s.number("tsnr", d.tsnr(), Range.of(0, 1e6)),
            s.integer("trials", d.trials(), Range.of(0, 100_000)),
            s.number("variance_inflation", d.varianceInflation(), Range.of(1, 1e6)),
            s.number("motion_r", d.motionR(), SHARE),
            s.number("effect_change", d.effectChange(), Range.of(0, 100)),
            sham[0],
            sham[1],
            s.number("sham_p001", d.shamP001(), SHARE),
            s.number("sham_discoveries", d.shamDiscoveries(), SHARE),
            s.number("coverage", d.coverage(), SHARE));
    s.done();
    return limits;
  }
}
