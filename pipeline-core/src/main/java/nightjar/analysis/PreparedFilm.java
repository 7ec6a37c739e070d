package nightjar.analysis;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.alignment.AlignedFilm;
import nightjar.alignment.Alignment;
import nightjar.alignment.ReferenceFrames;
import nightjar.design.DesignColumn;
import nightjar.design.SessionDesign;
import nightjar.film.PercentSeries;
import nightjar.mask.FinalMask;
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
import nightjar.refusal.RefusedInput;
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
  private static final int TYPICAL_FRAMES = 31;
  private static final int FRAMES_A_BLOCK = 64;

  /** Runs the stages; the aligned film is freed before this returns. */
  static PreparedFilm of(OpenedSession session, Machine machine) {
    RecordingFile recording = session.recording();
    Grid grid = recording.grid();
    GrossPass gross =
        GrossPass.over(
            recording,
            recording.fileName(),
            machine.scratch(),
            machine.workers(),
            machine.stages().begin("reading", StageShares.READING));
    Mask provisional = PowerMask.of(gross.medianImage(), grid, gross.medianPower());
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
    double[] outside = new double[recording.times().size()];
    machine
        .workers()
        .forEachBlock(
            outside.length,
            FRAMES_A_BLOCK,
            (first, end) -> {
              for (int t = first; t < end; t++) {
                outside[t] = film.outsideShare(t, reference.provisionalMask());
              }
            });
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
            t -> outside[t],
            p -> stimuli(responses, p),
            reference.medianPower());
    FrameJudgement judgement =
        Screening.judge(input, session.plan().screening(), machine.workers(), progress);
    if (judgement.kept().count() == 0) {
      throw RefusedInput.because("every frame was rejected")
          .in(recording.fileName())
          .remedy("look at the recording, or set screening: {enabled: false} in the plan");
    }
    return judgement;
  }

  private static List<NamedSeries> stimuli(SessionDesign design, int plane) {
    return design.ofPlane(plane).columns().stream()
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
    KeptFrames kept = judgement.kept();
    FinalMask mask =
        FinalMask.of(
            film.rows(),
            kept,
            film.framesOutside(kept),
            new FinalMask.Source(
                recording.fileName(),
                recording.grid(),
                plan.mask(),
                recording.brainMask(),
                medianPower),
            machine.workers(),
            share -> progress.report(share / 2));
    if (plan.smoothingMillimetres() > 0) {
      Smoothing.smooth(
          film.rows(),
          kept,
          recording.grid(),
          mask.mask(),
          plan.smoothingMillimetres(),
          machine.workers());
    }
    PercentSeries series =
        SeriesScaling.scale(
            film.rows(),
            mask.mask(),
            kept,
            plan.scale(),
            machine.scratch(),
            machine.workers(),
            share -> progress.report(0.5 + share / 2));
    return new PreparedFilm(
        film.motion(),
        judgement,
        new MeanPower(mask.meanPower()),
        series,
        mask.leftOut().stream().map(s -> new Warning("mask", s)).toList());
  }

  @Override
  public void close() {
    series.close();
  }
}
