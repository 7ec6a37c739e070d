package nightjar.numeric;

import org.jtransforms.fft.DoubleFFT_1D;

/**
 * Sums of products at every lag, {@code c_k = sum_i x_i y_(i+k)} for k = 0..n-1, added up over
 * pairs of sequences of equal length n, by the fast Fourier transform. Not thread-safe.
 */
public final class LagSums {
  private final int n;
  private final int size;
  private final DoubleFFT_1D transform;
  private final double[] spectrum;

  /** For sequences of {@code n} values. */
  public LagSums(int n) {
    this.n = n;
    int s = 2;
    while (s < 2 * n) {
      s *= 2;
    }
    size = s;
    transform = new DoubleFFT_1D(size);
    spectrum = new double[2 * size];
  }

  /** Adds {@code weight} times the lag sums of {@code x} with {@code y}; neither is modified. */
  public void add(double[] x, double[] y, double weight) {
    double[] fx = full(x);
    double[] fy = x == y ? fx : full(y);
    for (int i = 0; i < 2 * size; i += 2) {
      // conj(X) Y
      spectrum[i] += weight * (fx[i] * fy[i] + fx[i + 1] * fy[i + 1]);
      spectrum[i + 1] += weight * (fx[i] * fy[i + 1] - fx[i + 1] * fy[i]);
    }
  }

  /** The sums so far, {@code n} values. */
  public double[] sums() {
    double[] s = spectrum.clone();
    transform.complexInverse(s, true);
    double[] c = new double[n];
    for (int k = 0; k < n; k++) {
      c[k] = s[2 * k];
    }
    return c;
  }

  private double[] full(double[] x) {
    double[] f = new double[2 * size];
    System.arraycopy(x, 0, f, 0, n);
    transform.realForwardFull(f);
    return f;
  }
}
