package nightjar.alignment;

/**
 * Plan section {@code alignment}.
 *
 * @param model what a frame may do
 * @param scope what is aligned as one
 * @param reference what frames are compared with
 */
public record AlignmentSettings(Model model, Scope scope, Reference reference) {
  /** The plan's defaults. */
  public static final AlignmentSettings DEFAULT =
      new AlignmentSettings(Model.RIGID, Scope.PLANE, Reference.TYPICAL);

  /** How a frame may move. */
  public enum Model {
    /** Frames are taken as they are. */
    NONE,
    /** Shifts. */
    TRANSLATION,
    /** Shifts and rotation. */
    RIGID
  }

  /** What moves as one. */
  public enum Scope {
    /** Every plane by itself. */
    PLANE,
    /** All planes together. */
    VOLUME
  }

  /**
   * The image that frames are compared with.
   *
   * @param frame -1: the median of the most typical frames, else a frame's number from 0
   */
  public record Reference(int frame) {
    /** The median of the most typical frames. */
    public static final Reference TYPICAL = new Reference(-1);

    /** The first frame. */
    public static final Reference FIRST = new Reference(0);

    /** Whether it is made of the most typical frames. */
    public boolean isTypical() {
      return frame < 0;
    }
  }
}
