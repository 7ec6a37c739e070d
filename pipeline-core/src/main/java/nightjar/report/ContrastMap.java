package nightjar.report;

import nightjar.recording.Mask;
import org.jspecify.annotations.Nullable;

/**
 * The maps of one contrast over the whole grid, NaN outside the mask. Immutable; arrays are shared
 * and must not be changed.
 */
public final class ContrastMap {
  private final ContrastSummary summary;
  private final float[] effectPercent;
  private final float[] t;
  private final double[] q;

  /**
   * @param summary name, counts and peak
   * @param effectPercent effect, percent of baseline
   * @param t effect over standard error
   * @param q adjusted p
   */
  public ContrastMap(ContrastSummary summary, float[] effectPercent, float[] t, double[] q) {
    this.summary = summary;
    this.effectPercent = effectPercent;
    this.t = t;
    this.q = q;
  }

  /** Name, counts and peak. */
  public ContrastSummary summary() {
    return summary;
  }

  float[] effectPercent() {
    return effectPercent;
  }

  float[] t() {
    return t;
  }

  /** Voxels with q below {@code level}. */
  Mask significant(double level) {
    return Mask.of(q.length, v -> q[v] < level);
  }

  /**
   * What a contrast came to.
   *
   * @param name unique within the plan
   * @param strongVoxels voxels with p below 0.001, not adjusted
   * @param significantVoxels voxels with q below the plan's level
   * @param peak voxel with the largest magnitude of t, or null without any
   */
  public record ContrastSummary(
      String name, int strongVoxels, int significantVoxels, @Nullable Peak peak) {}

  /**
   * A voxel.
   *
   * @param plane number from 0
   * @param depthMillimetres place
   * @param lateralMillimetres place
   * @param t its t
   */
  public record Peak(int plane, double depthMillimetres, double lateralMillimetres, double t) {}
}
