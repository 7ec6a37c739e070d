package nightjar.design;

/**
 * Haemodynamic response to a brief stimulus: unit area, zero before time 0. Closed form: {@link
 * #cumulative} is its exact integral, so that no time grid is needed.
 */
public sealed interface Kernel permits GammaKernel, DoubleGammaKernel {
  /** Value at {@code seconds} after the event, 1/s; 0 before 0. */
  double at(double seconds);

  /** Integral from 0 to {@code seconds}; 0 before 0, towards 1. */
  double cumulative(double seconds);

  /** Time derivative at {@code seconds}, 1/s^2; 0 before 0. */
  double slope(double seconds);

  /** Time of the response's largest value, s (of its first part, where it has an undershoot). */
  double peakSeconds();

  /** Full width of the response at half of that value, s. */
  double widthSeconds();
}
