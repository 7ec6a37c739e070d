package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import nightjar.recording.EventTable;
import nightjar.recording.Trial;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class EventFileTest {
  private static final String TABLE =
      """
      onset\tduration\ttrial_type\tblock\tforce\tcomment
      1.5\t2\tpuff\tA1\t0.25\tfine
      .5e1\t0\tsham\tn/a\tn/a\t3
      -3\t+1.\tpuff\t\t\tn/a
      """;

  @TempDir private Path folder;

  private EventTable read(byte[] bytes) {
    return EventFile.read(Fixture.file("events.tsv", bytes, folder));
  }

  private EventTable read(String text) {
    return read(text.getBytes(StandardCharsets.UTF_8));
  }

  private String refusal(String text) {
    return assertThrows(RefusedInput.class, () -> read(text)).getMessage();
  }

  private static String trial(String line) {
    return "onset,duration,trial_type\n1,1,a\n" + line + "\n";
  }

  @Test
  void readsTrialsInOrderWithLinesBlocksAndNumericColumns() {
    EventTable t = read(TABLE);
    assertEquals("events.tsv", t.fileName());
    assertEquals(
        List.of(
            new Trial("puff", 1.5, 2, "A1", Map.of("force", 0.25), 2),
            new Trial("sham", 5, 0, null, Map.of("force", Double.NaN), 3),
            new Trial("puff", -3, 1, null, Map.of("force", Double.NaN), 4)),
        t.trials());
    assertEquals(List.of("puff", "sham"), t.stimuli());
  }

  @Test
  void columnsMayStandInAnyOrderAndOneMayBeWithoutName() {
    EventTable t = read(",trial_type,duration,onset\n0,puff,2,1\n1,sham,3,4\n");
    assertEquals(new Trial("sham", 4, 3, null, Map.of(), 3), t.trials().get(1));
  }

  @Test
  void aBlockIsTextEvenWhereItIsANumber() {
    Trial t = read("onset,duration,trial_type,block\n1,1,a,07\n").trials().get(0);
    assertEquals("07", t.block());
    assertEquals(Map.of(), t.values());
  }

  @Test
  void aColumnOfMissingValuesIsNoValue() {
    assertEquals(
        Map.of(), read("onset,duration,trial_type,x\n1,1,a,n/a\n").trials().get(0).values());
  }

  @Test
  void tabsAndCommasByteOrderMarksAndLineEndsMakeNoDifference() {
    EventTable wanted = read(TABLE);
    for (String text : List.of(TABLE, TABLE.replace('\t', ','))) {
      for (String end : List.of("\n", "\r\n", "\r")) {
        for (String mark : List.of("", "\uFEFF")) {
          assertEquals(wanted, read(mark + text.replace("\n", end)));
        }
      }
    }
    assertEquals(wanted, read(TABLE.strip()), "without a last line end");
  }

  @Test
  void linesWithoutContentArePassedOverButCounted() {
    EventTable t = read("\n\nonset,duration,trial_type\n\n1,1,a\n,,\n  \n2,1,b\n");
    assertEquals(List.of(5, 8), t.trials().stream().map(Trial::line).toList());
  }

  @Test
  void quotedCellsMayHoldTheDelimiter() {
    Trial t =
        read("onset,duration,\"trial_type\"\n 1 , 2 , \"puff, \"\"left\"\"\"\n").trials().get(0);
    assertEquals(new Trial("puff, \"left\"", 1, 2, null, Map.of(), 2), t);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "x,1,b | the onset is not a number (found \"x\")",
        ",1,b | the onset is not a number (found \"\")",
        "n/a,1,b | the onset is not a number (found \"n/a\")",
        "1d,1,b | the onset is not a number (found \"1d\")",
        "0x1p3,1,b | the onset is not a number (found \"0x1p3\")",
        "\"1,5\",1,b | the onset is not a number (found \"1,5\")",
        "NaN,1,b | the onset is not a finite number (found \"NaN\")",
        "-inf,1,b | the onset is not a finite number (found \"-inf\")",
        "1e999,1,b | the onset is not a finite number (found \"1e999\")",
        "1,long,b | the duration is not a number (found \"long\")",
        "1,Infinity,b | the duration is not a finite number (found \"Infinity\")",
        "1,-0.5,b | the duration is negative (found -0.5 s)",
        "1,1,n/a | the trial has no stimulus in the column trial_type (found \"n/a\")",
        "1,1, | the trial has no stimulus in the column trial_type (found \"\")",
        "1,1 | the line does not fit the header line (found 2 cells, expected 3 cells)",
        "1 | the line does not fit the header line (found 1 cell, expected 3 cells)",
        "1,1,a,a | the line does not fit the header line (found 4 cells, expected 3 cells)",
        "1,1,\"a | the quotation marks are not in pairs around a cell (found \"1,1,\"a\")",
        "1,1,\"a\"b | the quotation marks are not in pairs around a cell (found \"1,1,\"a\"b\")",
      })
  void refusesALineInOneSentenceWithItsNumberAndValue(String line, String what) {
    String s = refusal(trial(line));
    assertTrue(s.startsWith("events.tsv, line 3: " + what + "; "), s);
    assertTrue(s.endsWith(".") && s.indexOf("; ") < s.length() - 10, s);
  }

  @Test
  void refusesControlCharactersInNames() {
    String s = refusal(trial("1,1,pu\u0007ff"));
    assertTrue(s.contains("line 3: the name of the stimulus contains a control character"), s);
    assertTrue(s.contains("\"pu<U+0007>ff\""), s);
    assertTrue(refusal("onset,duration,trial_type,a\u0000b\n1,1,a,1\n").contains("a column"));
    assertTrue(refusal("onset,duration,trial_type,block\n1,1,a,b\u200b\n").contains("<U+200B>"));
    assertEquals("Präparat 3°", read(trial("1,1,Präparat 3°")).trials().get(1).stimulus());
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "Onset,duration,trial_type | onset | Onset",
        "onset,dauer,durations,trial_type | duration | durations",
        "onset,duration,x,trialtype | trial_type | trialtype",
      })
  void namesTheNearestColumnWhereOneIsMissing(String header, String missing, String nearest) {
    String s = refusal(header + "\n1,1,1,1\n");
    assertTrue(s.startsWith("events.tsv, line 1: the column " + missing + " is missing"), s);
    assertTrue(s.contains("nearest \"" + nearest + "\""), s);
    assertTrue(s.contains("rename that column to " + missing), s);
  }

  @Test
  void refusesAMissingColumnWhereNoOtherIsThere() {
    String s = refusal("onset,duration\n1,1\n");
    assertTrue(s.contains("trial_type is missing (expected onset, duration, trial_type)"), s);
  }

  @Test
  void refusesTwoColumnsOfOneName() {
    String s = refusal("onset,duration,trial_type,onset\n1,1,a,2\n");
    assertTrue(s.contains("line 1: two columns have the same name (found \"onset\")"), s);
  }

  @Test
  void refusesSemicolons() {
    String s = refusal("onset;duration;trial_type\n1,5;2;puff\n");
    assertTrue(s.contains("line 1: the columns are separated by semicolons"), s);
  }

  @ParameterizedTest
  @ValueSource(strings = {"", " \n", "\uFEFF\r\n\r\n"})
  void refusesAnEmptyFile(String text) {
    assertTrue(refusal(text).startsWith("events.tsv: the file is empty (found "));
  }

  @Test
  void refusesATableWithoutTrials() {
    String s = refusal("onset,duration,trial_type\n,,\n");
    assertTrue(s.startsWith("events.tsv, line 1: there is no trial below the header"), s);
  }

  @Test
  void refusesOtherEncodings() {
    byte[] latin = trial("1,1,Ger\u00e4t").getBytes(StandardCharsets.ISO_8859_1);
    String s = assertThrows(RefusedInput.class, () -> read(latin)).getMessage();
    assertTrue(s.startsWith("events.tsv, line 3: the text is not UTF-8 (found byte 0xE4)"), s);
    for (String name : List.of("UTF-16", "UTF-16LE", "UTF-16BE")) {
      byte[] wide = trial("1,1,a").getBytes(Charset.forName(name));
      assertThrows(RefusedInput.class, () -> read(wide), name);
    }
    byte[] cut = {'o', 'n', (byte) 0xC3};
    assertTrue(
        assertThrows(RefusedInput.class, () -> read(cut)).getMessage().contains("not UTF-8"));
  }

  @Test
  void refusesWhatIsNoFile() {
    String s =
        assertThrows(RefusedInput.class, () -> EventFile.read(folder.resolve("none.tsv")))
            .getMessage();
    assertTrue(s.startsWith("none.tsv: there is no such file; "), s);
    assertThrows(RefusedInput.class, () -> EventFile.read(folder));
  }

  @Test
  void refusesMoreThanFiftyMegabytes() throws IOException {
    Path file = folder.resolve("large.tsv");
    try (RandomAccessFile f = new RandomAccessFile(file.toFile(), "rw")) {
      f.setLength(50_000_001);
    }
    String s = assertThrows(RefusedInput.class, () -> EventFile.read(file)).getMessage();
    assertTrue(
        s.startsWith(
            "large.tsv: the file is too large (found 50000001 bytes, expected at most 50 MB)"),
        s);
  }

  @Test
  void refusesMoreColumnsAndTrialsThanAnyTableHas() {
    String wide = "onset,duration,trial_type" + ",x".repeat(1000);
    assertTrue(refusal(wide).contains("line 1: the line has too many cells"));
    String s = refusal("onset,duration,trial_type\n" + "1,1,a\n".repeat(100_001));
    assertTrue(s.contains("line 100002: there are too many trials"), s);
  }

  /** Whatever was done to the text, it is read or refused in one line that names the file. */
  @Test
  void damagedTextIsReadOrRefused() {
    byte[] whole = TABLE.getBytes(StandardCharsets.UTF_8);
    byte[] nasty = "\t,\n\r\"';-+.eE0x \0/#%".getBytes(StandardCharsets.UTF_8);
    SplittableRandom random = new SplittableRandom(20260302);
    int good = 0;
    for (int i = 0; i < 5000; i++) {
      byte[] b = whole.clone();
      for (int k = random.nextInt(1, 6); k > 0; k--) {
        b[random.nextInt(b.length)] =
            random.nextInt(4) > 0
                ? nasty[random.nextInt(nasty.length)]
                : (byte) random.nextInt(256);
      }
      good += reads(b, i) ? 1 : 0;
    }
    assertTrue(good > 100 && good < 4900, good + " of 5000 were read: the damage is no test");
  }

  private boolean reads(byte[] bytes, int number) {
    try {
      for (Trial t : read(bytes).trials()) {
        assertTrue(Double.isFinite(t.onsetSeconds()) && t.durationSeconds() >= 0, "" + number);
      }
      return true;
    } catch (RefusedInput e) {
      assertTrue(e.getMessage().matches("events\\.tsv(, line \\d+)?: .*"), e.getMessage());
      assertNull(e.getCause());
      return false;
    }
  }
}
