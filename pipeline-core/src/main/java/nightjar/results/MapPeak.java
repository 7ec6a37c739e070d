package nightjar.results;

/** The voxel of the largest absolute statistic. */
public final class MapPeak {
  private MapPeak() {}

  /** Position of the largest |t|, the first of equals; -1 where all are NaN. */
  public static int of(double[] t) {
    int best = -1;
    for (int k = 0; k < t.length; k++) {
      if (!Double.isNaN(t[k]) && (best < 0 || Math.abs(t[k]) > Math.abs(t[best]))) {
        best = k;
      }
    }
    return best;
  }
}
