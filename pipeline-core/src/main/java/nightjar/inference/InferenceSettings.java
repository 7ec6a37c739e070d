package nightjar.inference;

/**
 * Plan section {@code inference}.
 *
 * @param adjustment how p values are adjusted for many voxels or regions
 * @param level what counts as a discovery in summaries
 */
public record InferenceSettings(Adjustment adjustment, double level) {
  /** The plan's defaults. */
  public static final InferenceSettings DEFAULT = new InferenceSettings(Adjustment.BH, 0.05);

  /** Adjustment for many tests. */
  public enum Adjustment {
    /** Benjamini and Hochberg 1995. */
    BH,
    /** Benjamini and Yekutieli 2001. */
    BY,
    /** Bonferroni. */
    BONFERRONI,
    /** Sidak 1967. */
    SIDAK
  }
}
