package nightjar.mask;

import nightjar.recording.Mask;
import org.jspecify.annotations.Nullable;

/**
 * Where the final mask begins.
 *
 * @param setting of the plan
 * @param recordingMask the recording's brain_mask, null where it has none
 * @param medianPower of the recording, positive; power is floored at 1/1000 of it
 */
public record MaskSource(MaskSettings setting, @Nullable Mask recordingMask, double medianPower) {}
