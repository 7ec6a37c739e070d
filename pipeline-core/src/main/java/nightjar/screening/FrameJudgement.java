package nightjar.screening;

import nightjar.recording.KeptFrames;

/** Which frames are kept, and what was judged of each. Immutable. */
public final class FrameJudgement {
  private final KeptFrames kept;
  private final double[] logPower;
  private final double[] change;

  FrameJudgement(KeptFrames kept, double[] logPower, double[] change) {
    this.kept = kept;
    this.logPower = logPower;
    this.change = change;
  }

  /** Kept frames, and why the others are not. */
  public KeptFrames kept() {
    return kept;
  }

  /** Mean of ln(power) of frame {@code t} over the mask's inner voxels; NaN without a value. */
  public double logPower(int t) {
    return logPower[t];
  }

  /**
   * Root mean square difference of ln(power) of frame {@code t} to the median of its neighbours;
   * NaN without a value.
   */
  public double change(int t) {
    return change[t];
  }
}
