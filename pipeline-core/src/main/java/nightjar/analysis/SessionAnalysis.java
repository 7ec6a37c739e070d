package nightjar.analysis;

import java.net.InetAddress;
import java.net.UnknownHostException;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;
import nightjar.numeric.Workers;
import nightjar.recording.Progress;
import nightjar.results.Findings;
import nightjar.results.FrameFindings;
import nightjar.results.MapFindings;
import nightjar.results.Provenance;
import nightjar.results.RegionContrastsFile;
import nightjar.results.RegionFindings;
import nightjar.results.RunFile;
import nightjar.results.RunRecord;
import nightjar.results.SessionResults;
import nightjar.results.Warning;
import nightjar.storage.ResultFolder;
import nightjar.verdict.Judgement;
import nightjar.verdict.Reason;
import nightjar.verdict.Verdict;

/** One session, from its files to its result folder: the stages in the order of numerics 0. */
public final class SessionAnalysis {
  private final OpenedSession session;
  private final Machine machine;
  private final CompletableFuture<Provenance> provenance;

  private SessionAnalysis(
      OpenedSession session, Machine machine, CompletableFuture<Provenance> provenance) {
    this.session = session;
    this.machine = machine;
    this.provenance = provenance;
  }

  /**
   * Analyses a session.
   *
   * @param out result folder; must not exist or be empty
   * @return what a caller shows at once
   * @throws nightjar.refusal.RefusedInput where the input is at fault; nothing is written then
   * @throws java.util.concurrent.CancellationException where the thread was interrupted; nothing is
   *     written then
   */
  public static AnalysisOutcome run(
      SessionFiles files, Path out, RunSettings settings, StageListener listener) {
    Instant begun = Clock.systemUTC().instant();
    StageRecorder stages = new StageRecorder(listener);
    Progress opening = stages.begin("opening", StageShares.OPENING);
    try (OpenedSession session = OpenedSession.open(files);
        ResultFolder folder = ResultFolder.begin(out);
        Workers workers = new Workers(settings.threads())) {
      Machine machine = new Machine(workers, settings.scratch(), stages);
      // Checksums take a pass over the recording; nobody waits for them until the end.
      CompletableFuture<Provenance> provenance =
          CompletableFuture.supplyAsync(() -> session.provenance(files));
      opening.report(1);
      AnalysisOutcome outcome = new SessionAnalysis(session, machine, provenance).writeInto(folder);
      RunRecord run = new RunRecord(begun, host(), settings.threads(), stages.end());
      SessionResults.writeText(folder, RunFile.NAME, RunFile.text(run));
      folder.complete();
      return outcome;
    }
  }

  private AnalysisOutcome writeInto(ResultFolder folder) {
    try (PreparedFilm film = PreparedFilm.of(session, machine)) {
      FittedModel model = FittedModel.of(session, film, machine);
      RegionFindings regions = RegionStage.of(session, film, model, machine);
      FrameFindings frames =
          new FrameFindings(
              film.judgement(),
              film.motion(),
              session.plan().alignment(),
              model.design(),
              session.offsets());
      MapFindings maps = model.maps(session, film);
      Verdict verdict =
          Judgement.of(
              VerdictFacts.of(
                  session, frames, maps.order(), model.models(), model.fit().residualSd()),
              session.plan().verdict());
      Findings findings =
          new Findings(join(provenance), frames, maps, regions, verdict, warnings(film, model));
      Progress writing = machine.stages().begin("writing", StageShares.WRITING);
      CompletableFuture<Boolean> report =
          CompletableFuture.supplyAsync(() -> SessionReport.write(findings, session, folder));
      SessionResults.write(findings, folder);
      writing.report(0.5);
      join(report);
      writing.report(1);
      return outcome(findings);
    }
  }

  /** The result, or the exception that the work itself threw. */
  private static <T> T join(CompletableFuture<T> work) {
    try {
      return work.join();
    } catch (CompletionException e) {
      if (e.getCause() instanceof RuntimeException cause) {
        throw cause;
      }
      throw e;
    }
  }

  private List<Warning> warnings(PreparedFilm film, FittedModel model) {
    List<Warning> all = new ArrayList<>(session.warnings());
    all.addAll(film.warnings());
    model.design().warnings().forEach(s -> all.add(new Warning("design", s)));
    return all;
  }

  private static AnalysisOutcome outcome(Findings f) {
    return new AnalysisOutcome(
        f.verdict().word().text(),
        f.verdict().reasons().stream().map(Reason::sentence).toList(),
        f.warnings().stream().map(Warning::sentence).toList(),
        RegionContrastsFile.table(f.regions().contrasts()));
  }

  private static String host() {
    try {
      return InetAddress.getLocalHost().getHostName();
    } catch (UnknownHostException e) {
      return "unknown";
    }
  }
}
