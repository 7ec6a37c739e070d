package nightjar.verdict;

/**
 * Plan section {@code verdict}: limits beyond which a session needs a human or cannot be used
 * (common practice, no source).
 *
 * @param rejectedReview share of rejected frames
 * @param rejectedUnusable share of rejected frames
 * @param displacementVoxels median displacement in voxels of the smaller in-plane spacing
 * @param tsnr smallest median temporal signal-to-noise ratio
 * @param trials smallest number of complete trials of a stimulus
 * @param varianceInflation largest variance inflation factor of a stimulus column
 * @param motionR largest partial correlation of motion with a stimulus
 * @param effectChange largest relative change of a region's effect by motion columns
 * @param shamP05Low smallest share of voxels with p below 0.05 in the sham check
 * @param shamP05High largest share of voxels with p below 0.05 in the sham check
 * @param shamP001 largest share of voxels with p below 0.001 in the sham check
 * @param shamDiscoveries largest share of shams with any discovery
 * @param coverage smallest share of the recording's span that is kept
 */
public record VerdictLimits(
    double rejectedReview,
    double rejectedUnusable,
    double displacementVoxels,
    double tsnr,
    int trials,
    double varianceInflation,
    double motionR,
    double effectChange,
    double shamP05Low,
    double shamP05High,
    double shamP001,
    double shamDiscoveries,
    double coverage) {
  /** The plan's defaults. */
  public static final VerdictLimits DEFAULT =
      new VerdictLimits(0.10, 0.30, 0.5, 5, 5, 5, 0.3, 0.25, 0.03, 0.08, 0.005, 0.20, 0.5);
}
