package nightjar.results;

import java.util.List;
import nightjar.film.PercentSeries;
import nightjar.glm.Contrast;
import nightjar.glm.GlmFit;
import nightjar.inference.AdjustedTests;
import nightjar.inference.InferenceSettings;
import nightjar.recording.VoxelOrder;

/**
 * What was found voxel by voxel.
 *
 * @param series the fitted series with the voxels' baselines
 * @param meanPower mean over kept frames, one a voxel of the grid
 * @param fit estimates are the stimulus columns in order
 * @param tests adjusted p
 * @param model what was fitted and asked
 */
public record MapFindings(
    PercentSeries series, MeanPower meanPower, GlmFit fit, AdjustedTests tests, Model model) {
  /**
   * What was fitted and asked.
   *
   * @param stimuli names of the stimulus columns, slopes included, in order
   * @param contrasts tested against zero
   * @param inference how p was adjusted
   * @param residualDegreesOfFreedom frames kept minus rank
   */
  public record Model(
      List<String> stimuli,
      List<Contrast> contrasts,
      InferenceSettings inference,
      int residualDegreesOfFreedom) {}

  /** The mask's voxels. */
  public VoxelOrder order() {
    return series.order();
  }
}
