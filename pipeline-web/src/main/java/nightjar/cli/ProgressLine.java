package nightjar.cli;

import java.time.Duration;
import java.util.Locale;
import me.tongfei.progressbar.ConsoleProgressBarConsumer;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import me.tongfei.progressbar.ProgressState;
import nightjar.analysis.StageListener;
import nightjar.recording.Progress;
import org.jspecify.annotations.Nullable;

/**
 * One line on standard error with the stage, the share done and the remaining time; nothing where
 * standard error is no terminal (the launcher looks and sets {@code nightjar.terminal}).
 */
final class ProgressLine implements StageListener, AutoCloseable {
  private static final int STEPS = 1000;
  private static final int BAR = 30;

  private final @Nullable ProgressBar bar;
  private double before;
  private double stageShare;

  private ProgressLine(@Nullable ProgressBar bar) {
    this.bar = bar;
  }

  static ProgressLine onTerminal(boolean quiet) {
    if (quiet || !Boolean.getBoolean("nightjar.terminal")) {
      return new ProgressLine(null);
    }
    return new ProgressLine(
        new ProgressBarBuilder()
            .setInitialMax(STEPS)
            .setRenderer((state, width) -> cut(line(state), width))
            .setConsumer(new ConsoleProgressBarConsumer(System.err))
            .setUpdateIntervalMillis(200)
            .build());
  }

  private static String cut(String line, int width) {
    return line.substring(0, Math.min(line.length(), Math.max(0, width)));
  }

  private static String line(ProgressState state) {
    String stage = state.getExtraMessage();
    return line(
        stage == null ? "" : stage,
        (double) state.getCurrent() / STEPS,
        state.getElapsedAfterStart());
  }

  /**
   * The line's text.
   *
   * @param share of the whole run done, 0 to 1
   */
  static String line(String stage, double share, Duration elapsed) {
    int full = (int) Math.round(BAR * share);
    String text =
        String.format(
            Locale.ROOT,
            "[%s%s] %3d %%  %s",
            "=".repeat(full),
            " ".repeat(BAR - full),
            Math.round(100 * share),
            stage);
    if (share <= 0 || share >= 1) {
      return text;
    }
    long left = Math.round(elapsed.toMillis() / 1000.0 * (1 - share) / share);
    return text + String.format(Locale.ROOT, ", %d:%02d left", left / 60, left % 60);
  }

  @Override
  public Progress stage(String name, double share) {
    ProgressBar line = bar;
    before += stageShare;
    stageShare = share;
    if (line == null) {
      return Progress.SILENT;
    }
    double begin = before;
    line.setExtraMessage(name);
    line.stepTo(Math.round(STEPS * Math.min(1, begin)));
    return done -> line.stepTo(Math.round(STEPS * Math.min(1, begin + share * done)));
  }

  @Override
  public void close() {
    if (bar != null) {
      bar.close();
    }
  }
}
