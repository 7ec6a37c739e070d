package nightjar.results;

/** Mean power over kept frames, one value a voxel of the grid, NaN where always missing. */
public final class MeanPower {
  private final float[] values;

  /** Values are shared, not copied. */
  public MeanPower(float[] values) {
    this.values = values;
  }

  /** The values; shared, not copied. */
  public float[] values() {
    return values;
  }
}
