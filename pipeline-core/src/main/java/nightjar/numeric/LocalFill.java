package nightjar.numeric;

/** Fills missing values of an image from what lies around them. */
public final class LocalFill {
  private LocalFill() {}

  /**
   * Replaces NaN layer by layer, from the rim of a hole inwards, by the mean of those of the four
   * neighbours that have a value already. An image without any value becomes 0.
   *
   * @param image modified: {@code rows x columns} values from {@code offset}
   */
  public static void fill(float[] image, int offset, int rows, int columns) {
    int n = rows * columns;
    int[] holes = new int[n];
    int count = 0;
    for (int i = 0; i < n; i++) {
      if (Float.isNaN(image[offset + i])) {
        holes[count++] = i;
      }
    }
    if (count == n) {
      java.util.Arrays.fill(image, offset, offset + n, 0);
      return;
    }
    float[] means = new float[count];
    while (count > 0) {
      for (int k = 0; k < count; k++) {
        means[k] = meanOfNeighbours(image, offset, holes[k], rows, columns);
      }
      int left = 0;
      for (int k = 0; k < count; k++) {
        image[offset + holes[k]] = means[k];
        if (Float.isNaN(means[k])) {
          holes[left++] = holes[k];
        }
      }
      count = left;
    }
  }

  private static float meanOfNeighbours(float[] image, int offset, int i, int rows, int columns) {
    int r = i / columns;
    int c = i % columns;
    double sum = 0;
    int found = 0;
    for (int side = 0; side < 4; side++) {
      int rr = r + (side == 0 ? -1 : side == 1 ? 1 : 0);
      int cc = c + (side == 2 ? -1 : side == 3 ? 1 : 0);
      if (rr >= 0 && rr < rows && cc >= 0 && cc < columns) {
        float v = image[offset + rr * columns + cc];
        if (!Float.isNaN(v)) {
          sum += v;
          found++;
        }
      }
    }
    return found == 0 ? Float.NaN : (float) (sum / found);
  }
}
