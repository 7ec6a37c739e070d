package nightjar.storage;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;

/** The recordings that other programs wrote (see the scripts beside them). */
final class Fixture {
  static final int FRAMES = 24;
  static final int DEPTHS = 5;
  static final int LATERALS = 3;

  private Fixture() {}

  static byte[] bytes(String name) {
    try (InputStream in = Fixture.class.getResourceAsStream(name + ".nc")) {
      if (in == null) {
        throw new IllegalStateException("no fixture " + name);
      }
      return in.readAllBytes();
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  static Path file(String name, Path folder) {
    return file(name + ".nc", bytes(name), folder);
  }

  static Path file(String name, byte[] bytes, Path folder) {
    try {
      return Files.write(folder.resolve(name), bytes);
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  static RecordingFile open(String name, Path folder) {
    return RecordingFile.open(file(name, folder), RecordingRequest.DEFAULT);
  }

  /** The formula that the scripts stored. */
  static double stored(int t, int p, int z, int x) {
    return 1000 * p + 100 * z + 10 * x + t;
  }

  static float[] all(RecordingFile r) {
    float[] values = new float[r.times().size() * r.grid().voxels()];
    r.read(0, r.times().size(), values, 0);
    return values;
  }

  static int index(int t, int z, int x) {
    return (t * DEPTHS + z) * LATERALS + x;
  }
}
