package nightjar.picture;

import nightjar.recording.Mask;

/**
 * A set of voxels that a map draws a line around.
 *
 * @param label for the legend, e.g. {@code q < 0.05}
 * @param voxels on the map's grid
 * @param stroke how the line is drawn
 */
public record Outline(String label, Mask voxels, Stroke stroke) {
  /** Ways to draw a line. */
  public enum Stroke {
    /** What survives a family-wise limit. */
    SOLID,
    /** What survives a limit of the share of false discoveries. */
    DASHED
  }
}
