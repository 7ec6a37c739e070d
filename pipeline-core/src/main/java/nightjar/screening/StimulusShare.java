package nightjar.screening;

import java.util.Arrays;
import java.util.List;
import nightjar.numeric.Cholesky;
import nightjar.numeric.OrthonormalBasis;
import nightjar.recording.FrameTimes;
import nightjar.recording.NamedSeries;

/**
 * The part of log power that follows the stimuli, by a robust fit (iteratively reweighted least
 * squares with Tukey's biweight, c = 4.685 [Beaton & Tukey 1974, Technometrics 16:147]), so that
 * flashes do not pass for a response and a response of the whole field is not rejected at its peak.
 */
final class StimulusShare {
  private static final double BIWEIGHT = 4.685;
  private static final double SD_OF_MAD = 1.4826;
  private static final int ROUNDS = 3;
  private static final int REWEIGHTINGS = 20;

  private final FrameTimes times;
  private final int window;
  private final OrthonormalBasis columns;
  private final int frames;

  private StimulusShare(List<NamedSeries> stimuli, FrameTimes times, int window) {
    this.times = times;
    this.window = window;
    this.frames = times.size();
    columns = new OrthonormalBasis();
    double[] level = new double[frames];
    Arrays.fill(level, 1);
    columns.add(level);
    stimuli.forEach(s -> columns.add(s.toArray()));
  }

  /** What the stimuli explain of {@code logPower}, around its running median; zero mean or so. */
  static double[] of(
      double[] logPower, List<NamedSeries> stimuli, FrameTimes times, int windowFrames) {
    StimulusShare s = new StimulusShare(stimuli, times, windowFrames);
    return s.columns.rank() < 2 ? new double[logPower.length] : s.fit(logPower);
  }

  /** The running median and the response take turns, since each hides a part of the other. */
  private double[] fit(double[] logPower) {
    double[] response = new double[frames];
    for (int round = 0; round < ROUNDS; round++) {
      double[] base = new double[frames];
      for (int t = 0; t < frames; t++) {
        base[t] = logPower[t] - response[t];
      }
      base = RunningMedian.of(base, window, times);
      double[] rest = new double[frames];
      for (int t = 0; t < frames; t++) {
        rest[t] = logPower[t] - base[t];
      }
      response = robust(rest);
    }
    return response;
  }

  private double[] robust(double[] y) {
    double[] weights = new double[frames];
    Arrays.fill(weights, 1);
    double[] fitted = new double[frames];
    for (int k = 0; k < REWEIGHTINGS; k++) {
      double[] residual = new double[frames];
      for (int t = 0; t < frames; t++) {
        residual[t] = y[t] - fitted[t];
      }
      double median = ModifiedZ.median(residual);
      double[] size = new double[frames];
      for (int t = 0; t < frames; t++) {
        size[t] = Math.abs(residual[t] - median);
      }
      double limit = BIWEIGHT * SD_OF_MAD * ModifiedZ.median(size);
      for (int t = 0; t < frames; t++) {
        double u = size[t] / limit;
        weights[t] = u < 1 ? (1 - u * u) * (1 - u * u) : 0;
      }
      if (!(limit > 0)) {
        break;
      }
      fitted = weighted(y, weights);
    }
    return fitted;
  }

  /** Weighted least squares on the basis; NaN in {@code y} does not count. The level stays out. */
  private double[] weighted(double[] y, double[] weights) {
    int p = columns.rank();
    double[] a = new double[p * p];
    double[] b = new double[p];
    for (int t = 0; t < frames; t++) {
      if (Double.isNaN(y[t]) || weights[t] == 0) {
        continue;
      }
      for (int i = 0; i < p; i++) {
        double wq = weights[t] * columns.vector(i)[t];
        b[i] += wq * y[t];
        for (int j = 0; j < p; j++) {
          a[i * p + j] += wq * columns.vector(j)[t];
        }
      }
    }
    double[] fitted = new double[frames];
    if (!Cholesky.factor(a, p)) {
      return fitted;
    }
    Cholesky.solve(a, p, b);
    for (int t = 0; t < frames; t++) {
      for (int i = 1; i < p; i++) {
        fitted[t] += b[i] * columns.vector(i)[t];
      }
    }
    return fitted;
  }
}
