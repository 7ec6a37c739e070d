package nightjar.analysis;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;

/** The version of this build. */
public final class Version {
  private Version() {}

  /** Such as 0.1.0. */
  public static String current() {
    try (InputStream in = Version.class.getResourceAsStream("version.properties")) {
      if (in == null) {
        throw new IllegalStateException("version.properties is missing from the build");
      }
      Properties p = new Properties();
      p.load(in);
      return p.getProperty("version", "");
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
