package nightjar.recording;

/** A continuous measurement beside the recording with its own clock. Immutable. */
public final class Trace {
  private final String name;
  private final double[] seconds;
  private final double[] values;

  /** {@code seconds} strictly increasing, as many as {@code values}; both copied. */
  public Trace(String name, double[] seconds, double[] values) {
    if (seconds.length != values.length) {
      throw new IllegalArgumentException(
          seconds.length + " times for " + values.length + " values");
    }
    this.name = name;
    this.seconds = seconds.clone();
    this.values = values.clone();
  }

  /** Column name in its file. */
  public String name() {
    return name;
  }

  /** Number of samples. */
  public int size() {
    return seconds.length;
  }

  /** Time of sample {@code i}, s. */
  public double secondsAt(int i) {
    return seconds[i];
  }

  /** Value of sample {@code i}. */
  public double at(int i) {
    return values[i];
  }
}
