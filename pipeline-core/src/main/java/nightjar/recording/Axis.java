package nightjar.recording;

import java.util.Arrays;

/** Equally spaced coordinates of one axis in millimetres. Immutable. */
public final class Axis {
  private final double[] millimetres;

  private Axis(double[] millimetres) {
    this.millimetres = millimetres;
  }

  /** Coordinates in mm, at least one; copied. */
  public static Axis of(double... millimetres) {
    if (millimetres.length == 0) {
      throw new IllegalArgumentException("an axis has at least one position");
    }
    return new Axis(millimetres.clone());
  }

  /** Number of positions. */
  public int size() {
    return millimetres.length;
  }

  /** Coordinate of position {@code i}, mm. */
  public double at(int i) {
    return millimetres[i];
  }

  /** Mean distance of neighbours, mm, positive; 0 for a single position. */
  public double spacingMillimetres() {
    int n = millimetres.length;
    return n == 1 ? 0 : Math.abs(millimetres[n - 1] - millimetres[0]) / (n - 1);
  }

  /** A copy of the coordinates, mm. */
  public double[] toArray() {
    return millimetres.clone();
  }

  @Override
  public boolean equals(Object o) {
    return o instanceof Axis a && Arrays.equals(millimetres, a.millimetres);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(millimetres);
  }
}
