package nightjar.recording;

/**
 * Tells a voxel that has no value because its frame was displaced out of the field from one whose
 * value the recording itself lacks. May be asked by several threads at once.
 */
@FunctionalInterface
public interface OutsideField {
  /** Nothing ever leaves the field: a recording that was not aligned. */
  OutsideField NOWHERE = (frame, voxel) -> false;

  /** Whether voxel {@code voxel} of aligned frame {@code frame} lies outside what was recorded. */
  boolean at(int frame, int voxel);
}
