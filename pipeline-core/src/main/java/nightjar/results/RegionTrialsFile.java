package nightjar.results;

import java.util.Arrays;
import java.util.List;
import nightjar.recording.Table;
import nightjar.regions.TrialValue;

/** {@code region_trials.csv}: one value a region and trial. */
public final class RegionTrialsFile {
  /** Name in the result folder. */
  public static final String NAME = "region_trials.csv";

  private static final List<String> COLUMNS =
      List.of("region", "stimulus", "trial", "onset_s", "duration_s", "mean_percent", "frames");

  private RegionTrialsFile() {}

  /** The file's table. */
  public static Table table(List<TrialValue> trials) {
    return new Table(
        COLUMNS,
        trials.stream()
            .map(
                v ->
                    Arrays.<Object>asList(
                        v.region(),
                        v.stimulus(),
                        v.trial(),
                        v.onsetSeconds(),
                        v.durationSeconds(),
                        v.meanPercent(),
                        v.frames()))
            .toList());
  }
}
