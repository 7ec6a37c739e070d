package nightjar.results;

import java.util.Arrays;
import java.util.List;
import nightjar.recording.Table;
import nightjar.regions.ResponseBin;

/** {@code region_responses.csv}: event-locked responses. */
public final class RegionResponsesFile {
  /** Name in the result folder. */
  public static final String NAME = "region_responses.csv";

  private static final List<String> COLUMNS =
      List.of("region", "stimulus", "lag_s", "mean_percent", "sem_percent", "trials");

  private RegionResponsesFile() {}

  /** The file's table. */
  public static Table table(List<ResponseBin> bins) {
    return new Table(
        COLUMNS,
        bins.stream()
            .map(
                b ->
                    Arrays.<Object>asList(
                        b.region(),
                        b.stimulus(),
                        b.lagSeconds(),
                        b.meanPercent(),
                        b.standardErrorPercent(),
                        b.trials()))
            .toList());
  }
}
