package nightjar.screening;

import nightjar.recording.KeptFrames;

/** Which aligned frames are kept, and the figures that they were judged by. Immutable. */
public final class FrameJudgement {
  private final KeptFrames kept;
  private final double[] logPower;
  private final double[] change;

  FrameJudgement(KeptFrames kept, double[] logPower, double[] change) {
    this.kept = kept;
    this.logPower = logPower;
    this.change = change;
  }

  /**
   * The frames kept; the reasons of others are codes of {@link RejectionReason} joined by {@code
   * +}.
   */
  public KeptFrames kept() {
    return kept;
  }

  /**
   * Mean of ln(power) of frame {@code t} over the shrunk mask of all planes; NaN where it has no
   * value.
   */
  public double logPower(int t) {
    return logPower[t];
  }

  /**
   * Root mean square, over the shrunk mask of all planes, of the difference of ln(power) of frame
   * {@code t} to its voxelwise median over the 5 frames around it; NaN where it has no value.
   */
  public double change(int t) {
    return change[t];
  }
}
