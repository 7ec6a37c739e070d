package nightjar.screening;

import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.function.IntToDoubleFunction;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameSource;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;
import nightjar.recording.OutsideField;
import nightjar.recording.Progress;
import nightjar.recording.RigidMotion;

/** Small films whose artefacts are known. */
final class Films {
  private Films() {}

  /**
   * Power of voxels whose baselines differ, with 6 % of AR(1) noise (0.5), a slow drift of 4 % and
   * a global fluctuation of 1 %, times {@code gain} of the frame: {@code [t][voxel]}.
   */
  static float[][] power(int frames, Grid grid, long seed, IntToDoubleFunction gain) {
    Random random = new Random(seed);
    int voxels = grid.voxels();
    double[] base = new double[voxels];
    double[] noise = new double[voxels];
    for (int v = 0; v < voxels; v++) {
      base[v] = Math.exp(0.8 * random.nextGaussian());
      noise[v] = random.nextGaussian();
    }
    double global = 0;
    float[][] film = new float[frames][voxels];
    for (int t = 0; t < frames; t++) {
      global = 0.9 * global + Math.sqrt(1 - 0.81) * random.nextGaussian();
      double frame = gain.applyAsDouble(t) * (1 + 0.01 * global + 0.04 * t / frames);
      for (int v = 0; v < voxels; v++) {
        noise[v] = 0.5 * noise[v] + Math.sqrt(0.75) * random.nextGaussian();
        film[t][v] = (float) (base[v] * frame * Math.max(0.02, 1 + 0.06 * noise[v]));
      }
    }
    return film;
  }

  static FloatRows rows(float[][] film) {
    FloatRows rows =
        new Scratch(Path.of("none"), Long.MAX_VALUE).allocate(film.length, film[0].length);
    for (int t = 0; t < film.length; t++) {
      rows.write(t, 0, film[t].length, film[t], 0);
    }
    return rows;
  }

  static FrameSource source(float[][] film, Grid grid, FrameTimes times) {
    return new FrameSource() {
      @Override
      public Grid grid() {
        return grid;
      }

      @Override
      public FrameTimes times() {
        return times;
      }

      @Override
      public void read(int first, int count, float[] into, int offset) {
        for (int i = 0; i < count; i++) {
          System.arraycopy(film[first + i], 0, into, offset + i * grid.voxels(), grid.voxels());
        }
      }
    };
  }

  /** All voxels in the mask, nothing moved, nothing outside the field, no stimuli. */
  static ScreeningInput input(float[][] film, Grid grid, FrameTimes times) {
    return new ScreeningInput(
        rows(film),
        grid,
        times,
        Mask.all(grid.voxels()),
        FrameMotion.none(times.size(), grid.planes().size()),
        OutsideField.NOWHERE,
        List.of(List.of()),
        1);
  }

  static ScreeningInput with(ScreeningInput in, List<NamedSeries> stimuli) {
    return new ScreeningInput(
        in.film(),
        in.grid(),
        in.times(),
        in.mask(),
        in.motion(),
        in.outside(),
        List.of(stimuli),
        in.medianPower());
  }

  static ScreeningInput with(ScreeningInput in, OutsideField outside) {
    return new ScreeningInput(
        in.film(),
        in.grid(),
        in.times(),
        in.mask(),
        in.motion(),
        outside,
        in.stimuli(),
        in.medianPower());
  }

  /** Every plane shifted along depth, mm by frame. */
  static ScreeningInput shifted(ScreeningInput in, IntToDoubleFunction depthMillimetres) {
    int planes = in.grid().planes().size();
    List<List<RigidMotion>> motions = new java.util.ArrayList<>();
    for (int t = 0; t < in.times().size(); t++) {
      RigidMotion m = new RigidMotion(depthMillimetres.applyAsDouble(t), 0, 0, 0, 0, 0);
      motions.add(Collections.nCopies(planes, m));
    }
    FrameMotion motion = new FrameMotion(false, motions, new double[in.times().size()][planes]);
    return new ScreeningInput(
        in.film(),
        in.grid(),
        in.times(),
        in.mask(),
        motion,
        in.outside(),
        in.stimuli(),
        in.medianPower());
  }

  static FrameJudgement judge(ScreeningInput in, ScreeningSettings settings, int threads) {
    try (Workers workers = new Workers(threads)) {
      return Screening.judge(in, settings, workers, Progress.SILENT);
    }
  }

  static FrameJudgement judge(ScreeningInput in) {
    return judge(in, ScreeningSettings.DEFAULT, 2);
  }
}
