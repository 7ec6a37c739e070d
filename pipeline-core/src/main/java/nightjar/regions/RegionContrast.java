package nightjar.regions;

/**
 * A contrast of one region's mean series.
 *
 * @param region region's name
 * @param voxels mask voxels of the region; 0: all numbers are NaN
 * @param contrast contrast's name
 * @param effectPercent effect, percent of baseline
 * @param standardErrorPercent its standard error
 * @param lowPercent lower end of the 95 % interval
 * @param highPercent upper end of the 95 % interval
 * @param t effect over standard error
 * @param degreesOfFreedom effective degrees of freedom
 * @param p two-sided
 * @param q p adjusted over the regions with voxels within the contrast
 */
public record RegionContrast(
    String region,
    int voxels,
    String contrast,
    double effectPercent,
    double standardErrorPercent,
    double lowPercent,
    double highPercent,
    double t,
    double degreesOfFreedom,
    double p,
    double q) {}
