package nightjar.analysis;

import nightjar.alignment.AlignmentSettings;
import nightjar.mask.MaskSettings;
import nightjar.plan.Plan;
import nightjar.refusal.RefusedInput;
import nightjar.storage.RecordingFile;

/** Holds a plan against what a recording says of itself before its frames are read. */
final class EarlyRecordingCheck {
  private EarlyRecordingCheck() {}

  /**
   * Returns if the recording has what the plan takes from it.
   *
   * @throws RefusedInput naming the plan, where the recording has no mask for a plan that takes it,
   *     or fewer frames than the number of the reference frame
   */
  static void of(Plan plan, RecordingFile recording) {
    if (plan.mask() == MaskSettings.RECORDING && recording.brainMask().isEmpty()) {
      throw RefusedInput.because("the plan takes the mask from the recording, which has none")
          .in(plan.fileName())
          .at("mask.source")
          .found("no variable brain_mask in " + recording.fileName())
          .remedy("add the variable, or set the source to auto or all");
    }
    int reference = plan.alignment().reference().frame();
    int frames = recording.times().size();
    if (plan.alignment().model() != AlignmentSettings.Model.NONE && reference >= frames) {
      throw RefusedInput.because("the reference frame does not exist")
          .in(plan.fileName())
          .at("alignment.reference")
          .found(reference)
          .expected("a frame from 0 to " + (frames - 1) + " of " + recording.fileName())
          .remedy("name another frame or write typical");
    }
  }
}
