package nightjar.recording;

/**
 * Displacement of the image content from the reference: positive shifts are deeper, towards larger
 * lateral, towards the next plane; rotations are about the centre of the field.
 *
 * @param shiftDepthMillimetres along depth
 * @param shiftLateralMillimetres along lateral
 * @param shiftPlaneMillimetres along plane, 0 unless whole volumes are aligned
 * @param rotationDegrees in the depth-lateral plane, positive from depth towards lateral
 * @param tiltDepthDegrees in the plane-depth plane (rotation about the lateral axis), positive from
 *     plane towards depth
 * @param tiltLateralDegrees in the plane-lateral plane (rotation about the depth axis), positive
 *     from plane towards lateral
 */
public record RigidMotion(
    double shiftDepthMillimetres,
    double shiftLateralMillimetres,
    double shiftPlaneMillimetres,
    double rotationDegrees,
    double tiltDepthDegrees,
    double tiltLateralDegrees) {
  /** No motion. */
  public static final RigidMotion NONE = new RigidMotion(0, 0, 0, 0, 0, 0);
}
