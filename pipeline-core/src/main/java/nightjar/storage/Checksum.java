package nightjar.storage;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** The checksum by which a file is known again. */
public final class Checksum {
  private static final int BUFFER_BYTES = 1 << 18;

  private Checksum() {}

  /**
   * SHA-256 (FIPS 180-4) of a file, 64 lower-case hexadecimal digits.
   *
   * @throws nightjar.refusal.RefusedInput if the file cannot be read
   */
  public static String sha256(Path file) {
    try (InputStream in = Files.newInputStream(file)) {
      MessageDigest digest = MessageDigest.getInstance("SHA-256");
      byte[] buffer = new byte[BUFFER_BYTES];
      for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
        digest.update(buffer, 0, n);
      }
      return HexFormat.of().formatHex(digest.digest());
    } catch (IOException e) {
      throw Container.unreadable(Container.fileNameOf(file));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java has SHA-256", e);
    }
  }
}
