package nightjar.demo;

import java.util.List;
import nightjar.recording.Trial;

/**
 * The answer of blood volume to a stimulus: a boxcar smoothed by a gamma-shaped kernel of unit area
 * [Boynton et al. 1996, J Neurosci 16:4207], here by summing the kernel on a fine grid of time.
 * Deliberately not the closed form that the analysis uses, so that each checks the other.
 */
final class ResponseCurve {
  /** Mode of the kernel, s. */
  static final double PEAK_SECONDS = 2.1;

  /** Full width at half maximum, s. */
  static final double WIDTH_SECONDS = 2.9;

  private static final double SHAPE = 3.98358;
  private static final double STEP_SECONDS = 0.001;
  private static final int STEPS = 40_000;

  private final double[] cumulative = new double[STEPS + 1];

  ResponseCurve() {
    double scale = PEAK_SECONDS / (SHAPE - 1);
    double previous = 0;
    for (int i = 1; i <= STEPS; i++) {
      double t = i * STEP_SECONDS;
      double density = StrictMath.exp((SHAPE - 1) * StrictMath.log(t) - t / scale);
      cumulative[i] = cumulative[i - 1] + 0.5 * (previous + density);
      previous = density;
    }
    double area = cumulative[STEPS];
    for (int i = 1; i <= STEPS; i++) {
      cumulative[i] /= area;
    }
  }

  /** Sum of the responses at {@code seconds}; a lasting trial reaches 1. */
  double at(double seconds, List<Trial> trials) {
    double sum = 0;
    for (Trial trial : trials) {
      double since = seconds - trial.onsetSeconds();
      sum += share(since) - share(since - trial.durationSeconds());
    }
    return sum;
  }

  /** Share of the kernel's area before {@code seconds}. */
  private double share(double seconds) {
    double at = seconds / STEP_SECONDS;
    if (at <= 0) {
      return 0;
    }
    int i = (int) at;
    return i >= STEPS ? 1 : cumulative[i] + (at - i) * (cumulative[i + 1] - cumulative[i]);
  }
}
