package nightjar.glm;

/**
 * {@code sum over k of c_k rho^k}: the trace of a matrix with the AR(1) correlation, from the
 * matrix' lag sums.
 */
final class LagPolynomial {
  /** Powers below this change no digit of a sum whose first term is of order 1. */
  private static final double NEGLIGIBLE = 1e-18;

  private final double[] coefficients;

  LagPolynomial(double[] coefficients) {
    this.coefficients = coefficients;
  }

  double at(double rho) {
    double sum = 0;
    double power = 1;
    for (int k = 0; k < coefficients.length && Math.abs(power) > NEGLIGIBLE; k++) {
      sum += coefficients[k] * power;
      power *= rho;
    }
    return sum;
  }

  double slopeAt(double rho) {
    double sum = 0;
    double power = 1;
    for (int k = 1; k < coefficients.length && k * Math.abs(power) > NEGLIGIBLE; k++) {
      sum += k * coefficients[k] * power;
      power *= rho;
    }
    return sum;
  }
}
