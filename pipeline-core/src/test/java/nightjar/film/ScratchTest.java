package nightjar.film;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ScratchTest {
  @TempDir Path folder;

  @ParameterizedTest
  @ValueSource(longs = {0, 1_000_000})
  void rowsGiveBackWhatWasWritten(long heapBytes) throws IOException {
    try (FloatRows rows = new Scratch(folder, heapBytes).allocate(50, 30)) {
      if (heapBytes == 0) {
        assertInstanceOf(MappedRows.class, rows);
      } else {
        assertInstanceOf(HeapRows.class, rows);
      }
      for (int r = 0; r < 50; r++) {
        rows.write(r, 10, 3, new float[] {9, r, r + 0.5f, Float.NaN}, 1);
      }
      float[] row = new float[31];
      rows.read(49, 0, 30, row, 1);
      float[] expected = new float[31];
      expected[11] = 49;
      expected[12] = 49.5f;
      expected[13] = Float.NaN;
      assertArrayEquals(expected, row);
      try (Stream<Path> files = Files.list(folder)) {
        // On systems where an open file can lose its name nothing is left to be forgotten.
        assertEquals(0, files.count());
      }
    }
  }

  @Test
  void refusesWhatDoesNotFitTheDisk() {
    RefusedInput e =
        assertThrows(
            RefusedInput.class, () -> new Scratch(folder, 0).allocate(100_000_000, 100_000_000));
    assertTrue(e.getMessage().contains("the scratch folder has too little space"));
  }
}
