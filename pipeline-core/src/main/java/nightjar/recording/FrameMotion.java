package nightjar.recording;

import java.util.List;

/** How every frame moved: per plane, or once for the whole volume. Immutable. */
public final class FrameMotion {
  private final boolean wholeVolume;
  private final List<List<RigidMotion>> motions;
  private final double[][] displacements;

  /**
   * @param wholeVolume true: one motion a frame; false: one a plane and frame
   * @param motions {@code [frame][unit]}
   * @param displacementsMillimetres {@code [frame][unit]}, mean over the provisional mask of the
   *     length of the displacement vector from the reference; copied
   */
  public FrameMotion(
      boolean wholeVolume, List<List<RigidMotion>> motions, double[][] displacementsMillimetres) {
    this.wholeVolume = wholeVolume;
    this.motions = motions.stream().map(List::copyOf).toList();
    this.displacements = displacementsMillimetres.clone();
    for (int t = 0; t < displacements.length; t++) {
      displacements[t] = displacements[t].clone();
    }
  }

  /** Frames that never moved: the record of an analysis without alignment. */
  public static FrameMotion none(int frames, int planes) {
    return new FrameMotion(
        false,
        java.util.Collections.nCopies(
            frames, java.util.Collections.nCopies(planes, RigidMotion.NONE)),
        new double[frames][planes]);
  }

  /** Whether one motion holds for the whole volume. */
  public boolean wholeVolume() {
    return wholeVolume;
  }

  /** Number of frames. */
  public int frames() {
    return motions.size();
  }

  /** Motions a frame: the number of planes, or 1 for a whole volume. */
  public int units() {
    return motions.get(0).size();
  }

  /** Motion of frame {@code t}, unit {@code u}. */
  public RigidMotion at(int t, int u) {
    return motions.get(t).get(u);
  }

  /** Displacement of frame {@code t}, unit {@code u}, mm. */
  public double displacementMillimetres(int t, int u) {
    return displacements[t][u];
  }
}
