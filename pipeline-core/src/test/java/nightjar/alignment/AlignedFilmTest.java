package nightjar.alignment;

import static nightjar.alignment.MovingTexture.plane;
import static nightjar.alignment.MovingTexture.shifted;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import nightjar.alignment.AlignmentSettings.Model;
import nightjar.alignment.AlignmentSettings.Scope;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.RigidMotion;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

class AlignedFilmTest {
  private static final int DEPTHS = 50;
  private static final int LATERALS = 40;

  /** 20 frames at rest but the given ones, which lie 4.2 voxels deeper. */
  private static MovingTexture movedIn(int... frames) {
    List<RigidMotion> motions = new ArrayList<>(Collections.nCopies(20, RigidMotion.NONE));
    for (int t : frames) {
      motions.set(t, shifted(0.42, 0));
    }
    return new MovingTexture(plane(DEPTHS, LATERALS), motions, 21);
  }

  private static KeptFrames without(FrameTimes times, int frame) {
    List<@Nullable String> reasons = new ArrayList<>(Collections.nCopies(times.size(), null));
    reasons.set(frame, "motion");
    return new KeptFrames(times, reasons);
  }

  @Test
  void contentPushedOutOfTheFieldIsMissingThere() {
    try (AlignedFilm film = movedIn(5).align(Model.TRANSLATION, Scope.PLANE)) {
      float[] row = new float[DEPTHS * LATERALS];
      film.rows().read(5, 0, row.length, row, 0);
      for (int z = 0; z < DEPTHS; z++) {
        // Row 45 went to 49.2, within half a voxel of the last row 49; row 46 to 50.2.
        assertEquals(z >= 46, Float.isNaN(row[z * LATERALS + 20]), "depth " + z);
      }
      Mask deepest = Mask.of(row.length, v -> v / LATERALS >= 42);
      assertEquals(0.5, film.outsideShare(5, deepest));
      assertEquals(0, film.outsideShare(4, deepest));
      assertEquals(0, film.outsideShare(5, Mask.of(row.length, v -> false)));
    }
  }

  @Test
  void countsTheKeptFramesInWhichAVoxelLeaves() {
    MovingTexture twice = movedIn(5, 6);
    try (AlignedFilm film = twice.align(Model.TRANSLATION, Scope.PLANE)) {
      FrameTimes times = twice.times();
      int[] all = film.framesOutside(KeptFrames.all(times));
      int[] some = film.framesOutside(without(times, 5));
      for (int z = 0; z < DEPTHS; z++) {
        assertEquals(z >= 46 ? 2 : 0, all[z * LATERALS + 20], "depth " + z);
        assertEquals(z >= 46 ? 1 : 0, some[z * LATERALS + 20], "depth " + z);
      }
    }
  }
}
