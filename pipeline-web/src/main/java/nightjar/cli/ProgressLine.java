package nightjar.cli;

import me.tongfei.progressbar.ConsoleProgressBarConsumer;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import me.tongfei.progressbar.ProgressBarStyle;
import nightjar.analysis.StageListener;
import nightjar.recording.Progress;
import org.jspecify.annotations.Nullable;

/**
 * One line on standard error with the stage, the share done and the remaining time; nothing where
 * standard error is no terminal (the launcher looks and sets {@code nightjar.terminal}).
 */
final class ProgressLine implements StageListener, AutoCloseable {
  private static final int STEPS = 1000;

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
            .setTaskName("opening")
            .setStyle(ProgressBarStyle.ASCII)
            .setConsumer(new ConsoleProgressBarConsumer(System.err))
            .setUpdateIntervalMillis(200)
            .setEtaFunction(
                state ->
                    state.getCurrent() <= 0
                        ? java.util.Optional.empty()
                        : java.util.Optional.of(
                            state
                                .getElapsedAfterStart()
                                .multipliedBy(STEPS - state.getCurrent())
                                .dividedBy(state.getCurrent())))
            .build());
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
    return done -> line.stepTo(Math.round(STEPS * Math.min(1, begin + share * done)));
  }

  @Override
  public void close() {
    if (bar != null) {
      bar.close();
    }
  }
}
