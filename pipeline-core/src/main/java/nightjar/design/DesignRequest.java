package nightjar.design;

import java.util.List;
import nightjar.recording.NamedSeries;

/**
 * What the model shall hold.
 *
 * @param stimuli in the order of design.csv
 * @param kernel haemodynamic kernel
 * @param derivative whether each stimulus gets a slope column
 * @param drift cosine drift
 * @param segmentSteps whether segments after the first get a step
 * @param nuisance further columns, one value a frame of the recording
 */
public record DesignRequest(
    List<ModelledStimulus> stimuli,
    Kernel kernel,
    boolean derivative,
    DriftSettings drift,
    boolean segmentSteps,
    List<NamedSeries> nuisance) {
  public DesignRequest {
    stimuli = List.copyOf(stimuli);
    nuisance = List.copyOf(nuisance);
  }

  /** The same model with other nuisance columns. */
  public DesignRequest withNuisance(List<NamedSeries> series) {
    return new DesignRequest(stimuli, kernel, derivative, drift, segmentSteps, series);
  }
}
