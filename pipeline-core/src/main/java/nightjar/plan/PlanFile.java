package nightjar.plan;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import nightjar.design.DriftSettings;
import nightjar.mask.MaskSettings;
import nightjar.mask.Scale;
import nightjar.regions.RegionSource;

/** Reads a plan; refuses what it does not know, in one sentence with line and column. */
public final class PlanFile {
  private static final double LONGEST_SECONDS = 1e6;
  private static final List<String> KEYS =
      List.of(
          "name",
          "recording",
          "screening",
          "alignment",
          "smoothing",
          "mask",
          "scale",
          "kernel",
          "stimuli",
          "drift",
          "nuisance",
          "traces",
          "noise",
          "contrasts",
          "inference",
          "regions",
          "responses",
          "sham_check",
          "verdict");

  private final String fileName;
  private final Section top;

  private PlanFile(String text, String fileName) {
    this.fileName = fileName;
    this.top = new Section(fileName, "", new PlanText(fileName).parse(text));
  }

  /** Reads the plan in {@code file}. */
  public static Plan read(Path file) {
    return parse(PlanText.load(file), String.valueOf(file.getFileName()));
  }

  /** Reads a plan's text. */
  public static Plan parse(String text, String fileName) {
    return new PlanFile(text, fileName).plan();
  }

  private Plan plan() {
    top.only(KEYS);
    Section recording = top.section("recording");
    Optional<String> variable = recording.text("variable");
    Double interval =
        !recording.has("frame_interval_s") || recording.isNull("frame_interval_s")
            ? null
            : recording.number("frame_interval_s", Range.above(0, 3600));
    recording.done();
    KernelSection kernel = KernelSection.read(top);
    Plan plan =
        new Plan(
            fileName,
            name(),
            variable.orElse(null),
            interval,
            FrameSections.screening(top),
            FrameSections.alignment(top),
            smoothing(),
            mask(),
            scale(),
            kernel.kernel(),
            kernel.derivative(),
            StimuliSection.read(top),
            drift(),
            ModelSections.nuisance(top),
            ModelSections.noise(top),
            ContrastsSection.read(top),
            OutcomeSections.inference(top),
            regions(),
            OutcomeSections.responses(top),
            OutcomeSections.verdict(top));
    top.lacks("traces", "traces as regressors", List.of("{}", "null"));
    Section sham = top.section("sham_check");
    sham.lacks("shams", "the sham check", List.of("0"));
    sham.done();
    return plan;
  }

  private String name() {
    Optional<String> name = top.text("name");
    if (name.isPresent()) {
      return Names.check(top, "name", name.get(), "the plan");
    }
    String stem = fileName.replaceFirst("\\.[^.]*$", "").replaceAll("[^A-Za-z0-9_.-]", "_");
    return stem.isEmpty() ? "plan" : stem.substring(0, Math.min(64, stem.length()));
  }

  private double smoothing() {
    Section s = top.section("smoothing");
    double width = s.number("fwhm_mm", 0, Range.of(0, 10));
    s.done();
    return width;
  }

  private MaskSettings mask() {
    Section s = top.section("mask");
    String source = s.word("source", "auto", List.of("auto", "recording", "all"));
    s.done();
    return switch (source) {
      case "auto" -> MaskSettings.AUTO;
      case "recording" -> MaskSettings.RECORDING;
      default -> MaskSettings.ALL;
    };
  }

  private Scale scale() {
    return top.word("scale", "percent", List.of("percent", "log_percent")).equals("percent")
        ? Scale.PERCENT
        : Scale.LOG_PERCENT;
  }

  private DriftSettings drift() {
    if (top.has("drift") && top.isNull("drift")) {
      return new DriftSettings(Double.POSITIVE_INFINITY);
    }
    Section s = top.section("drift");
    double cutoff =
        s.has("cutoff_s") && s.isNull("cutoff_s")
            ? Double.POSITIVE_INFINITY
            : s.number(
                "cutoff_s", DriftSettings.DEFAULT.cutoffSeconds(), Range.above(0, LONGEST_SECONDS));
    s.done();
    return new DriftSettings(cutoff);
  }

  private RegionSource regions() {
    Section s = top.section("regions");
    String source = s.word("source", "recording", List.of("recording", "file", "drawn", "none"));
    s.done();
    return RegionSource.valueOf(source.toUpperCase(java.util.Locale.ROOT));
  }
}
