package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class PlanTextTest {
  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          drift: {cutoff_s: 90, cutoff_s: 120} | line 2, column 23: the key occurs twice (found drift.cutoff_s)
          contrasts: []                        | line 2, column 1: the key occurs twice (found contrasts)
          drift: &d {cutoff_s: 90}             | line 2, column 8: anchors are not allowed in a plan
          drift: *d                            | line 2, column 8: aliases are not allowed in a plan
          drift: {cutoff_s: !!float 90}        | line 2, column 19: tags are not allowed in a plan
          drift: !!map {cutoff_s: 90}          | line 2, column 8: tags are not allowed in a plan
          name: !java.net.URL x                | line 2, column 7: tags are not allowed in a plan
          drift: {cutoff_s: 90                 | the plan is not valid YAML
          [a, b]: 1                            | line 2, column 1: a key must be a word (found a list)
          '--- {a: 1}'                         | line 2, column 1: two plans in one file
          """)
  void yamlThatPlansDoNotUseIsRefusedAtItsPlace(String rest, String part) {
    String sentence = Plans.refusalWith(rest);
    assertTrue(sentence.startsWith("p.yaml, line "), sentence);
    assertTrue(sentence.contains(part), sentence);
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "# nothing\n", "contrasts", "- a\n- b\n", "---\n...\n", "~"})
  void aTextWithoutKeysIsRefused(String text) {
    String sentence = Plans.refusalOf(text);
    assertTrue(sentence.startsWith("p.yaml, line "), sentence);
    assertTrue(sentence.contains("the plan holds no keys"), sentence);
  }

  @Test
  void aTabInTheIndentationIsRefusedAtItsLine() {
    String sentence = Plans.refusalWith("drift:\n\tcutoff_s: 90\n");
    assertTrue(
        sentence.startsWith("p.yaml, line 3, column 1: the plan is not valid YAML"), sentence);
  }

  @ParameterizedTest
  @ValueSource(strings = {"[", "{a: ", "- "})
  void aDeepNestIsRefusedBeforeItIsBuilt(String opening) {
    String sentence = Plans.refusalWith("x:\n  " + opening.repeat(100_000));
    assertTrue(sentence.contains("the plan is nested too deeply"), sentence);
  }

  @Test
  void aTextOfMoreThanAMegabyteIsRefused(@TempDir Path folder) throws IOException {
    String large = Plans.CONTRASTS + "#".repeat(1_000_000);
    assertThrows(RefusedInput.class, () -> PlanFile.parse(large, "p.yaml"));
    Path file = Files.writeString(folder.resolve("large.yaml"), large);
    String sentence = assertThrows(RefusedInput.class, () -> PlanFile.read(file)).getMessage();
    assertEquals(
        "large.yaml: the plan is too large (found "
            + large.length()
            + " bytes, expected at most"
            + " 1000000); give a YAML plan.",
        sentence);
  }

  @Test
  void aByteOrderMarkAndWindowsLinesAreRead(@TempDir Path folder) throws IOException {
    Path file =
        Files.writeString(
            folder.resolve("p.yaml"), "\uFEFF" + Plans.CONTRASTS.replace("\n", "\r\n"));
    assertEquals(Plans.with(""), PlanFile.read(file));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 1020, 1022, 1023, 1024, 1025})
  void halfACharacterIsRefusedWhereverItStands(int length) {
    String filler = "#".repeat(length - 1) + "\n";
    assertTrue(Plans.refusalOf(filler + "\uD83D\uD83D\uDC3E: 1").contains("not valid YAML"));
    assertTrue(Plans.refusalOf(filler + "\uD83D").contains("not valid YAML"));
  }

  @Test
  void bytesThatAreNoUtf8AreRefused(@TempDir Path folder) throws IOException {
    Path file = Files.write(folder.resolve("p.yaml"), new byte[] {'a', ':', ' ', (byte) 0xe9});
    String sentence = assertThrows(RefusedInput.class, () -> PlanFile.read(file)).getMessage();
    assertEquals("p.yaml: the plan is not UTF-8 text; save it as UTF-8 text.", sentence);
  }

  @Test
  void aFileThatIsNotThereAndAFolderAreRefused(@TempDir Path folder) {
    Path absent = folder.resolve("absent.yaml");
    String sentence = assertThrows(RefusedInput.class, () -> PlanFile.read(absent)).getMessage();
    assertTrue(sentence.startsWith(absent + ": there is no such file"), sentence);
    assertThrows(RefusedInput.class, () -> PlanFile.read(folder));
  }

  @Test
  void theReadyPlanIsRead() {
    Plan plan = PlanFile.read(Path.of("..", "configs", "whisker-puff.yaml"));
    assertEquals("whisker-puff", plan.name());
    assertEquals("left_over_sham", plan.contrasts().get(0).name());
  }
}
