package nightjar.verdict;

import java.util.List;

/**
 * What the stages found that a verdict rests on.
 *
 * @param frames all frames
 * @param rejected rejected frames
 * @param responseFrames frames during responses (any stimulus column above 0.5)
 * @param rejectedInResponses rejected ones among them
 * @param medianDisplacementVoxels median over frames, in voxels of the smaller in-plane spacing
 * @param tsnr median over the mask of baseline over residual sd
 * @param trials per stimulus
 * @param inflations variance inflation factor per stimulus column
 * @param coverage kept frames times the interval over the recording's span
 */
public record SessionFacts(
    int frames,
    int rejected,
    int responseFrames,
    int rejectedInResponses,
    double medianDisplacementVoxels,
    double tsnr,
    List<TrialCount> trials,
    List<Inflation> inflations,
    double coverage) {
  public SessionFacts {
    trials = List.copyOf(trials);
    inflations = List.copyOf(inflations);
  }

  /**
   * How much collinearity inflates the variance of a stimulus' coefficient.
   *
   * @param column stimulus column
   * @param factor variance inflation factor
   */
  public record Inflation(String column, double factor) {}
}
