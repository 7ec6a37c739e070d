package nightjar.alignment;

import java.util.List;
import nightjar.recording.Mask;

/**
 * What the reference is made of.
 *
 * @param typicalFrames numbers of the frames without artefact that lie nearest to the rest
 * @param provisionalMask voxels of the grid that are brain, found on the unaligned frames
 * @param medianPower of the whole recording; positive
 */
public record ReferenceFrames(
    List<Integer> typicalFrames, Mask provisionalMask, double medianPower) {
  public ReferenceFrames {
    typicalFrames = List.copyOf(typicalFrames);
  }
}
