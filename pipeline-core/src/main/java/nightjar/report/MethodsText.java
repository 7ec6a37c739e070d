package nightjar.report;

import java.util.List;
import java.util.stream.Collectors;
import nightjar.mask.Scale;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;

/** The paragraph for a paper: every parameter as used and the publications of the methods used. */
public final class MethodsText {
  private MethodsText() {}

  /** The text of {@code methods.md}: Markdown, lines end with LF. */
  public static String of(MethodsFacts facts) {
    References references = new References();
    String frames = new FrameMethods(facts, references).text();
    String model = new ModelMethods(facts, references).text();
    String tests = new TestMethods(facts.plan(), references).text();
    return "# Methods\n\n"
        + recording(facts)
        + "\n\n"
        + frames
        + "\n\n"
        + model
        + "\n\n"
        + tests
        + "\n\n## Notes\n\n"
        + baseline(facts)
        + "\n\nNothing is corrected over contrasts: each contrast controls its own errors only.\n\n"
        + "## References\n\n"
        + references.list();
  }

  private static String recording(MethodsFacts facts) {
    Grid grid = facts.grid();
    KeptFrames kept = facts.kept();
    String variable = facts.plan().variable();
    String source = variable == null ? "" : " (variable " + Words.name(variable) + ")";
    String interval =
        facts.plan().frameInterval().isPresent()
            ? "interval, given by the plan,"
            : "median interval";
    return "Recording. The functional-ultrasound recording"
        + source
        + " holds "
        + Words.count(kept.frames(), "frame")
        + " of "
        + Words.count(grid.planes().size(), "plane")
        + " with "
        + grid.depths().size()
        + " x "
        + grid.laterals().size()
        + " voxels (depth x lateral; spacing "
        + Words.plain(grid.depths().spacingMillimetres())
        + " x "
        + Words.plain(grid.laterals().spacingMillimetres())
        + " mm), "
        + interval
        + " "
        + Words.plain(kept.times().intervalSeconds())
        + " s, in "
        + Words.count(kept.times().segments(), "segment")
        + ". It was analysed with Nightjar "
        + facts.version()
        + " under the plan "
        + Words.name(facts.plan().name())
        + ".";
  }

  /** Why an effect reads low: the baseline includes the responses. */
  private static String baseline(MethodsFacts facts) {
    if (facts.plan().scale() == Scale.LOG_PERCENT) {
      return "Effects are 100 times the change of the logarithm of power; "
          + means(facts.stimuli())
          + " A constant does not change them, so the responses in the baseline do not either.";
    }
    return "The baseline is the mean over all kept frames and so includes the responses: an effect"
        + " beta (percent) reads low by the factor 1/(1 + beta x/100), x being the mean of the"
        + " stimulus' column. "
        + means(facts.stimuli());
  }

  private static String means(List<MethodsFacts.StimulusFact> stimuli) {
    return stimuli.stream()
        .map(s -> Words.name(s.name()) + " x = " + Words.plain(s.meanColumn()))
        .collect(Collectors.joining(", ", "Mean of the column over kept frames: ", "."));
  }
}
