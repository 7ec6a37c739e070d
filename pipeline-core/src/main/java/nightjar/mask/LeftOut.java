package nightjar.mask;

/**
 * How many voxels of the mask's source left it, each counted under the first cause that holds.
 *
 * @param leftField outside the field in over 5 % of the kept frames
 * @param missingValue without a value that the recording should have in a kept frame
 * @param nonPositiveBaseline mean power over the kept frames not above zero
 * @param noVariance the same value in every kept frame
 */
public record LeftOut(int leftField, int missingValue, int nonPositiveBaseline, int noVariance) {
  /** All voxels that left. */
  public int total() {
    return leftField + missingValue + nonPositiveBaseline + noVariance;
  }
}
