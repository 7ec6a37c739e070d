package nightjar.storage;

import org.jspecify.annotations.Nullable;

/**
 * What is wanted of a recording.
 *
 * @param variable the variable with the frames; null: {@code power_doppler} or the only one that
 *     fits
 * @param frameIntervalSeconds interval of the frames, s, used where the file has no time axis;
 *     null: the file must say
 * @param largestVoxelFrames a recording of more voxels x frames is refused
 */
public record RecordingRequest(
    @Nullable String variable, @Nullable Double frameIntervalSeconds, long largestVoxelFrames) {
  /** Nothing in particular; 40 thousand million voxels x frames are the limit. */
  public static final RecordingRequest DEFAULT = new RecordingRequest(null, null, 40_000_000_000L);
}
