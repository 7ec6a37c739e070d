package nightjar.regions;

/**
 * Plan section {@code responses}: event-locked responses.
 *
 * @param beforeSeconds shown and used as the trial's own baseline
 * @param afterSeconds shown after the onset
 * @param windowFromSeconds start of the window of a trial's value, from the onset
 * @param windowToSeconds end of that window
 */
public record ResponseSettings(
    double beforeSeconds, double afterSeconds, double windowFromSeconds, double windowToSeconds) {
  /** The plan's defaults. */
  public static final ResponseSettings DEFAULT = new ResponseSettings(5, 20, 1, 6);
}
