package nightjar.results;

import nightjar.alignment.AlignmentSettings;
import nightjar.design.SessionDesign;
import nightjar.recording.FrameMotion;
import nightjar.recording.KeptFrames;
import nightjar.recording.PlaneOffsets;
import nightjar.screening.FrameJudgement;

/**
 * What was found frame by frame.
 *
 * @param judgement kept or rejected, log power and change
 * @param motion of every frame
 * @param alignment what frames were allowed to do
 * @param design as fitted
 * @param offsets the planes' clocks
 */
public record FrameFindings(
    FrameJudgement judgement,
    FrameMotion motion,
    AlignmentSettings alignment,
    SessionDesign design,
    PlaneOffsets offsets) {
  /** Which frames entered the model. */
  public KeptFrames kept() {
    return judgement.kept();
  }
}
