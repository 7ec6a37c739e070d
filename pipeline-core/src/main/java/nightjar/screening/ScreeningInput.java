package nightjar.screening;

import java.util.List;
import java.util.function.IntFunction;
import java.util.function.IntToDoubleFunction;
import nightjar.film.FloatRows;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;

/**
 * What frames are judged on.
 *
 * @param film aligned, every frame by every voxel; NaN where missing or outside the field
 * @param grid of the recording
 * @param times of all frames
 * @param mask provisional
 * @param motion of every frame
 * @param outsideShare of the mask outside the field, by frame
 * @param stimuli response columns over all frames, by plane
 * @param medianPower of the whole recording; positive
 */
public record ScreeningInput(
    FloatRows film,
    Grid grid,
    FrameTimes times,
    Mask mask,
    FrameMotion motion,
    IntToDoubleFunction outsideShare,
    IntFunction<List<NamedSeries>> stimuli,
    double medianPower) {}
