package nightjar.mask;

import nightjar.film.FloatRows;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;

/**
 * The aligned film with the frames that were kept.
 *
 * @param recordingName for messages
 * @param film one row a frame of the recording (kept or not), one value a voxel of the grid; shared
 * @param grid of the film
 * @param kept which rows count
 */
public record KeptFilm(String recordingName, FloatRows film, Grid grid, KeptFrames kept) {
  public KeptFilm {
    if (film.width() != grid.voxels() || film.rows() != kept.frames()) {
      throw new IllegalArgumentException(
          String.format(
              "a film of %d x %d for %d frames of %d voxels",
              film.rows(), film.width(), kept.frames(), grid.voxels()));
    }
  }

  /** Voxel {@code v} for people: depth and lateral in mm, the plane where there are several. */
  String place(int v) {
    String where =
        String.format(
            java.util.Locale.ROOT,
            "depth %.2f mm, lateral %.2f mm",
            grid.depths().at(grid.depthOf(v)),
            grid.laterals().at(grid.lateralOf(v)));
    return grid.planes().size() == 1 ? where : "plane " + grid.planeOf(v) + ", " + where;
  }
}
