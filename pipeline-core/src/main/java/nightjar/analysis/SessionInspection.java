package nightjar.analysis;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;
import nightjar.design.ModelledStimulus;
import nightjar.plan.Plan;
import nightjar.plan.PlanCheck;
import nightjar.plan.PlanFile;
import nightjar.recording.EventTable;
import nightjar.recording.EventTiming;
import nightjar.recording.PlaneOffsets;
import nightjar.recording.RegionLabels;
import nightjar.recording.Trace;
import nightjar.refusal.RefusedInput;
import nightjar.regions.RegionSource;
import nightjar.storage.EventFile;
import nightjar.storage.LabelFile;
import nightjar.storage.PolygonFile;
import nightjar.storage.RecordingFile;
import nightjar.storage.RecordingRequest;
import nightjar.storage.TraceFile;
import org.jspecify.annotations.Nullable;

/**
 * Looks at the files of a session, any of them alone, and holds against each other what is there;
 * collects every refusal instead of stopping at the first.
 */
public final class SessionInspection {
  private final Map<String, Map<String, Object>> sections = new LinkedHashMap<>();
  private final List<String> warnings = new ArrayList<>();
  private final List<RefusedInput> refusals = new ArrayList<>();

  private SessionInspection() {}

  /** Inspects. */
  public static Inspection of(InspectedFiles files) {
    SessionInspection s = new SessionInspection();
    s.inspect(files);
    return new Inspection(s.sections, s.warnings, s.refusals);
  }

  private void inspect(InspectedFiles files) {
    Optional<Plan> plan = read(files.plan(), PlanFile::read);
    Optional<EventTable> events = read(files.events(), EventFile::read);
    Optional<RecordingFile> recording =
        read(
            files.recording(),
            f ->
                RecordingFile.open(
                    f, plan.map(OpenedSession::request).orElse(RecordingRequest.DEFAULT)));
    try {
      recording.ifPresent(r -> sections.put("recording", RecordingFacts.of(r)));
      events.ifPresent(e -> sections.put("events", EventFacts.of(e)));
      plan.ifPresent(p -> sections.put("plan", PlanFacts.of(p)));
      if (recording.isPresent()) {
        events.ifPresent(e -> checkTiming(e, recording.get()));
        sections.put(
            "needs", MachineNeeds.of(recording.get().grid(), recording.get().times().size()));
      }
      if (plan.isPresent() && recording.isPresent()) {
        check(() -> EarlyRecordingCheck.of(plan.get(), recording.get()));
      }
      if (plan.isPresent() && events.isPresent()) {
        checkDesign(plan.get(), events.get(), recording);
      }
      if (files.regions() != null) {
        regions(files.regions(), plan, recording);
      } else if (plan.isPresent() && events.isPresent() && recording.isPresent()) {
        // All that an analysis must have is there, so a regions file that is not is missing.
        check(() -> SessionRegions.of(plan.get(), null, recording.get()));
      }
      if (files.traces() != null) {
        traces(files.traces(), recording);
      }
    } finally {
      recording.ifPresent(RecordingFile::close);
    }
  }

  private interface Reader<T> {
    T read(Path file);
  }

  private <T> Optional<T> read(@Nullable Path file, Reader<T> reader) {
    return file == null ? Optional.empty() : attempt(() -> reader.read(file));
  }

  private <T> Optional<T> attempt(Supplier<T> work) {
    try {
      return Optional.of(work.get());
    } catch (RefusedInput e) {
      refusals.add(e);
      return Optional.empty();
    }
  }

  private void check(Runnable work) {
    attempt(
        () -> {
          work.run();
          return true;
        });
  }

  private void checkTiming(EventTable events, RecordingFile recording) {
    attempt(() -> EventTiming.check(events, recording.times(), recording.fileName()))
        .ifPresent(warnings::addAll);
  }

  private void checkDesign(Plan plan, EventTable events, Optional<RecordingFile> recording) {
    Optional<List<ModelledStimulus>> stimuli = attempt(() -> PlanCheck.against(plan, events));
    if (stimuli.isPresent() && recording.isPresent()) {
      RecordingFile r = recording.get();
      PlaneOffsets offsets = PlaneOffsets.of(r.planeTimeOffsetsSeconds());
      attempt(() -> EarlyDesignCheck.of(plan, stimuli.get(), r.times(), offsets))
          .ifPresent(warnings::addAll);
    }
  }

  private void regions(Path file, Optional<Plan> plan, Optional<RecordingFile> recording) {
    if (recording.isEmpty()) {
      warnings.add(file.getFileName() + " can be checked only beside its recording.");
      return;
    }
    RecordingFile r = recording.get();
    boolean drawn =
        plan.map(p -> p.regions() == RegionSource.DRAWN)
            .orElse(String.valueOf(file.getFileName()).endsWith(".json"));
    Optional<RegionLabels> labels =
        attempt(
            () ->
                plan.isPresent()
                    ? SessionRegions.of(plan.get(), file, r)
                    : drawn
                        ? PolygonFile.read(file, r.grid())
                        : LabelFile.read(file, r.grid(), r.fileName()));
    labels.ifPresent(
        l -> {
          Map<String, Object> m = new LinkedHashMap<>();
          m.put("file", String.valueOf(file.getFileName()));
          m.put("voxels", RecordingFacts.voxels(l));
          sections.put("regions", m);
        });
  }

  private void traces(Path file, Optional<RecordingFile> recording) {
    Optional<List<Trace>> traces = attempt(() -> TraceFile.read(file));
    if (traces.isEmpty()) {
      return;
    }
    String name = String.valueOf(file.getFileName());
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("file", name);
    m.put("traces", traces.get().stream().map(Trace::name).toList());
    sections.put("traces", m);
    recording.ifPresent(
        r -> check(() -> TraceFile.checkCoverage(traces.get(), name, r.times(), r.fileName())));
  }
}
