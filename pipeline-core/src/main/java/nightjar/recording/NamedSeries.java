package nightjar.recording;

/**
 * A named value per frame of the recording: a trace, a motion parameter, a component. Immutable.
 */
public final class NamedSeries {
  private final String name;
  private final double[] values;

  /** Values are copied. */
  public NamedSeries(String name, double[] values) {
    this.name = name;
    this.values = values.clone();
  }

  /** Name, as it stands in design.csv. */
  public String name() {
    return name;
  }

  /** Number of frames. */
  public int size() {
    return values.length;
  }

  /** Value of frame {@code i}. */
  public double at(int i) {
    return values[i];
  }

  /** A copy of the values. */
  public double[] toArray() {
    return values.clone();
  }
}
