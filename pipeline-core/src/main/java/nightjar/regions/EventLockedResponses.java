package nightjar.regions;

import java.util.ArrayList;
import java.util.List;
import nightjar.design.ModelledStimulus;
import nightjar.design.TrialResponse;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.Trial;

/**
 * Event-locked responses of regions (numerics section 12): per trial, the percent series less the
 * jointly fitted drift and nuisance and less the fitted responses of all other trials, since
 * neighbours would bias it; less its own mean before the onset.
 *
 * @param bins region by region, stimulus by stimulus, lag by lag
 * @param trials region by region, stimulus by stimulus, trial by trial
 */
public record EventLockedResponses(List<ResponseBin> bins, List<TrialValue> trials) {
  public EventLockedResponses {
    bins = List.copyOf(bins);
    trials = List.copyOf(trials);
  }

  /** Responses of every region that has voxels. */
  public static EventLockedResponses of(RegionFits fits, ResponseSettings settings) {
    List<ResponseBin> bins = new ArrayList<>();
    List<TrialValue> trials = new ArrayList<>();
    for (int r = 0; r < fits.series().size(); r++) {
      OneRegion region = new OneRegion(fits, r, settings);
      for (ModelledStimulus s : fits.model().request().stimuli()) {
        region.add(s, bins, trials);
      }
    }
    return new EventLockedResponses(bins, trials);
  }

  /** Scratch of one region. */
  private static final class OneRegion {
    private final RegionFits fits;
    private final int r;
    private final ResponseSettings settings;
    private final KeptFrames kept;
    private final FrameTimes times;
    private final double[] residual;
    private final double clock;
    private final int firstBin;
    private final int binCount;

    OneRegion(RegionFits fits, int r, ResponseSettings settings) {
      this.fits = fits;
      this.r = r;
      this.settings = settings;
      this.kept = fits.model().kept();
      this.times = kept.times();
      this.clock = fits.model().offsets().mean(fits.series().planeShares(r));
      double dt = times.intervalSeconds();
      this.firstBin = (int) Math.ceil(-settings.beforeSeconds() / dt - 1e-9);
      this.binCount = (int) Math.floor(settings.afterSeconds() / dt + 1e-9) - firstBin + 1;
      this.residual = new double[kept.count()];
      float[] one = new float[1];
      for (int i = 0; i < residual.length; i++) {
        fits.series().rows().read(i, r, 1, one, 0);
        residual[i] = one[0] - fits.fitted(r, kept.frame(i), c -> true);
      }
    }

    void add(ModelledStimulus stimulus, List<ResponseBin> bins, List<TrialValue> trials) {
      double[] sum = new double[binCount];
      double[] squares = new double[binCount];
      int[] count = new int[binCount];
      String region = fits.series().region(r).name();
      for (int k = 0; k < stimulus.trials().size(); k++) {
        Trial trial = stimulus.trials().get(k);
        double[] series = series(stimulus.name(), trial);
        int[] rows = rowsOf(trial);
        double baseline = mean(series, rows, trial, -settings.beforeSeconds(), 0, false);
        if (!Double.isNaN(baseline)) {
          addBins(series, rows, trial, baseline, sum, squares, count);
        }
        double from = settings.windowFromSeconds();
        double to = settings.windowToSeconds();
        int frames = Double.isNaN(baseline) ? 0 : countIn(rows, trial, from, to);
        trials.add(
            new TrialValue(
                region,
                stimulus.name(),
                k + 1,
                trial.onsetSeconds(),
                trial.durationSeconds(),
                mean(series, rows, trial, from, to, true) - baseline,
                frames));
      }
      for (int j = 0; j < binCount; j++) {
        double n = count[j];
        double mean = n > 0 ? sum[j] / n : Double.NaN;
        double variance = n > 1 ? Math.max(0, squares[j] - n * mean * mean) / (n - 1) : Double.NaN;
        bins.add(
            new ResponseBin(
                region,
                stimulus.name(),
                (firstBin + j) * times.intervalSeconds(),
                mean,
                Math.sqrt(variance / n),
                count[j]));
      }
    }

    /** The residual plus this trial's own fitted response, at every kept frame. */
    private double[] series(String stimulus, Trial trial) {
      double[] own = TrialResponse.response(trial, fits.model().request().kernel(), times, clock);
      double beta = fits.coefficient(r, stimulus);
      double[] slope = new double[0];
      double slopeBeta = 0;
      if (fits.model().request().derivative()) {
        slope = TrialResponse.slope(trial, fits.model().request().kernel(), times, clock);
        slopeBeta = fits.coefficient(r, stimulus + ":slope");
      }
      double[] series = new double[residual.length];
      for (int i = 0; i < series.length; i++) {
        int t = kept.frame(i);
        series[i] = residual[i] + beta * own[t] + (slope.length > 0 ? slopeBeta * slope[t] : 0);
      }
      return series;
    }

    private double lag(int row, Trial trial) {
      return times.at(kept.frame(row)) + clock - trial.onsetSeconds();
    }

    /**
     * Kept rows around the trial that lie in the segment of its onset: first and one after the
     * last.
     */
    private int[] rowsOf(Trial trial) {
      int segment = times.segment(0);
      for (int t = 0; t < times.size(); t++) {
        if (times.at(t) + clock - times.intervalSeconds() / 2 <= trial.onsetSeconds()) {
          segment = times.segment(t);
        }
      }
      double dt = times.intervalSeconds();
      int first = 0;
      while (first < kept.count()
          && (times.segment(kept.frame(first)) < segment
              || lag(first, trial) < -settings.beforeSeconds() - dt)) {
        first++;
      }
      int end = first;
      double last = Math.max(settings.afterSeconds(), settings.windowToSeconds());
      while (end < kept.count()
          && times.segment(kept.frame(end)) == segment
          && lag(end, trial) <= last + dt) {
        end++;
      }
      return new int[] {first, end};
    }

    private boolean isIn(double lag, double from, double to, boolean closed) {
      return lag >= from && (closed ? lag <= to : lag < to);
    }

    private double mean(
        double[] series, int[] rows, Trial trial, double from, double to, boolean closed) {
      double sum = 0;
      int n = 0;
      for (int i = rows[0]; i < rows[1]; i++) {
        if (isIn(lag(i, trial), from, to, closed)) {
          sum += series[i];
          n++;
        }
      }
      return n > 0 ? sum / n : Double.NaN;
    }

    private int countIn(int[] rows, Trial trial, double from, double to) {
      int n = 0;
      for (int i = rows[0]; i < rows[1]; i++) {
        n += isIn(lag(i, trial), from, to, true) ? 1 : 0;
      }
      return n;
    }

    /** Adds the trial's mean in each bin that holds a frame of it. */
    private void addBins(
        double[] series,
        int[] rows,
        Trial trial,
        double baseline,
        double[] sum,
        double[] squares,
        int[] count) {
      double[] binSum = new double[binCount];
      int[] binFrames = new int[binCount];
      for (int i = rows[0]; i < rows[1]; i++) {
        int j = (int) Math.floor(lag(i, trial) / times.intervalSeconds() + 0.5) - firstBin;
        if (j >= 0 && j < binCount) {
          binSum[j] += series[i] - baseline;
          binFrames[j]++;
        }
      }
      for (int j = 0; j < binCount; j++) {
        if (binFrames[j] > 0) {
          double value = binSum[j] / binFrames[j];
          sum[j] += value;
          squares[j] += value * value;
          count[j]++;
        }
      }
    }
  }
}
