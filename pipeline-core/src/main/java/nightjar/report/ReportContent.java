package nightjar.report;

import java.util.List;
import nightjar.design.DesignMatrix;
import nightjar.verdict.Verdict;

/**
 * Everything that the report page shows.
 *
 * @param heading what was analysed
 * @param verdict of this session alone
 * @param warnings sentences for people
 * @param facts of the recording and the analysis, in order
 * @param maps of the brain
 * @param regions results by region
 * @param frames what happened to frames
 * @param design the matrix as fitted; of the first plane where planes have their own
 * @param level what counts as significant for q
 * @param methods the methods text, Markdown
 */
public record ReportContent(
    Heading heading,
    Verdict verdict,
    List<String> warnings,
    List<Fact> facts,
    BrainMaps maps,
    ReportedRegions regions,
    ReportedFrames frames,
    DesignMatrix design,
    double level,
    String methods) {
  public ReportContent {
    warnings = List.copyOf(warnings);
    facts = List.copyOf(facts);
  }

  /**
   * What was analysed.
   *
   * @param title name of the session or recording
   * @param plan name of the plan
   * @param version the program's
   * @param inputs files in order
   */
  public record Heading(String title, String plan, String version, List<Input> inputs) {
    public Heading {
      inputs = List.copyOf(inputs);
    }
  }

  /**
   * A file that went in.
   *
   * @param role recording, events, plan, regions, traces
   * @param name file name
   * @param sha256 of its content, hexadecimal
   */
  public record Input(String role, String name, String sha256) {}

  /**
   * A line of the table of facts.
   *
   * @param name what it is
   * @param value with its unit
   */
  public record Fact(String name, String value) {}
}
