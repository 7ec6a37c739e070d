package nightjar.analysis;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import nightjar.design.ModelledStimulus;
import nightjar.plan.Plan;
import nightjar.plan.PlanCheck;
import nightjar.plan.PlanFile;
import nightjar.plan.ResolvedPlan;
import nightjar.recording.EventTable;
import nightjar.recording.EventTiming;
import nightjar.recording.PlaneOffsets;
import nightjar.recording.RegionLabels;
import nightjar.results.InputFile;
import nightjar.results.Provenance;
import nightjar.results.Warning;
import nightjar.storage.Checksum;
import nightjar.storage.EventFile;
import nightjar.storage.RecordingFile;
import nightjar.storage.RecordingRequest;
import nightjar.storage.TraceFile;
import org.jspecify.annotations.Nullable;

/**
 * The files of a session, read and held against each other; the frames are still on disk.
 *
 * @param recording open until this is closed
 * @param plan what is to be computed
 * @param stimuli in the order of the model
 * @param regions named areas on the recording's grid
 * @param warnings so far
 */
record OpenedSession(
    RecordingFile recording,
    Plan plan,
    List<ModelledStimulus> stimuli,
    RegionLabels regions,
    List<Warning> warnings)
    implements AutoCloseable {

  /** Opens; refuses whatever can be refused before the frames are read. */
  static OpenedSession open(SessionFiles files) {
    Plan plan = PlanFile.read(files.plan());
    EventTable events = EventFile.read(files.events());
    List<ModelledStimulus> stimuli = PlanCheck.against(plan, events);
    RecordingFile recording = RecordingFile.open(files.recording(), request(plan));
    try {
      List<Warning> warnings = new ArrayList<>();
      EventTiming.check(events, recording.times(), recording.fileName())
          .forEach(s -> warnings.add(new Warning("events", s)));
      EarlyRecordingCheck.of(plan, recording);
      EarlyDesignCheck.of(plan, stimuli, recording.times(), offsets(recording));
      RegionLabels regions = SessionRegions.of(plan, files.regions(), recording);
      if (regions.regions().isEmpty() && plan.regions() != nightjar.regions.RegionSource.NONE) {
        warnings.add(
            new Warning(
                "no_regions",
                recording.fileName() + " names no regions, so there are no region results."));
      }
      if (files.traces() != null) {
        TraceFile.checkCoverage(
            TraceFile.read(files.traces()),
            name(files.traces()),
            recording.times(),
            recording.fileName());
        warnings.add(
            new Warning("traces", "The plan uses no trace; " + name(files.traces()) + " is idle."));
      }
      return new OpenedSession(recording, plan, stimuli, regions, warnings);
    } catch (RuntimeException e) {
      recording.close();
      throw e;
    }
  }

  /** How the plan wants the recording read. */
  static RecordingRequest request(Plan plan) {
    return new RecordingRequest(
        plan.variable(),
        plan.frameIntervalSeconds(),
        RecordingRequest.DEFAULT.largestVoxelFrames());
  }

  private static PlaneOffsets offsets(RecordingFile recording) {
    return PlaneOffsets.of(recording.planeTimeOffsetsSeconds());
  }

  /** The planes' clocks. */
  PlaneOffsets offsets() {
    return offsets(recording);
  }

  /** Where the results will come from. */
  Provenance provenance(SessionFiles files) {
    List<InputFile> inputs = new ArrayList<>();
    add(inputs, "recording", files.recording());
    add(inputs, "events", files.events());
    add(inputs, "plan", files.plan());
    add(inputs, "regions", files.regions());
    add(inputs, "traces", files.traces());
    return new Provenance(
        Version.current(),
        inputs,
        ResolvedPlan.toMap(plan, stimuli.stream().map(ModelledStimulus::name).toList()),
        recording.grid(),
        recording.metadata());
  }

  private static void add(List<InputFile> inputs, String role, @Nullable Path file) {
    if (file != null) {
      inputs.add(new InputFile(role, name(file), Checksum.sha256(file)));
    }
  }

  private static String name(Path file) {
    return String.valueOf(file.getFileName());
  }

  @Override
  public void close() {
    recording.close();
  }
}
