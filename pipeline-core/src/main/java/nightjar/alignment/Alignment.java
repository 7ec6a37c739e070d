package nightjar.alignment;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.concurrent.atomic.AtomicInteger;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameSource;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.recording.RigidMotion;
import nightjar.refusal.RefusedInput;

/** Aligns every frame of a recording to one reference. */
public final class Alignment {
  /**
   * ln(power) is not followed below this share of the recording's median power. Dim voxels beside
   * the brain would steer otherwise: their logarithms carry the most noise, and packing to 16 bits
   * alone moved frames by 0.005 voxel rms (measured; 0.0001 with this floor, and the error against
   * known motion fell as well).
   */
  private static final double FLOOR_SHARE = 0.1;

  /** Voxels around the provisional mask that are compared too: the edge of the brain holds well. */
  private static final int MARGIN_VOXELS = 3;

  private static final int FRAMES_A_BLOCK = 16;

  private Alignment() {}

  /**
   * Aligns every frame; the same for any number of threads.
   *
   * @param reference what the reference is made of; not used where nothing is aligned
   * @param progress told after every frame; may stop the work by an exception
   * @return the aligned film, to be closed by the caller; the frames as read where the model is
   *     {@code none}
   * @throws RefusedInput where the reference frame does not exist or has no values, or the median
   *     power is not positive
   */
  public static AlignedFilm align(
      FrameSource source,
      AlignmentSettings settings,
      ReferenceFrames reference,
      Scratch scratch,
      Workers workers,
      Progress progress) {
    FloatRows rows = scratch.allocate(source.times().size(), source.grid().voxels());
    Pass pass = new Pass(source, rows, workers, progress);
    try {
      if (settings.model() == AlignmentSettings.Model.NONE) {
        return new AlignedFilm(source.grid(), rows, pass.copy());
      }
      Grid grid = source.grid();
      double floor = FLOOR_SHARE * positive(reference.medianPower());
      Mask compared = grown(reference.provisionalMask(), grid);
      List<Template> templates =
          new ReferenceImage(source, settings, compared, floor)
              .build(reference.typicalFrames(), scratch, workers);
      FrameMotion motion = pass.align(templates, floor, reference.provisionalMask());
      return new AlignedFilm(grid, rows, motion);
    } catch (RuntimeException | Error e) {
      rows.close();
      throw e;
    }
  }

  private static double positive(double medianPower) {
    if (!(medianPower > 0)) {
      throw RefusedInput.because("frames cannot be aligned without positive power")
          .found("median power " + medianPower)
          .remedy("check the recording's values or set alignment to model: none");
    }
    return medianPower;
  }

  /** The mask and what lies within the margin around it in its plane. */
  private static Mask grown(Mask mask, Grid grid) {
    int nz = grid.depths().size();
    int nx = grid.laterals().size();
    boolean[] near = new boolean[grid.voxels()];
    for (int v = 0; v < near.length; v++) {
      if (mask.contains(v)) {
        int p = grid.planeOf(v);
        int lastDepth = Math.min(nz - 1, grid.depthOf(v) + MARGIN_VOXELS);
        int from = Math.max(0, grid.lateralOf(v) - MARGIN_VOXELS);
        int end = Math.min(nx, grid.lateralOf(v) + MARGIN_VOXELS + 1);
        for (int z = Math.max(0, grid.depthOf(v) - MARGIN_VOXELS); z <= lastDepth; z++) {
          Arrays.fill(near, grid.index(p, z, from), grid.index(p, z, 0) + end, true);
        }
      }
    }
    return Mask.of(near.length, v -> near[v]);
  }

  /** One pass over the recording that fills the film. */
  private record Pass(FrameSource source, FloatRows rows, Workers workers, Progress progress) {
    FrameMotion copy() {
      AtomicInteger done = new AtomicInteger();
      workers.forEachBlock(
          rows.rows(),
          FRAMES_A_BLOCK,
          (from, end) -> {
            float[] frame = new float[rows.width()];
            for (int t = from; t < end; t++) {
              source.read(t, 1, frame, 0);
              rows.write(t, 0, frame.length, frame, 0);
              progress.report((double) done.incrementAndGet() / rows.rows());
            }
          });
      return FrameMotion.none(rows.rows(), source.grid().planes().size());
    }

    FrameMotion align(List<Template> templates, double floor, Mask mask) {
      List<Displacement> displacements =
          templates.stream().map(t -> new Displacement(t.slab(), mask)).toList();
      List<List<RigidMotion>> motions =
          new ArrayList<>(Collections.nCopies(rows.rows(), List.of()));
      double[][] lengths = new double[rows.rows()][templates.size()];
      AtomicInteger done = new AtomicInteger();
      workers.forEachBlock(
          rows.rows(),
          FRAMES_A_BLOCK,
          (from, end) -> {
            FrameAligner aligner = new FrameAligner(templates, floor);
            float[] frame = new float[rows.width()];
            float[] aligned = new float[rows.width()];
            for (int t = from; t < end; t++) {
              source.read(t, 1, frame, 0);
              List<RigidMotion> found = aligner.align(frame, aligned);
              rows.write(t, 0, aligned.length, aligned, 0);
              motions.set(t, found);
              for (int u = 0; u < found.size(); u++) {
                lengths[t][u] = displacements.get(u).mean(Pose.of(found.get(u)));
              }
              progress.report((double) done.incrementAndGet() / rows.rows());
            }
          });
      boolean wholeVolume = templates.get(0).slab().planes() > 1;
      return new FrameMotion(wholeVolume, motions, lengths);
    }
  }
}
