package nightjar.screening;

import java.util.List;
import nightjar.film.FloatRows;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;
import nightjar.recording.OutsideField;

/**
 * What aligned frames are judged by.
 *
 * @param film the aligned film, one row a frame, one value a voxel of the grid; not modified
 * @param grid of the film
 * @param times of the frames
 * @param mask the provisional mask
 * @param motion how the frames moved
 * @param outside tells for a missing value whether displacement is the cause
 * @param stimuli the plan's stimulus columns, one value a frame: one list a plane, or a single list
 *     for all planes
 * @param medianPower of the recording, positive
 */
public record ScreeningInput(
    FloatRows film,
    Grid grid,
    FrameTimes times,
    Mask mask,
    FrameMotion motion,
    OutsideField outside,
    List<List<NamedSeries>> stimuli,
    double medianPower) {
  public ScreeningInput {
    stimuli = stimuli.stream().map(List::copyOf).toList();
    int planes = grid.planes().size();
    if (film.rows() != times.size() || motion.frames() != times.size()) {
      throw new IllegalArgumentException(
          String.format(
              "%d rows and %d motions for %d frames", film.rows(), motion.frames(), times.size()));
    }
    if (film.width() != grid.voxels() || mask.size() != grid.voxels()) {
      throw new IllegalArgumentException(
          String.format(
              "rows of %d and a mask of %d for %d voxels",
              film.width(), mask.size(), grid.voxels()));
    }
    if (stimuli.size() != 1 && stimuli.size() != planes) {
      throw new IllegalArgumentException(
          stimuli.size() + " lists of stimulus columns for " + planes + " planes");
    }
  }

  /** The stimulus columns on the clock of plane {@code p}. */
  List<NamedSeries> stimuliOf(int p) {
    return stimuli.get(stimuli.size() == 1 ? 0 : p);
  }
}
