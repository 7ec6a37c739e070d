package nightjar.regions;

/**
 * One trial's response in one region.
 *
 * @param region region's name
 * @param stimulus stimulus' name
 * @param trial number of the trial within its stimulus, in the event table's order, from 1
 * @param onsetSeconds onset
 * @param durationSeconds duration
 * @param meanPercent mean over the response window; NaN without a frame there or before the onset
 * @param frames kept frames in the window
 */
public record TrialValue(
    String region,
    String stimulus,
    int trial,
    double onsetSeconds,
    double durationSeconds,
    double meanPercent,
    int frames) {}
