package nightjar.storage;

import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.PlaneOffsets;
import nightjar.recording.RegionLabels;
import nightjar.recording.SessionMetadata;

/**
 * What a recording says before its frames.
 *
 * @param grid of every frame
 * @param times of all frames that will be written
 * @param offsets of the planes; written where planes are swept
 * @param regions written as the variable {@code roi}, numbered from 1 in their order; may be none
 * @param metadata global attributes
 * @param packedStep power that one unit of a packed 16-bit number stands for; power beyond 32767
 *     steps is cut off
 */
public record RecordingHeader(
    Grid grid,
    FrameTimes times,
    PlaneOffsets offsets,
    RegionLabels regions,
    SessionMetadata metadata,
    double packedStep) {
  public RecordingHeader {
    if (!(packedStep > 0)) {
      throw new IllegalArgumentException("a step of " + packedStep);
    }
    if (regions.regions().size() > Byte.MAX_VALUE) {
      throw new IllegalArgumentException(regions.regions().size() + " regions do not fit a byte");
    }
  }
}
