package nightjar.results;

import java.util.List;
import nightjar.verdict.Verdict;

/**
 * All that one analysed session leaves.
 *
 * @param provenance where it comes from
 * @param frames frame by frame
 * @param maps voxel by voxel
 * @param regions region by region
 * @param verdict on this session alone
 * @param warnings in the order in which they arose
 */
public record Findings(
    Provenance provenance,
    FrameFindings frames,
    MapFindings maps,
    RegionFindings regions,
    Verdict verdict,
    List<Warning> warnings) {
  public Findings {
    warnings = List.copyOf(warnings);
  }
}
