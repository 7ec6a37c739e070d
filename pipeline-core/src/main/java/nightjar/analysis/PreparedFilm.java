package nightjar.analysis;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.alignment.AlignedFilm;
import nightjar.alignment.Alignment;
import nightjar.alignment.ReferenceFrames;
import nightjar.design.DesignColumn;
import nightjar.design.DesignMatrix;
import nightjar.design.SessionDesign;
import nightjar.film.PercentSeries;
import nightjar.mask.FinalMask;
import nightjar.mask.KeptFilm;
import nightjar.mask.MaskSource;
import nightjar.mask.PowerMask;
import nightjar.mask.SeriesScaling;
import nightjar.mask.Smoothing;
import nightjar.plan.Plan;
import nightjar.recording.FrameMotion;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;
import nightjar.recording.Progress;
import nightjar.results.MeanPower;
import nightjar.results.Warning;
import nightjar.screening.FrameJudgement;
import nightjar.screening.GrossPass;
import nightjar.screening.Screening;
import nightjar.screening.ScreeningInput;
import nightjar.storage.RecordingFile;

/**
 * From the recording to the series that the model is fitted to: gross pass, provisional mask,
 * alignment, screening, final mask, smoothing, scale (numerics sections 0 to 5).
 *
 * @param motion of every frame
 * @param judgement which frames are kept
 * @param meanPower over kept frames
 * @param series kept frames by mask voxels, percent
 * @param warnings what people should know of mask and frames
 */
record PreparedFilm(
    FrameMotion motion,
    FrameJudgement judgement,
    MeanPower meanPower,
    PercentSeries series,
    List<Warning> warnings)
    implements AutoCloseable {
  private static final int TYPICAL_FRAMES = 101;

  /** Runs the stages; the aligned film is freed before this returns. */
  static PreparedFilm of(OpenedSession session, Machine machine) {
    RecordingFile recording = session.recording();
    Grid grid = recording.grid();
    GrossPass gross =
        GrossPass.over(
            recording.fileName(),
            recording,
            machine.workers(),
            machine.stages().begin("reading", StageShares.READING));
    Mask provisional = PowerMask.provisional(gross.medianImage(), grid, gross.medianPower());
    ReferenceFrames reference =
        new ReferenceFrames(gross.typicalFrames(TYPICAL_FRAMES), provisional, gross.medianPower());
    try (AlignedFilm film =
        Alignment.align(
            recording,
            session.plan().alignment(),
            reference,
            machine.scratch(),
            machine.workers(),
            machine.stages().begin("aligning", StageShares.ALIGNING))) {
      FrameJudgement judgement = judge(session, film, reference, machine);
      return scaled(session, film, judgement, gross.medianPower(), machine);
    }
  }

  private static FrameJudgement judge(
      OpenedSession session, AlignedFilm film, ReferenceFrames reference, Machine machine) {
    Progress progress = machine.stages().begin("screening", StageShares.SCREENING);
    RecordingFile recording = session.recording();
    SessionDesign responses =
        SessionDesign.build(
            EarlyDesignCheck.request(session.plan(), session.stimuli()),
            KeptFrames.all(recording.times()),
            session.offsets().clocks());
    ScreeningInput input =
        new ScreeningInput(
            film.rows(),
            recording.grid(),
            recording.times(),
            reference.provisionalMask(),
            film.motion(),
            film::isOutsideField,
            responses.planes().stream().map(PreparedFilm::stimuli).toList(),
            reference.medianPower());
    return Screening.judge(input, session.plan().screening(), machine.workers(), progress);
  }

  private static List<NamedSeries> stimuli(DesignMatrix design) {
    return design.columns().stream()
        .filter(DesignColumn::isOfStimulus)
        .map(
            c ->
                new NamedSeries(
                    c.name(), IntStream.range(0, c.frames()).mapToDouble(c::at).toArray()))
        .toList();
  }

  private static PreparedFilm scaled(
      OpenedSession session,
      AlignedFilm film,
      FrameJudgement judgement,
      double medianPower,
      Machine machine) {
    Progress progress = machine.stages().begin("scaling to percent", StageShares.SCALING);
    Plan plan = session.plan();
    RecordingFile recording = session.recording();
    KeptFilm keptFilm =
        new KeptFilm(recording.fileName(), film.rows(), recording.grid(), judgement.kept());
    FinalMask mask =
        FinalMask.of(
            keptFilm,
            new MaskSource(plan.mask(), recording.brainMask().orElse(null), medianPower),
            film::isOutsideField,
            machine.workers(),
            share -> progress.report(share / 2));
    Smoothing.smooth(
        film.rows(), recording.grid(), mask.mask(), plan.smoothingMillimetres(), machine.workers());
    PercentSeries series =
        SeriesScaling.scale(
            keptFilm,
            mask.mask(),
            plan.scale(),
            machine.scratch(),
            machine.workers(),
            share -> progress.report(0.5 + share / 2));
    return new PreparedFilm(
        film.motion(),
        judgement,
        MeanPower.of(recording.grid().voxels(), mask::meanPower),
        series,
        MaskWarnings.of(mask.leftOut()));
  }

  @Override
  public void close() {
    series.close();
  }
}
