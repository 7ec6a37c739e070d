package nightjar.regions;

/**
 * The mean response of a region at one lag.
 *
 * @param region region's name
 * @param stimulus stimulus' name
 * @param lagSeconds centre of the bin, from the onset
 * @param meanPercent mean over trials; NaN without a trial
 * @param standardErrorPercent standard error over trials; NaN below two trials
 * @param trials trials with a kept frame in the bin
 */
public record ResponseBin(
    String region,
    String stimulus,
    double lagSeconds,
    double meanPercent,
    double standardErrorPercent,
    int trials) {}
