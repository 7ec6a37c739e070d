package nightjar.screening;

/**
 * Plan section {@code screening}.
 *
 * @param enabled whether frames are judged; false: only those with more than half of the mask
 *     outside the field or missing are rejected
 * @param zLimit limit of the modified z-score
 * @param minPowerDeviation smallest deviation of log power that matters
 * @param minChangeRatio smallest ratio of change to its median that matters
 * @param windowFrames length of the running median of log power, odd
 * @param maxDisplacementMillimetres a frame displaced more than this from the median position is
 *     rejected
 */
public record ScreeningSettings(
    boolean enabled,
    double zLimit,
    double minPowerDeviation,
    double minChangeRatio,
    int windowFrames,
    double maxDisplacementMillimetres) {
  /** The plan's defaults. */
  public static final ScreeningSettings DEFAULT =
      new ScreeningSettings(true, 3.5, 0.05, 1.5, 31, 0.3);
}
