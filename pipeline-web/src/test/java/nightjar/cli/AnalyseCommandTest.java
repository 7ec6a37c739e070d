package nightjar.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AnalyseCommandTest {
  @TempDir private Path folder;

  private Ran analyse(String... more) {
    List<String> all =
        new ArrayList<>(
            List.of("analyse", "--recording", Ran.RECORDING, "--events", Ran.EVENTS, "--plan"));
    all.add(Ran.PLAN);
    all.addAll(List.of("--out", folder.resolve("out").toString()));
    all.addAll(List.of(more));
    return Ran.of(all.toArray(String[]::new));
  }

  private List<Path> written() throws IOException {
    try (Stream<Path> all = Files.list(folder)) {
      return all.toList();
    }
  }

  @Test
  void aSessionIsAnalysedAndToldInShort() throws IOException {
    Ran ran = analyse("--threads", "2");
    assertEquals(0, ran.code(), ran.err());
    assertEquals("", ran.err());
    Path out = folder.resolve("out");
    List<String> lines = ran.out().lines().toList();
    assertTrue(lines.get(0).startsWith("Verdict: "), ran.out());
    assertEquals("Results: " + out.resolve("report.html"), lines.get(lines.size() - 1));
    List<String> rows = Files.readAllLines(out.resolve("region_contrasts.csv"));
    long told = lines.stream().filter(l -> l.contains("_over_")).count();
    assertEquals(rows.size() - 1, told, "one line a row of region_contrasts.csv");
    assertTrue(Files.exists(out.resolve("report.html")));
    assertEquals(List.of(out), written(), "nothing beside the folder");

    String summary = Files.readString(out.resolve("summary.json"));
    analyse().assertRefused("the result folder exists and is not empty");
    assertEquals(summary, Files.readString(out.resolve("summary.json")));
  }

  @Test
  void quietPrintsNothing() {
    assertEquals(new Ran(0, "", ""), analyse("--quiet"));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          --threads 0          | --threads: the number of threads is out of range (found 0, expected 1 to 1024)
          --threads 1025       | the number of threads is out of range
          --threads two        | 'two'
          --reuse other        | --reuse: the option is not available in this version
          --pdf                | --pdf: the option is not available in this version
          --fast               | --fast
          --regions none.json  | a regions file was given, and the plan does not use one
          --traces none.tsv    | none.tsv
          """)
  void whatCannotBeDoneIsRefusedAndLeavesNothing(String arguments, String part) throws IOException {
    analyse(arguments.split(" ")).assertRefused(part);
    assertEquals(List.of(), written());
  }

  @ParameterizedTest
  @CsvSource({
    "drift: {cutoff_s: 2}, drift removal would take the stimulus",
    "mask: {source: recording}, which has none",
    "alignment: {reference: 400}, the reference frame does not exist",
    "regions: {source: file}, the plan takes regions from a file",
    "stimuli: {puff: {}}, the stimulus puff has no trial",
    "nois: {model: ar1}, did you mean noise",
  })
  void aPlanThatCannotWorkIsRefusedAndLeavesNothing(String rest, String part) throws IOException {
    Path plan = folder.resolve("plan.yaml");
    Files.writeString(
        plan, "contrasts: [{name: c, weights: {left_puff: 1, sham_puff: -1}}]\n" + rest + "\n");
    Ran.of(
            "analyse",
            "--recording",
            Ran.RECORDING,
            "--events",
            Ran.EVENTS,
            "--plan",
            plan.toString(),
            "--out",
            folder.resolve("out").toString())
        .assertRefused(part);
    assertEquals(List.of(plan), written());
  }
}
