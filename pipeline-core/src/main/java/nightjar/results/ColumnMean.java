package nightjar.results;

import nightjar.design.DesignMatrix;
import nightjar.recording.KeptFrames;

/**
 * The mean of a design column over kept frames (and planes). Since the baseline includes the
 * responses, an effect beta reads low by 1/(1 + beta x/100), x being this mean.
 */
public final class ColumnMean {
  private ColumnMean() {}

  /** Mean of the column called {@code name}. */
  public static double of(FrameFindings frames, String name) {
    KeptFrames kept = frames.kept();
    double sum = 0;
    for (DesignMatrix design : frames.design().planes()) {
      int j = design.indexOf(name);
      for (int i = 0; i < kept.count(); i++) {
        sum += design.columns().get(j).at(kept.frame(i));
      }
    }
    return sum / kept.count() / frames.design().planes().size();
  }
}
