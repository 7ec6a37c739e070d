package nightjar.glm;

/**
 * Plan section {@code noise}.
 *
 * @param model how neighbouring frames depend on each other
 * @param smoothingMillimetres FWHM of the smoothing of the autocorrelation over the mask, 0 = none
 * @param degreesOfFreedom which degrees of freedom p values use
 */
public record NoiseSettings(
    Model model, double smoothingMillimetres, DegreesOfFreedom degreesOfFreedom) {
  /** The plan's defaults. */
  public static final NoiseSettings DEFAULT =
      new NoiseSettings(Model.AR1, 0, DegreesOfFreedom.EFFECTIVE);

  /** Noise models. */
  public enum Model {
    /** Independent frames: ordinary least squares. */
    WHITE,
    /** First-order autoregression within segments. */
    AR1
  }

  /** What p values are based on. */
  public enum DegreesOfFreedom {
    /** Reduced for the estimation of the noise model. */
    EFFECTIVE,
    /** Kept frames minus rank. */
    RESIDUAL
  }
}
