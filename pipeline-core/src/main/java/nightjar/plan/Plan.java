package nightjar.plan;

import java.util.List;
import java.util.OptionalDouble;
import nightjar.alignment.AlignmentSettings;
import nightjar.design.DriftSettings;
import nightjar.design.Kernel;
import nightjar.design.NuisanceSettings;
import nightjar.design.StimulusSettings;
import nightjar.glm.Contrast;
import nightjar.glm.NoiseSettings;
import nightjar.inference.InferenceSettings;
import nightjar.mask.MaskSettings;
import nightjar.mask.Scale;
import nightjar.regions.RegionSource;
import nightjar.regions.ResponseSettings;
import nightjar.screening.ScreeningSettings;
import nightjar.verdict.VerdictLimits;
import org.jspecify.annotations.Nullable;

/**
 * What is to be computed, with every default filled in.
 *
 * @param fileName name for messages
 * @param name the plan's name
 * @param variable the recording's variable, or null: found by the layout's rule
 * @param frameIntervalSeconds for recordings without a time axis, or null
 * @param smoothingMillimetres FWHM of the spatial smoothing, 0 = none
 * @param kernel haemodynamic kernel
 * @param kernelDerivative whether each stimulus gets a second column, the derivative
 * @param stimuli the plan's own entries, in its order
 * @param contrasts at least one, the first is the headline
 */
public record Plan(
    String fileName,
    String name,
    @Nullable String variable,
    @Nullable Double frameIntervalSeconds,
    ScreeningSettings screening,
    AlignmentSettings alignment,
    double smoothingMillimetres,
    MaskSettings mask,
    Scale scale,
    Kernel kernel,
    boolean kernelDerivative,
    List<StimulusSettings> stimuli,
    DriftSettings drift,
    NuisanceSettings nuisance,
    NoiseSettings noise,
    List<Contrast> contrasts,
    InferenceSettings inference,
    RegionSource regions,
    ResponseSettings responses,
    VerdictLimits verdict) {
  public Plan {
    stimuli = List.copyOf(stimuli);
    contrasts = List.copyOf(contrasts);
  }

  /** The frame interval that the plan gives for recordings without a time axis. */
  public OptionalDouble frameInterval() {
    return frameIntervalSeconds == null
        ? OptionalDouble.empty()
        : OptionalDouble.of(frameIntervalSeconds);
  }
}
