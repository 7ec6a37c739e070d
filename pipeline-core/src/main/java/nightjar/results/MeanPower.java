package nightjar.results;

import java.util.function.IntToDoubleFunction;

/** Mean power over kept frames, one value a voxel of the grid, NaN where always missing. */
public final class MeanPower {
  private final float[] values;

  private MeanPower(float[] values) {
    this.values = values;
  }

  /** From a function of the voxel. */
  public static MeanPower of(int voxels, IntToDoubleFunction power) {
    float[] values = new float[voxels];
    for (int v = 0; v < voxels; v++) {
      values[v] = (float) power.applyAsDouble(v);
    }
    return new MeanPower(values);
  }

  /** The values; shared, not copied. */
  public float[] values() {
    return values;
  }
}
