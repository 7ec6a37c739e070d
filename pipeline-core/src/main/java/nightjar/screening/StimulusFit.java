package nightjar.screening;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import nightjar.numeric.RobustRegression;
import nightjar.recording.FrameTimes;
import nightjar.recording.NamedSeries;

/**
 * Takes the stimulus columns out of a plane's power: a response of the whole field is no artefact.
 * Power and columns are both taken relative to their running mean, so that slow drift does not
 * enter, and fitted robustly, so that artefacts do not either; a second round leaves the outlying
 * frames of the first out of the running means.
 */
final class StimulusFit {
  private static final int ROUNDS = 2;

  private StimulusFit() {}

  /**
   * The power minus the fitted columns.
   *
   * @param power one value a frame, NaN where there is none; not modified
   * @param window length of the running mean, frames, odd
   */
  static double[] without(List<NamedSeries> stimuli, double[] power, FrameTimes times, int window) {
    double[] rest = power.clone();
    if (stimuli.isEmpty()) {
      return rest;
    }
    boolean[] usable = new boolean[power.length];
    for (int t = 0; t < usable.length; t++) {
      usable[t] = !Double.isNaN(power[t]);
    }
    double[] coefficients = new double[stimuli.size()];
    for (int round = 0; round < ROUNDS; round++) {
      coefficients = fit(stimuli, power, usable, times, window);
    }
    for (int j = 0; j < coefficients.length; j++) {
      for (int t = 0; t < rest.length; t++) {
        rest[t] -= coefficients[j] * stimuli.get(j).at(t);
      }
    }
    return rest;
  }

  /** Coefficients; {@code usable} loses the frames without weight. */
  private static double[] fit(
      List<NamedSeries> stimuli, double[] power, boolean[] usable, FrameTimes times, int window) {
    List<double[]> columns = new ArrayList<>();
    double[] level = new double[power.length];
    Arrays.fill(level, 1);
    columns.add(packed(level, usable));
    for (NamedSeries s : stimuli) {
      columns.add(packed(offRunningMean(s.toArray(), usable, times, window), usable));
    }
    double[] y = packed(offRunningMean(power, usable, times, window), usable);
    RobustRegression fit = RobustRegression.fit(columns, y);
    int row = 0;
    for (int t = 0; t < usable.length; t++) {
      if (usable[t]) {
        usable[t] = fit.weight(row++) > 0;
      }
    }
    double[] coefficients = new double[stimuli.size()];
    Arrays.setAll(coefficients, j -> fit.coefficient(j + 1));
    return coefficients;
  }

  private static double[] packed(double[] values, boolean[] usable) {
    double[] p = new double[values.length];
    int n = 0;
    for (int t = 0; t < values.length; t++) {
      if (usable[t]) {
        p[n++] = values[t];
      }
    }
    return Arrays.copyOf(p, n);
  }

  /** Values minus the mean of the usable ones around, windows cut at segment borders. */
  private static double[] offRunningMean(
      double[] values, boolean[] usable, FrameTimes times, int window) {
    double[] sum = new double[values.length + 1];
    int[] count = new int[values.length + 1];
    for (int t = 0; t < values.length; t++) {
      sum[t + 1] = sum[t] + (usable[t] ? values[t] : 0);
      count[t + 1] = count[t] + (usable[t] ? 1 : 0);
    }
    double[] off = new double[values.length];
    for (Stretch s : Stretch.segments(times)) {
      for (int t = s.first(); t < s.end(); t++) {
        int from = Math.max(s.first(), t - window / 2);
        int to = Math.min(s.end(), t + window / 2 + 1);
        off[t] = values[t] - (sum[to] - sum[from]) / Math.max(1, count[to] - count[from]);
      }
    }
    return off;
  }
}
