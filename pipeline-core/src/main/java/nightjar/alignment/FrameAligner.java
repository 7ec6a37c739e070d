package nightjar.alignment;

import java.util.ArrayList;
import java.util.List;
import nightjar.recording.RigidMotion;

/**
 * Registers and resamples one frame after the other. Holds scratch arrays: one instance a thread.
 */
final class FrameAligner {
  private record Part(Slab slab, LogImage image, Registration registration, Resampler resampler) {}

  private final List<Part> parts = new ArrayList<>();

  /**
   * @param templates one a slab
   * @param floor power below which logarithms are not followed, positive
   */
  FrameAligner(List<Template> templates, double floor) {
    for (Template t : templates) {
      Slab s = t.slab();
      parts.add(new Part(s, new LogImage(s, floor), new Registration(t), new Resampler(s)));
    }
  }

  /**
   * Aligns a frame.
   *
   * @param frame power of the whole grid; not modified
   * @param aligned modified: the frame's content where the reference has it
   * @return the motion of every slab
   */
  List<RigidMotion> align(float[] frame, float[] aligned) {
    List<RigidMotion> motions = new ArrayList<>();
    for (Part part : parts) {
      RigidMotion motion = part.registration.find(part.image.ofPower(frame)).motion();
      part.resampler.resample(frame, new Placement(part.slab, Pose.of(motion)), aligned);
      motions.add(motion);
    }
    return motions;
  }
}
