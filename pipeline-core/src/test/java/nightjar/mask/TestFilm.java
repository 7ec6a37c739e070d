package nightjar.mask;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import org.jspecify.annotations.Nullable;

/** A film of positive noise on the heap. */
final class TestFilm {
  static final Scratch HEAP = new Scratch(Path.of("none"), Long.MAX_VALUE);

  private TestFilm() {}

  /** Power between 90 and 110. */
  static FloatRows noise(int frames, Grid grid, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    FloatRows film = HEAP.allocate(frames, grid.voxels());
    for (int t = 0; t < frames; t++) {
      for (int v = 0; v < grid.voxels(); v++) {
        set(film, t, v, (float) (90 + 20 * random.nextDouble()));
      }
    }
    return film;
  }

  static void set(FloatRows film, int frame, int voxel, float value) {
    film.write(frame, voxel, 1, new float[] {value}, 0);
  }

  static float get(FloatRows film, int frame, int voxel) {
    float[] value = new float[1];
    film.read(frame, voxel, 1, value, 0);
    return value[0];
  }

  static KeptFrames allBut(FrameTimes times, int... rejected) {
    List<@Nullable String> reasons = new ArrayList<>();
    for (int t = 0; t < times.size(); t++) {
      reasons.add(null);
    }
    for (int t : rejected) {
      reasons.set(t, "power");
    }
    return new KeptFrames(times, reasons);
  }
}
