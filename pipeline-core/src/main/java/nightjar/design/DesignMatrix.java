package nightjar.design;

import java.util.ArrayList;
import java.util.List;

/**
 * The matrix of the model over every frame of the recording, rejected ones included, columns in the
 * order of design.csv. Immutable.
 */
public final class DesignMatrix {
  private final List<DesignColumn> columns;

  DesignMatrix(List<DesignColumn> columns) {
    this.columns = List.copyOf(columns);
  }

  /** The columns in the order of design.csv. */
  public List<DesignColumn> columns() {
    return columns;
  }

  /** Number of frames. */
  public int frames() {
    return columns.get(0).frames();
  }

  /** Names of the columns in order. */
  public List<String> names() {
    return columns.stream().map(DesignColumn::name).toList();
  }

  /** Position of the column called {@code name}, or -1. */
  public int indexOf(String name) {
    return names().indexOf(name);
  }

  /**
   * The mean of designs that differ only in their clocks, for a series averaged over voxels of
   * several planes.
   *
   * @param designs with the same columns
   * @param weights of the designs, summing to 1
   */
  public static DesignMatrix average(List<DesignMatrix> designs, double[] weights) {
    List<DesignColumn> first = designs.get(0).columns;
    List<DesignColumn> mean = new ArrayList<>();
    for (int j = 0; j < first.size(); j++) {
      double[] v = new double[first.get(j).frames()];
      for (int d = 0; d < weights.length; d++) {
        for (int t = 0; t < v.length; t++) {
          v[t] += weights[d] * designs.get(d).columns.get(j).at(t);
        }
      }
      mean.add(new DesignColumn(first.get(j).name(), first.get(j).kind(), v));
    }
    return new DesignMatrix(mean);
  }
}
