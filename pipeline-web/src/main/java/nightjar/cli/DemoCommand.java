package nightjar.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import nightjar.analysis.AnalysisOutcome;
import nightjar.analysis.RunSettings;
import nightjar.analysis.SessionAnalysis;
import nightjar.analysis.SessionFiles;
import nightjar.demo.DemoFiles;
import nightjar.demo.DemoStudy;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code nightjar demo}: an invented session with known truth, made and analysed. */
@Command(
    name = "demo",
    sortOptions = false,
    mixinStandardHelpOptions = true,
    description = {
      "Makes a session of the invented Saltmarsh imaging core, analyses it, and prints the region"
          + " contrasts and where the report is.",
      ""
    })
final class DemoCommand implements Callable<Integer> {
  @Option(
      names = "--to",
      paramLabel = "FOLDER",
      defaultValue = "nightjar-demo",
      description = "Where the session and its results go (default: ${DEFAULT-VALUE}).")
  private Path folder = Path.of("nightjar-demo");

  @Spec private @Nullable CommandSpec spec;

  @Override
  public Integer call() throws IOException {
    if (spec == null) {
      throw new IllegalStateException("picocli sets the specification");
    }
    PrintWriter out = spec.commandLine().getOut();
    Path sessions = Files.createDirectories(folder.resolve("session"));
    out.println("Making an invented session in " + sessions + " ...");
    out.flush();
    DemoFiles files = DemoStudy.firstSession().writeTo(sessions);
    Path plan = Path.of(System.getProperty("nightjar.home", "."), "configs", "whisker-puff.yaml");
    Path results = free(folder.resolve("results"));
    AnalysisOutcome outcome;
    try (ProgressLine progress = ProgressLine.onTerminal(false)) {
      outcome =
          SessionAnalysis.run(
              new SessionFiles(files.recording(), files.events(), plan, null, null),
              results,
              RunSettings.ofThisMachine(),
              progress);
    }
    out.println("Verdict: " + outcome.verdictWord());
    outcome.reasons().forEach(r -> out.println("  " + r));
    out.println();
    out.print(RegionContrastLines.of(outcome.regionContrasts()));
    out.println();
    out.println("The truth:  " + files.truth());
    out.println("The report: " + results.resolve("report.html"));
    out.flush();
    return 0;
  }

  /** The folder itself, or the first of -2, -3 ... that is free: earlier results stay. */
  private static Path free(Path wanted) {
    Path path = wanted;
    for (int n = 2; Files.exists(path); n++) {
      path = wanted.resolveSibling(wanted.getFileName() + "-" + n);
    }
    return path;
  }
}
