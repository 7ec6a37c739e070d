package nightjar.mask;

/**
 * Plan key {@code scale}: what the model is fitted to, b being the voxel's baseline (mean over kept
 * frames).
 */
public enum Scale {
  /** 100 (y/b - 1). */
  PERCENT,
  /** 100 ln(y/b). */
  LOG_PERCENT
}
