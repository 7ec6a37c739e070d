package nightjar.design;

/**
 * Plan section {@code drift}.
 *
 * @param cutoffSeconds the longest period that is kept; positive infinity removes no drift
 */
public record DriftSettings(double cutoffSeconds) {
  /** The plan's defaults. */
  public static final DriftSettings DEFAULT = new DriftSettings(120);
}
