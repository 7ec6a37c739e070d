package nightjar.report;

import java.util.List;
import nightjar.design.ModelledStimulus;
import nightjar.recording.FrameMotion;
import nightjar.recording.KeptFrames;
import nightjar.recording.NamedSeries;

/**
 * What happened to the frames.
 *
 * @param kept which enter the model, with all times
 * @param motion how they moved
 * @param stimuli what was shown when
 * @param screening the measures that frames were judged by, one value a frame: {@code log_power},
 *     {@code change}
 */
public record ReportedFrames(
    KeptFrames kept,
    FrameMotion motion,
    List<ModelledStimulus> stimuli,
    List<NamedSeries> screening) {
  public ReportedFrames {
    stimuli = List.copyOf(stimuli);
    screening = List.copyOf(screening);
  }
}
