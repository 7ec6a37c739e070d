package nightjar.results;

import java.util.Arrays;
import java.util.List;
import nightjar.recording.Table;
import nightjar.regions.RegionContrast;

/** {@code region_contrasts.csv}: every contrast of every region. */
public final class RegionContrastsFile {
  /** Name in the result folder. */
  public static final String NAME = "region_contrasts.csv";

  private static final List<String> COLUMNS =
      List.of(
          "region",
          "voxels",
          "contrast",
          "effect_percent",
          "se_percent",
          "ci_low_percent",
          "ci_high_percent",
          "t",
          "df",
          "p",
          "q");

  private RegionContrastsFile() {}

  /** The file's table. */
  public static Table table(List<RegionContrast> contrasts) {
    return new Table(
        COLUMNS,
        contrasts.stream()
            .map(
                c ->
                    Arrays.<Object>asList(
                        c.region(),
                        c.voxels(),
                        c.contrast(),
                        c.effectPercent(),
                        c.standardErrorPercent(),
                        c.lowPercent(),
                        c.highPercent(),
                        c.t(),
                        c.degreesOfFreedom(),
                        c.p(),
                        c.q()))
            .toList());
  }
}
