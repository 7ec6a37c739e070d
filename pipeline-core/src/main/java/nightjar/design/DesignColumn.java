package nightjar.design;

/**
 * One column of the model: its name in design.csv, its part in the model and a value per frame.
 * Immutable.
 */
public final class DesignColumn {
  /** Parts of the model. */
  public enum Kind {
    /** Response to a stimulus. */
    STIMULUS,
    /** Time derivative of a response. */
    SLOPE,
    /** Slow cosine. */
    DRIFT,
    /** Motion or another nuisance series. */
    NUISANCE,
    /** Step of a segment. */
    STEP,
    /** The constant. */
    LEVEL
  }

  private final String name;
  private final Kind kind;
  private final double[] values;

  DesignColumn(String name, Kind kind, double[] values) {
    this.name = name;
    this.kind = kind;
    this.values = values;
  }

  /** Name in design.csv. */
  public String name() {
    return name;
  }

  /** Part of the model. */
  public Kind kind() {
    return kind;
  }

  /** Value at frame {@code t}. */
  public double at(int t) {
    return values[t];
  }

  /** Number of frames. */
  public int frames() {
    return values.length;
  }

  /** Whether the column describes a stimulus. */
  public boolean isOfStimulus() {
    return kind == Kind.STIMULUS || kind == Kind.SLOPE;
  }
}
