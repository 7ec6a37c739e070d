package nightjar.demo;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.GeneralSecurityException;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The small session that is kept in {@code demo-data/ready}. */
class ReadySessionTest {
  private static final Path READY = Path.of("..", "demo-data", "ready");
  private static final DemoFiles FILES = DemoFiles.in(READY, DemoStudy.smallSession().name());

  /**
   * With the property the session is written anew: for when the generator is changed on purpose.
   */
  @BeforeAll
  static void writeAnewOnRequest() throws Exception {
    if (Boolean.getBoolean("nightjar.demo.write")) {
      DemoStudy.smallSession().writeTo(READY);
      Files.writeString(READY.resolve("CHECKSUMS"), checksums());
    }
  }

  @Test
  void theGeneratorStillGivesTheseBytes(@TempDir Path folder) throws IOException {
    DemoFiles made = DemoStudy.smallSession().writeTo(folder);
    assertArrayEquals(Files.readAllBytes(FILES.recording()), Files.readAllBytes(made.recording()));
    assertEquals(Files.readString(FILES.events()), Files.readString(made.events()));
    assertEquals(Files.readString(FILES.truth()), Files.readString(made.truth()));
  }

  @Test
  void checksumsAreThoseOfTheFiles() throws Exception {
    assertEquals(checksums(), Files.readString(READY.resolve("CHECKSUMS")));
  }

  @Test
  void theRecordingIsSmallerThanThreeMegabytes() throws IOException {
    assertTrue(Files.size(FILES.recording()) < 3_000_000);
  }

  private static String checksums() throws IOException, GeneralSecurityException {
    StringBuilder lines = new StringBuilder();
    for (Path file : List.of(FILES.recording(), FILES.events(), FILES.truth())) {
      byte[] digest = MessageDigest.getInstance("SHA-256").digest(Files.readAllBytes(file));
      lines.append(HexFormat.of().formatHex(digest)).append("  ").append(file.getFileName());
      lines.append('\n');
    }
    return lines.toString();
  }
}
