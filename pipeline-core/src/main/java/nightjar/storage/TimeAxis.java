package nightjar.storage;

import java.util.Optional;
import nightjar.recording.FrameTimes;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;

/** The times of the frames: the variable {@code time}, or a stated interval in its place. */
final class TimeAxis {
  private static final String NAME = "time";
  private static final String INTERVAL = "frame_interval_s";

  private TimeAxis() {}

  /**
   * Reads the times of the centres of the frames. Without a time axis the plan's interval, else the
   * global attribute {@code frame_interval_s}, puts frame i at (i + 1/2) intervals.
   */
  static FrameTimes read(
      Container container, StoredDimension time, @Nullable Double planIntervalSeconds) {
    Optional<StoredVariable> axis = container.variable(NAME);
    if (axis.isEmpty()) {
      return regular((int) time.length(), interval(container, planIntervalSeconds));
    }
    double[] seconds = AxisValues.seconds(container, axis.get(), time);
    for (int i = 1; i < seconds.length; i++) {
      if (!(seconds[i] > seconds[i - 1])) {
        throw container
            .refusal(axis.get(), "time does not increase from frame " + (i - 1) + " to " + i)
            .found(
                AxisValues.shown(seconds[i - 1])
                    + " s, then "
                    + AxisValues.shown(seconds[i])
                    + " s")
            .remedy("write the frames in the order of their times, each once");
      }
    }
    return FrameTimes.of(seconds);
  }

  private static FrameTimes regular(int frames, double interval) {
    double[] seconds = new double[frames];
    for (int i = 0; i < frames; i++) {
      seconds[i] = (i + 0.5) * interval;
    }
    return FrameTimes.of(seconds);
  }

  private static double interval(Container container, @Nullable Double planned) {
    if (planned != null) {
      return checked(
          container.refusal("the plan's frame interval is not a length of time"), planned);
    }
    Attribute a = container.attributes().get(INTERVAL);
    if (a == null) {
      throw container
          .refusal("the recording has no time axis")
          .at("variable " + NAME)
          .remedy(
              "add the variable " + NAME + ", or give " + INTERVAL + " in the file or the plan");
    }
    double[] n = a.numbers();
    RefusedInput refusal =
        container
            .refusal("the frame interval is not a length of time")
            .at("global attribute " + INTERVAL);
    if (n.length != 1) {
      throw refusal.found("\"" + a.display() + "\"").remedy("write it as one number of seconds");
    }
    return checked(refusal, n[0]);
  }

  private static double checked(RefusedInput refusal, double seconds) {
    if (!(seconds > 0) || seconds > 1e6) {
      throw refusal
          .found(seconds)
          .expected("more than 0 s, at most 1000000 s")
          .remedy("give " + INTERVAL + " in seconds");
    }
    return seconds;
  }
}
