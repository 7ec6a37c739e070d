package nightjar.design;

import java.util.List;
import nightjar.recording.FrameTimes;
import nightjar.recording.Trial;

/** What a single trial adds to its stimulus' columns. */
public final class TrialResponse {
  private TrialResponse() {}

  /** The trial's part of the response column at every frame time plus {@code offsetSeconds}. */
  public static double[] response(
      Trial trial, Kernel kernel, FrameTimes times, double offsetSeconds) {
    return StimulusColumns.response(
        new ModelledStimulus("", List.of(trial)), kernel, times, offsetSeconds);
  }

  /** The trial's part of the slope column at every frame time plus {@code offsetSeconds}. */
  public static double[] slope(Trial trial, Kernel kernel, FrameTimes times, double offsetSeconds) {
    return StimulusColumns.slope(
        new ModelledStimulus("", List.of(trial)), kernel, times, offsetSeconds);
  }
}
