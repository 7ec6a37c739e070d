package nightjar.verdict;

import java.util.List;
import nightjar.design.Kernel;
import nightjar.design.ModelledStimulus;
import nightjar.recording.KeptFrames;
import nightjar.recording.Trial;

/**
 * How many trials of a stimulus were recorded well enough: at least 80 % of the frames from onset
 * to onset + duration + the kernel's peak + width are kept.
 *
 * @param stimulus stimulus' name
 * @param complete complete trials
 * @param all all trials
 */
public record TrialCount(String stimulus, int complete, int all) {
  private static final double ENOUGH = 0.8;

  /** Counts for every stimulus. */
  public static List<TrialCount> of(
      List<ModelledStimulus> stimuli, Kernel kernel, KeptFrames kept) {
    return stimuli.stream()
        .map(
            s ->
                new TrialCount(
                    s.name(),
                    (int) s.trials().stream().filter(t -> isComplete(t, kernel, kept)).count(),
                    s.trials().size()))
        .toList();
  }

  private static boolean isComplete(Trial trial, Kernel kernel, KeptFrames kept) {
    double span = trial.durationSeconds() + kernel.peakSeconds() + kernel.widthSeconds();
    double expected = Math.max(1, Math.floor(span / kept.times().intervalSeconds()));
    int found = 0;
    for (int r = 0; r < kept.count(); r++) {
      double since = kept.times().at(kept.frame(r)) - trial.onsetSeconds();
      found += since >= 0 && since <= span ? 1 : 0;
    }
    return found >= ENOUGH * expected;
  }
}
