package nightjar.mask;

/** Plan section {@code mask}: where the voxels to be analysed come from. */
public enum MaskSettings {
  /** Otsu's threshold on the mean power. */
  AUTO,
  /** The recording's brain_mask variable. */
  RECORDING,
  /** Every voxel of the field. */
  ALL
}
