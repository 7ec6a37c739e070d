package nightjar.report;

import java.util.List;
import nightjar.plan.Plan;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;

/**
 * What the methods text says: the plan as resolved and what the session brought.
 *
 * @param plan every parameter as used
 * @param version the program's
 * @param grid the recording's
 * @param kept frames with the reasons of rejected ones
 * @param model size of the fitted model
 * @param stimuli in the plan's order
 */
public record MethodsFacts(
    Plan plan,
    String version,
    Grid grid,
    KeptFrames kept,
    ModelSize model,
    List<StimulusFact> stimuli) {
  public MethodsFacts {
    stimuli = List.copyOf(stimuli);
  }

  /**
   * Size of the fitted model.
   *
   * @param maskVoxels voxels it was fitted to
   * @param driftColumns cosine columns
   * @param rank of the matrix over kept frames
   * @param residualDegreesOfFreedom kept frames minus rank
   */
  public record ModelSize(
      int maskVoxels, int driftColumns, int rank, int residualDegreesOfFreedom) {}

  /**
   * A stimulus of the model.
   *
   * @param name in the model
   * @param trials number of trials
   * @param meanColumn mean of its column over kept frames
   */
  public record StimulusFact(String name, int trials, double meanColumn) {}
}
