package nightjar.analysis;

import java.util.List;
import nightjar.design.DesignRequest;
import nightjar.design.ModelledStimulus;
import nightjar.design.SessionDesign;
import nightjar.glm.Contrast;
import nightjar.plan.Plan;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.PlaneOffsets;
import nightjar.refusal.RefusedInput;

/**
 * Builds the model as if every frame were kept, so that a plan that cannot work is refused before
 * anything heavy begins.
 */
public final class EarlyDesignCheck {
  private EarlyDesignCheck() {}

  /**
   * The design's warnings.
   *
   * @throws RefusedInput naming the plan where the design cannot be fitted or a contrast names a
   *     column that it lacks
   */
  public static List<String> of(
      Plan plan, List<ModelledStimulus> stimuli, FrameTimes times, PlaneOffsets offsets) {
    SessionDesign design;
    try {
      design = SessionDesign.build(request(plan, stimuli), KeptFrames.all(times), offsets.clocks());
    } catch (RefusedInput e) {
      throw e.in(plan.fileName());
    }
    List<String> columns = design.ofPlane(0).names();
    for (Contrast contrast : plan.contrasts()) {
      for (String column : contrast.weights().keySet()) {
        if (!columns.contains(column) && !mayComeFromMotion(column, plan)) {
          throw RefusedInput.because("no column of the model has this name")
              .in(plan.fileName())
              .at("contrast " + contrast.name())
              .found(column)
              .expected("one of " + String.join(", ", columns))
              .remedy("name a stimulus or another column of the model");
        }
      }
    }
    return design.warnings();
  }

  /** What the model holds before motion is known. */
  static DesignRequest request(Plan plan, List<ModelledStimulus> stimuli) {
    return new DesignRequest(
        stimuli,
        plan.kernel(),
        plan.kernelDerivative(),
        plan.drift(),
        plan.nuisance().segments(),
        List.of());
  }

  private static boolean mayComeFromMotion(String column, Plan plan) {
    String parameter = column.substring(column.indexOf(':') + 1);
    return !plan.nuisance().motion().isEmpty()
        && List.of(
                "shift_depth",
                "shift_lateral",
                "shift_plane",
                "rotation",
                "tilt_depth",
                "tilt_lateral")
            .contains(parameter);
  }
}
