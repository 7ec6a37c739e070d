package nightjar.design;

import java.util.Set;

/**
 * Plan section {@code nuisance}.
 *
 * @param motion which motion columns enter the model
 * @param segments whether each segment after the first gets a step column
 */
public record NuisanceSettings(Set<MotionColumns> motion, boolean segments) {
  /** The plan's defaults. */
  public static final NuisanceSettings DEFAULT = new NuisanceSettings(Set.of(), true);

  public NuisanceSettings {
    motion = Set.copyOf(motion);
  }

  /** Kinds of motion columns. */
  public enum MotionColumns {
    /** Shifts and rotations. */
    POSITION,
    /** Their squares. */
    SQUARE,
    /** Their differences from frame to frame. */
    DIFFERENCE
  }
}
