package nightjar.glm;

import java.util.Arrays;

/**
 * The fit of every series. Values are NaN where a series has no residual variance. Written by
 * {@link Glm} alone; arrays handed out are shared, not copied.
 */
public final class GlmFit {
  final double[] autocorrelation;
  final double[] residualSd;
  final double[][] estimate;
  final double[][] effect;
  final double[][] standardError;
  final double[][] t;
  final double[][] degreesOfFreedom;
  final double[][] p;

  GlmFit(int series, int contrasts, int estimates) {
    autocorrelation = new double[series];
    residualSd = new double[series];
    estimate = new double[estimates][series];
    effect = new double[contrasts][series];
    standardError = new double[contrasts][series];
    t = new double[contrasts][series];
    degreesOfFreedom = new double[contrasts][series];
    p = new double[contrasts][series];
  }

  /** The fit of no series. */
  public static GlmFit ofNothing() {
    return new GlmFit(0, 0, 0);
  }

  /** Marks series {@code v} as without a fit. */
  void leaveOut(int v) {
    autocorrelation[v] = Double.NaN;
    residualSd[v] = Double.NaN;
    for (double[][] a :
        new double[][][] {estimate, effect, standardError, t, degreesOfFreedom, p}) {
      Arrays.stream(a).forEach(x -> x[v] = Double.NaN);
    }
  }

  /** Number of series. */
  public int series() {
    return residualSd.length;
  }

  /** AR(1) coefficient as used, one a series; 0 for white noise. */
  public double[] autocorrelation() {
    return autocorrelation;
  }

  /**
   * Standard deviation of ordinary residuals, divisor kept frames minus rank, in the series' unit.
   */
  public double[] residualSd() {
    return residualSd;
  }

  /** Coefficient {@code e}, one a series. */
  public double[] estimate(int e) {
    return estimate[e];
  }

  /** Effect of contrast {@code c} in the series' unit. */
  public double[] effect(int c) {
    return effect[c];
  }

  /** Standard error of the effect. */
  public double[] standardError(int c) {
    return standardError[c];
  }

  /** Effect over standard error. */
  public double[] t(int c) {
    return t[c];
  }

  /** Degrees of freedom that p uses. */
  public double[] degreesOfFreedom(int c) {
    return degreesOfFreedom[c];
  }

  /** Two-sided p. */
  public double[] p(int c) {
    return p[c];
  }
}
