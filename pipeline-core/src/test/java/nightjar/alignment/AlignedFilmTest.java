package nightjar.alignment;

import static nightjar.alignment.MovingTexture.plane;
import static nightjar.alignment.MovingTexture.shifted;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import nightjar.alignment.AlignmentSettings.Model;
import nightjar.alignment.AlignmentSettings.Scope;
import nightjar.recording.RigidMotion;
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

  @Test
  void contentPushedOutOfTheFieldIsMissingThere() {
    try (AlignedFilm film = movedIn(5).align(Model.TRANSLATION, Scope.PLANE)) {
      float[] row = new float[DEPTHS * LATERALS];
      film.rows().read(5, 0, row.length, row, 0);
      for (int z = 0; z < DEPTHS; z++) {
        // Row 45 went to 49.2, within half a voxel of the last row 49; row 46 to 50.2.
        assertEquals(z >= 46, Float.isNaN(row[z * LATERALS + 20]), "depth " + z);
      }
      for (int v = 0; v < row.length; v++) {
        assertEquals(Float.isNaN(row[v]), film.isOutsideField(5, v), "voxel " + v);
        assertFalse(film.isOutsideField(4, v));
      }
    }
  }
}
