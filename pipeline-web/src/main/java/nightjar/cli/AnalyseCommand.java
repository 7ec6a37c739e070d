package nightjar.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import nightjar.analysis.AnalysisOutcome;
import nightjar.analysis.RunSettings;
import nightjar.analysis.SessionAnalysis;
import nightjar.analysis.SessionFiles;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code nightjar analyse}: from a session's files to its result folder. */
@Command(
    name = "analyse",
    sortOptions = false,
    mixinStandardHelpOptions = true,
    description = {"Analyses one session and writes maps, tables, verdict and report.", ""},
    exitCodeListHeading = "%nExit codes:%n",
    exitCodeList = {
      "0:done; the result folder is complete",
      "2:the input or the command line was refused; nothing was written",
      "3:the analysis failed; an incident was logged",
      "130:interrupted; nothing was written"
    },
    footer = {
      "",
      "Example:",
      "  ./nightjar analyse --recording scan.nc --events scan_events.tsv \\",
      "      --plan configs/whisker-puff.yaml --out results/scan"
    })
final class AnalyseCommand implements Callable<Integer> {
  @Option(
      names = "--recording",
      required = true,
      paramLabel = "FILE",
      description = "Power-Doppler recording, NetCDF (see shared/session-layout.md).")
  private Path recording = Path.of("");

  @Option(
      names = "--events",
      required = true,
      paramLabel = "FILE",
      description = "Event table with onset, duration (s) and trial_type; tab or comma separated.")
  private Path events = Path.of("");

  @Option(
      names = "--plan",
      required = true,
      paramLabel = "FILE",
      description = "What is to be computed, YAML (see shared/plan.md).")
  private Path plan = Path.of("");

  @Option(
      names = "--regions",
      paramLabel = "FILE",
      description =
          "Label file (NetCDF) or polygons (JSON, mm), where the plan's regions come from a file"
              + " (default: none).")
  private @Nullable Path regions;

  @Option(
      names = "--traces",
      paramLabel = "FILE",
      description =
          "Continuous traces with their time (s); tab or comma separated (default: none).")
  private @Nullable Path traces;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "FOLDER",
      description = "Result folder; must not exist, or be empty.")
  private Path out = Path.of("");

  @Option(
      names = "--threads",
      paramLabel = "N",
      description =
          "Number of threads, 1 to 1024; no result depends on it (default: all processors).")
  private @Nullable Integer threads;

  @Option(names = "--quiet", description = "Print nothing but a refusal (default: off).")
  private boolean quiet;

  @Option(names = "--reuse", paramLabel = "FOLDER", hidden = true)
  private @Nullable Path reuse;

  @Option(names = "--pdf", hidden = true)
  private boolean pdf;

  @Spec private @Nullable CommandSpec spec;

  @Override
  public Integer call() {
    refuseWhatIsMissing();
    SessionFiles files = new SessionFiles(recording, events, plan, regions, traces);
    RunSettings machine = RunSettings.ofThisMachine();
    RunSettings settings = threads == null ? machine : machine.withThreads(threads);
    AnalysisOutcome outcome;
    try (ProgressLine progress = ProgressLine.onTerminal(quiet)) {
      outcome = SessionAnalysis.run(files, out, settings, progress);
    }
    if (!quiet && spec != null) {
      print(outcome, spec.commandLine().getOut());
    }
    return 0;
  }

  private void refuseWhatIsMissing() {
    if (threads != null && (threads < 1 || threads > 1024)) {
      throw RefusedInput.because("the number of threads is out of range")
          .at("--threads")
          .found(threads)
          .expected("1 to 1024")
          .remedy("leave it out to use all processors");
    }
    if (reuse != null || pdf) {
      throw RefusedInput.because("the option is not available in this version")
          .at(reuse != null ? "--reuse" : "--pdf")
          .remedy("leave it out");
    }
  }

  private void print(AnalysisOutcome outcome, PrintWriter to) {
    to.println("Verdict: " + outcome.verdictWord());
    outcome.reasons().forEach(r -> to.println("  " + r));
    if (!outcome.warnings().isEmpty()) {
      to.println("Warnings:");
      outcome.warnings().forEach(w -> to.println("  " + w));
    }
    if (!outcome.regionContrasts().rows().isEmpty()) {
      to.println();
      to.print(RegionContrastLines.of(outcome.regionContrasts()));
    }
    to.println();
    to.println("Results: " + out.resolve("report.html"));
    to.flush();
  }
}
