package nightjar.report;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import nightjar.glm.Contrast;
import nightjar.plan.Plan;
import nightjar.regions.RegionSource;
import nightjar.regions.ResponseSettings;
import nightjar.report.References.Published;
import nightjar.verdict.VerdictLimits;

/** Contrasts, their tests, regions and the verdict. */
final class TestMethods {
  private final Plan plan;
  private final References references;

  TestMethods(Plan plan, References references) {
    this.plan = plan;
    this.references = references;
  }

  String text() {
    return String.join(
        "\n\n", List.of(contrasts() + adjustment(), regions(), verdict(), display()));
  }

  private String contrasts() {
    String each =
        plan.contrasts().stream().map(TestMethods::contrast).collect(Collectors.joining("; "));
    return "Contrasts. " + each + ". Each was tested voxel by voxel by Student's t, two-sided. ";
  }

  private static String contrast(Contrast c) {
    return c.weights().entrySet().stream()
        .map(TestMethods::weight)
        .collect(Collectors.joining(", ", Words.name(c.name()) + ": ", ""));
  }

  private static String weight(Map.Entry<String, Double> w) {
    return Words.name(w.getKey()) + " " + (w.getValue() > 0 ? "+" : "") + Words.plain(w.getValue());
  }

  private String adjustment() {
    String method =
        switch (plan.inference().adjustment()) {
          case BH ->
              "(false discovery rate) after Benjamini and Hochberg "
                  + references.cite(Published.BENJAMINI_HOCHBERG);
          case BY ->
              "(false discovery rate under any dependency) after Benjamini and Yekutieli "
                  + references.cite(Published.BENJAMINI_YEKUTIELI);
          case BONFERRONI ->
              "(family-wise error) after Bonferroni " + references.cite(Published.DUNN);
          case SIDAK -> "(family-wise error) after Sidak " + references.cite(Published.SIDAK);
        };
    return "P values were adjusted "
        + method
        + " over all voxels of the mask, all planes together, within each contrast; level "
        + Words.plain(plan.inference().level())
        + ".";
  }

  private String regions() {
    if (plan.regions() == RegionSource.NONE) {
      return "Regions. None were analysed.";
    }
    String source =
        switch (plan.regions()) {
          case RECORDING -> "stored in the recording";
          case FILE -> "given as a label file";
          case DRAWN -> "given as polygons";
          case NONE -> throw new IllegalStateException("handled above");
        };
    ResponseSettings r = plan.responses();
    return "Regions ("
        + source
        + "). The same model was fitted to the mean series of each region's"
        + " mask voxels, with its own noise estimate; intervals are 95 % by Student's t, and p values"
        + " were adjusted over regions within each contrast. Event-locked responses are the series"
        + " less drift, nuisance and the fitted responses of all other trials, from "
        + Words.plain(r.beforeSeconds())
        + " s before to "
        + Words.plain(r.afterSeconds())
        + " s after the onset, relative to the trial's own mean before it; a trial's value is the mean"
        + " from "
        + Words.plain(r.windowFromSeconds())
        + " to "
        + Words.plain(r.windowToSeconds())
        + " s.";
  }

  private String verdict() {
    VerdictLimits v = plan.verdict();
    return "Verdict. Limits (common practice): rejected frames "
        + Words.plain(v.rejectedReview())
        + " for review and "
        + Words.plain(v.rejectedUnusable())
        + " for unusable; median displacement "
        + Words.plain(v.displacementVoxels())
        + " voxel; temporal signal-to-noise ratio "
        + Words.plain(v.tsnr())
        + "; complete trials a stimulus "
        + v.trials()
        + "; variance inflation "
        + Words.plain(v.varianceInflation())
        + "; coverage "
        + Words.plain(v.coverage())
        + ".";
  }

  private String display() {
    return "Display. Maps show effects over power and fade voxels that are not significant by opacity"
        + " instead of cutting them off "
        + references.cite(Published.ALLEN)
        + ".";
  }
}
