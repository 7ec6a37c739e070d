package nightjar.design;

import nightjar.recording.FrameTimes;
import nightjar.recording.Trial;

/**
 * Stimulus columns in closed form (numerics section 6): a trial with onset o and duration d adds
 * {@code K(t-o) - K(t-o-d)} at frame time t, an impulse adds {@code k(t-o)} times one second. A
 * long stimulus reaches a plateau of 1.
 */
final class StimulusColumns {
  private StimulusColumns() {}

  /** The response column at every frame time plus {@code offsetSeconds}. */
  static double[] response(
      ModelledStimulus stimulus, Kernel kernel, FrameTimes times, double offsetSeconds) {
    return sum(
        stimulus,
        times,
        offsetSeconds,
        (t, d) -> d > 0 ? kernel.cumulative(t) - kernel.cumulative(t - d) : kernel.at(t));
  }

  /** The time derivative of {@link #response}, per second. */
  static double[] slope(
      ModelledStimulus stimulus, Kernel kernel, FrameTimes times, double offsetSeconds) {
    return sum(
        stimulus,
        times,
        offsetSeconds,
        (t, d) -> d > 0 ? kernel.at(t) - kernel.at(t - d) : kernel.slope(t));
  }

  @FunctionalInterface
  private interface TrialResponse {
    /** Contribution at {@code sinceOnset} seconds of a trial of {@code duration} seconds. */
    double at(double sinceOnset, double duration);
  }

  private static double[] sum(
      ModelledStimulus stimulus, FrameTimes times, double offsetSeconds, TrialResponse response) {
    double[] column = new double[times.size()];
    for (Trial trial : stimulus.trials()) {
      for (int t = 0; t < column.length; t++) {
        double since = times.at(t) + offsetSeconds - trial.onsetSeconds();
        if (since > 0) {
          column[t] += response.at(since, trial.durationSeconds());
        }
      }
    }
    return column;
  }
}
