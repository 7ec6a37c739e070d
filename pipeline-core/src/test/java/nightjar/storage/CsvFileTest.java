package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import nightjar.recording.Table;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CsvFileTest {
  @TempDir Path folder;

  private String written(Table table) {
    try {
      Path file = folder.resolve("t.csv");
      CsvFile.write(file, table);
      return new String(Files.readAllBytes(file), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  private static Table table(List<String> columns, @Nullable Object... row) {
    return new Table(columns, List.of(Arrays.asList(row)));
  }

  @Test
  void writesNumbersTextAndMissingValuesByTheContract() {
    assertEquals(
        "frame,time_s,kept,reason,t,p,n\n7,0.4,1,flash,-2.5,1.5E-12,12345678901\n",
        written(
            table(
                List.of("frame", "time_s", "kept", "reason", "t", "p", "n"),
                7,
                0.4,
                true,
                "flash",
                -2.5f,
                1.5e-12,
                12345678901L)));
  }

  @Test
  void leavesMissingFieldsEmptyWhereverTheyStand() {
    List<String> columns = List.of("a", "b", "c", "d");
    assertEquals("a,b,c,d\n,,,\n", written(table(columns, null, Double.NaN, Float.NaN, "")));
    assertEquals("a,b,c,d\n,1,,0\n", written(table(columns, "", 1, null, false)));
  }

  /** Section 2 of RFC 4180, rules 5 to 7; its line ends are CRLF, ours LF. */
  @Test
  void quotesOnlyWhatRfc4180Quotes() {
    assertEquals(
        "\"a,b\",c\n\"say \"\"hi\"\"\",\"two\nlines\"\n",
        written(table(List.of("a,b", "c"), "say \"hi\"", "two\nlines")));
    assertEquals(
        "a,b\n-3,left_puff:by_size\n", written(table(List.of("a", "b"), -3, "left_puff:by_size")));
  }

  @Test
  void endsLinesWithLineFeedsAndWritesUtf8WithoutByteOrderMark() throws IOException {
    Path file = folder.resolve("u.csv");
    CsvFile.write(file, table(List.of("region"), "S\u00e3o"));
    assertArrayEquals(
        "region\nS\u00e3o\n".getBytes(StandardCharsets.UTF_8), Files.readAllBytes(file));
  }

  @Test
  void doublesReadBackToTheBitThroughTheFile() {
    SplittableRandom random = new SplittableRandom(7);
    List<List<Object>> rows = new ArrayList<>();
    for (int i = 0; i < 2000; i++) {
      rows.add(List.of(random.nextDouble(-1, 1) * Math.pow(10, random.nextInt(-30, 30))));
    }
    List<String> lines =
        written(new Table(List.of("x"), List.copyOf(rows))).lines().skip(1).toList();
    for (int i = 0; i < rows.size(); i++) {
      assertEquals(rows.get(i).get(0), Double.valueOf(lines.get(i)), "seed 7, row " + i);
    }
  }

  @Test
  void writesAPointInEveryCountry() {
    Locale before = Locale.getDefault();
    try {
      Locale.setDefault(Locale.GERMANY);
      assertEquals("x\n1234.5\n", written(table(List.of("x"), 1234.5)));
    } finally {
      Locale.setDefault(before);
    }
  }

  @Test
  void refusesARowThatDoesNotFitItsHeader() {
    assertThrows(
        IllegalArgumentException.class,
        () -> CsvFile.write(folder.resolve("t.csv"), table(List.of("a", "b"), 1)));
  }
}
