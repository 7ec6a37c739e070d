package nightjar.report;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import nightjar.alignment.AlignmentSettings;
import nightjar.mask.Scale;
import nightjar.plan.Plan;
import nightjar.recording.KeptFrames;
import nightjar.report.References.Published;
import nightjar.screening.ScreeningSettings;

/** What was done to frames and voxels before the model. */
final class FrameMethods {
  private final MethodsFacts facts;
  private final Plan plan;
  private final References references;

  FrameMethods(MethodsFacts facts, References references) {
    this.facts = facts;
    this.plan = facts.plan();
    this.references = references;
  }

  String text() {
    return String.join("\n\n", List.of(alignment(), screening(), mask() + smoothing() + scale()));
  }

  private String alignment() {
    AlignmentSettings a = plan.alignment();
    if (a.model() == AlignmentSettings.Model.NONE) {
      return "Alignment. Frames were not aligned.";
    }
    String unit =
        a.scope() == AlignmentSettings.Scope.PLANE
            ? "each plane by itself"
            : "the volume as a whole";
    String motion =
        a.model() == AlignmentSettings.Model.RIGID ? "translation and rotation" : "translation";
    String reference =
        a.reference().isTypical()
            ? "the median of the most typical frames, rebuilt once from the aligned ones"
            : "frame "
                + a.reference().frame()
                + " and then the median of the most typical frames aligned to it";
    return "Alignment. Frames were aligned ("
        + motion
        + ", "
        + unit
        + ") to "
        + reference
        + ", by iterative least squares on smoothed logarithms of power "
        + references.cite(Published.LUCAS, Published.BAKER)
        + " with gain and offset free and Tukey's biweight on residuals "
        + references.cite(Published.HOLLAND)
        + ", and resampled once by cubic B-splines. Shifts are the displacement of the image content"
        + " from the reference.";
  }

  private String screening() {
    ScreeningSettings s = plan.screening();
    String power =
        s.enabled()
            ? "Frames were rejected where the modified z-score "
                + references.cite(Published.IGLEWICZ)
                + " of the deviation of mean log power from its running median ("
                + s.windowFrames()
                + " frames; the stimuli's responses fitted out) exceeded "
                + Words.plain(s.zLimit())
                + " in magnitude and the deviation "
                + Words.plain(s.minPowerDeviation())
                + ", or where that of the root mean square change of log power exceeded "
                + Words.plain(s.zLimit())
                + " and the change "
                + Words.plain(s.minChangeRatio())
                + " times its median"
                + "; further"
            : "Frames were not judged by their power. Rejected were";
    return "Screening. "
        + power
        + " those displaced more than "
        + Words.plain(s.maxDisplacementMillimetres())
        + " mm from the median position, and those with more than half of the mask missing or outside"
        + " the field. A frame rejected in one plane is rejected in all; rejected frames are left out"
        + " of the model, never filled in. "
        + counts(facts.kept());
  }

  private static String counts(KeptFrames kept) {
    Map<String, Integer> reasons = new TreeMap<>();
    for (int t = 0; t < kept.frames(); t++) {
      kept.reason(t).ifPresent(r -> reasons.merge(r, 1, Integer::sum));
    }
    int rejected = kept.frames() - kept.count();
    String start =
        kept.count()
            + " of "
            + Words.count(kept.frames(), "frame")
            + " were kept, "
            + rejected
            + " rejected";
    List<String> parts =
        reasons.entrySet().stream().map(e -> Words.name(e.getKey()) + " " + e.getValue()).toList();
    return start + (parts.isEmpty() ? "." : " (" + String.join(", ", parts) + ").");
  }

  private String mask() {
    String rule =
        switch (plan.mask()) {
          case AUTO ->
              "the largest connected part of each plane above Otsu's threshold "
                  + references.cite(Published.OTSU)
                  + " on the logarithm of mean power, holes filled";
          case RECORDING -> "the recording's own mask";
          case ALL -> "every voxel of the field";
        };
    return "Mask and scale. Analysed were "
        + Words.count(facts.model().maskVoxels(), "voxel")
        + ": "
        + rule
        + ", less those with a missing value in a kept frame, a baseline that is not positive or no"
        + " residual variance, and those outside the field in over 5 % of kept frames.";
  }

  private String smoothing() {
    double fwhm = plan.smoothingMillimetres();
    return fwhm > 0
        ? " Frames were smoothed within the mask by a Gaussian of "
            + Words.plain(fwhm)
            + " mm full width at half maximum."
        : " There was no spatial smoothing.";
  }

  private String scale() {
    return plan.scale() == Scale.PERCENT
        ? " Each voxel's power y was expressed as 100 (y/b - 1) percent of its baseline b, the mean"
            + " over kept frames."
        : " Each voxel's power y was expressed as 100 ln(y/b), b being its mean over kept frames.";
  }
}
