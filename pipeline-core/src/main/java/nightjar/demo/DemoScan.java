package nightjar.demo;

/**
 * How the invented scanner records. The field is {@value #FIELD_MILLIMETRES} mm deep whatever the
 * number of voxels.
 *
 * @param planes at least 1; one plane gives a recording without a plane axis
 * @param depths voxels along depth
 * @param laterals voxels along lateral
 * @param frames at least 40
 * @param intervalSeconds between the centres of frames
 * @param sweepSeconds from one plane to the next within a frame; 0 = all planes at once
 */
public record DemoScan(
    int planes, int depths, int laterals, int frames, double intervalSeconds, double sweepSeconds) {
  static final double FIELD_MILLIMETRES = 9.6;
  static final double PLANE_SPACING_MILLIMETRES = 0.4;
  static final double FIRST_DEPTH_MILLIMETRES = 1.0;

  public DemoScan {
    if (planes < 1 || depths < 24 || laterals < 24 || frames < 40) {
      throw new IllegalArgumentException(
          "a scan of %d x %d x %d voxels and %d frames is too small"
              .formatted(planes, depths, laterals, frames));
    }
    if (!(intervalSeconds > 0) || !(sweepSeconds >= 0)) {
      throw new IllegalArgumentException(
          "interval " + intervalSeconds + " s, sweep " + sweepSeconds + " s");
    }
    if (sweepSeconds * (planes - 1) >= intervalSeconds) {
      throw new IllegalArgumentException("the sweep is longer than a frame");
    }
  }

  /** Distance of neighbouring voxels along depth and lateral, mm. */
  public double spacingMillimetres() {
    return FIELD_MILLIMETRES / depths;
  }

  /** Centre of frame {@code t}, s. */
  public double frameSeconds(int t) {
    return (t + 0.5) * intervalSeconds;
  }

  /** Length of the recording, s. */
  public double lengthSeconds() {
    return frames * intervalSeconds;
  }
}
