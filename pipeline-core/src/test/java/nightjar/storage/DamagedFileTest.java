package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.concurrent.CountDownLatch;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever was done to a file, it opens and reads or it is refused, soon and in little memory. */
class DamagedFileTest {
  private static final RecordingRequest SMALL = new RecordingRequest(null, null, 1_000_000);

  @TempDir private Path folder;

  /** Opens and reads all; true if that went well, false if refused. */
  private boolean reads(byte[] bytes) {
    Path file = Fixture.file("damaged.nc", bytes, folder);
    try (RecordingFile r = RecordingFile.open(file, SMALL)) {
      Fixture.all(r);
      return true;
    } catch (RefusedInput e) {
      assertTrue(e.getMessage().startsWith("damaged.nc"), e.getMessage());
      return false;
    }
  }

  /** Only the padding behind the last value may be left out, as some writers do. */
  @ParameterizedTest
  @CsvSource({
    "plain_float, 0",
    "packed_short, 0",
    "records, 2",
    "one_record_variable, 0",
    "planes_double, 0",
    "packed_int, 0"
  })
  void aClassicFileCutOffAnywhereIsRefused(String name, int padding) {
    byte[] whole = Fixture.bytes(name);
    for (int length = 0; length < whole.length - padding; length += step(length, whole)) {
      if (reads(Arrays.copyOf(whole, length))) {
        throw new AssertionError(name + " cut to " + length + " of " + whole.length);
      }
    }
    assertTrue(reads(Arrays.copyOf(whole, whole.length - padding)));
    assertTrue(reads(Arrays.copyOf(whole, whole.length + 100)), "more bytes do no harm");
  }

  /** Every length near both ends, some in between. */
  private static int step(int length, byte[] whole) {
    return length < 200 || length >= whole.length - 20 ? 1 : 7;
  }

  @ParameterizedTest
  @ValueSource(strings = {"chunked_deflate", "contiguous_float", "unlimited_unsigned"})
  void aNetcdf4FileCutOffAnywhereIsRefused(String name) {
    byte[] whole = Fixture.bytes(name);
    for (int length = 0; length < whole.length; length += length < 100 ? 3 : 197) {
      if (reads(Arrays.copyOf(whole, length))) {
        throw new AssertionError(name + " cut to " + length + " of " + whole.length);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "plain_float",
        "packed_short",
        "records",
        "one_record_variable",
        "planes_double",
        "packed_int"
      })
  void aClassicHeaderWithWrongBytesOpensOrIsRefused(String name) {
    byte[] whole = Fixture.bytes(name);
    SplittableRandom random = new SplittableRandom(20260301);
    int header = Math.min(whole.length, 900);
    for (int i = 0; i < 200; i++) {
      byte[] b = whole.clone();
      for (int k = random.nextInt(1, 4); k > 0; k--) {
        b[random.nextInt(4, header)] = damage(random);
      }
      assertTimeoutPreemptively(Duration.ofSeconds(5), () -> reads(b), name + ", case " + i);
    }
  }

  private static byte damage(SplittableRandom random) {
    byte[] nasty = {0, 1, -1, 0x7f, (byte) 0x80, 12};
    return random.nextBoolean() ? nasty[random.nextInt(nasty.length)] : (byte) random.nextInt(256);
  }

  @ParameterizedTest
  @ValueSource(strings = {"chunked_deflate", "contiguous_float", "unlimited_unsigned"})
  void aNetcdf4HeaderWithWrongBytesOpensOrIsRefused(String name) {
    byte[] whole = Fixture.bytes(name);
    SplittableRandom random = new SplittableRandom(20260302);
    for (int i = 0; i < 60; i++) {
      byte[] b = whole.clone();
      b[random.nextInt(8, b.length)] = damage(random);
      assertTimeoutPreemptively(Duration.ofSeconds(25), () -> reads(b), name + ", case " + i);
    }
  }

  /** Each bit of a length of a dimension turned: nothing may be read as if it were right. */
  @ParameterizedTest
  @ValueSource(strings = {"plain_float", "packed_short", "records", "planes_double"})
  void aWrongLengthOfADimensionIsFoundOut(String name) {
    byte[] whole = Fixture.bytes(name);
    int lateral = find(whole, "lateral") + 8;
    assertTrue(ByteBuffer.wrap(whole).getInt(lateral) == Fixture.LATERALS);
    for (int bit = 0; bit < 32; bit++) {
      byte[] b = whole.clone();
      ByteBuffer.wrap(b).putInt(lateral, Fixture.LATERALS ^ (1 << bit));
      if (reads(b)) {
        throw new AssertionError(name + ", bit " + bit);
      }
    }
  }

  @Test
  void aStreamingNumberOfRecordsIsCountedFromTheLength() {
    byte[] b = Fixture.bytes("records");
    ByteBuffer.wrap(b).putInt(4, -1);
    assertTrue(reads(b));
    assertTrue(reads(Arrays.copyOf(b, b.length - 44)), "23 records, one partly written");
    ByteBuffer.wrap(b).putInt(4, 0x7fffffff);
    Path file = Fixture.file("many.nc", b, folder);
    RefusedInput e = assertThrows(RefusedInput.class, () -> RecordingFile.open(file, SMALL));
    assertTrue(e.getMessage().contains("cut off"), e.getMessage());
  }

  @Test
  void overlappingVariablesAreRefused() {
    byte[] b = Fixture.bytes("plain_float");
    // The begin of a variable is the last number of its entry; make two of them the same.
    int depth = find(b, "units", find(b, "depth", find(b, "lateral", find(b, "power"))));
    int begin = depth + 8 + 8 + 4 + 4 + 4;
    ByteBuffer.wrap(b).putInt(begin, b.length - 200);
    assertTrue(!reads(b));
  }

  @Test
  void aHugeNameOrCountIsRefusedBeforeItIsBelieved() {
    byte[] b = Fixture.bytes("plain_float");
    for (int at = 8; at < 200; at += 4) {
      byte[] huge = b.clone();
      ByteBuffer.wrap(huge).putInt(at, 0x7ffffff0);
      reads(huge);
      ByteBuffer.wrap(huge).putInt(at, -16);
      reads(huge);
    }
    ByteBuffer.wrap(b).putInt(12, 0x7ffffff0);
    assertTrue(!reads(b));
  }

  private static int find(byte[] in, String text) {
    return find(in, text, 0);
  }

  private static int find(byte[] in, String text, int from) {
    String all = new String(in, java.nio.charset.StandardCharsets.ISO_8859_1);
    return all.indexOf(text, from);
  }

  @Test
  void aLibraryThatNeverComesBackIsRefusedAtTheDeadline() {
    try (LibraryThread t = new LibraryThread("night.nc")) {
      CountDownLatch never = new CountDownLatch(1);
      RefusedInput e =
          assertThrows(
              RefusedInput.class,
              () ->
                  t.call(
                      Duration.ofSeconds(1),
                      () -> {
                        never.await();
                        return 0;
                      }));
      assertTrue(e.getMessage().startsWith("night.nc: "), e.getMessage());
      assertTrue(e.getMessage().contains("no end after 1 s"), e.getMessage());
    }
  }

  @Test
  void whateverTheLibraryThrowsIsARefusal() {
    try (LibraryThread t = new LibraryThread("night.nc")) {
      for (Throwable thrown :
          new Throwable[] {
            new StackOverflowError(), new OutOfMemoryError("heap"), new java.io.IOException("eof")
          }) {
        RefusedInput e =
            assertThrows(
                RefusedInput.class,
                () -> t.call(Duration.ofSeconds(9), () -> DamagedFileTest.fail(thrown)));
        assertTrue(e.getMessage().contains(thrown.getClass().getSimpleName()), e.getMessage());
      }
    }
  }

  private static int fail(Throwable thrown) throws Exception {
    if (thrown instanceof Error e) {
      throw e;
    }
    throw (Exception) thrown;
  }
}
