package nightjar.analysis;

import java.util.List;
import nightjar.recording.Table;

/**
 * What a caller shows at once; everything else is in the result folder.
 *
 * @param verdictWord usable, review or unusable
 * @param reasons sentences
 * @param warnings sentences
 * @param regionContrasts as in region_contrasts.csv
 */
public record AnalysisOutcome(
    String verdictWord, List<String> reasons, List<String> warnings, Table regionContrasts) {
  public AnalysisOutcome {
    reasons = List.copyOf(reasons);
    warnings = List.copyOf(warnings);
  }
}
