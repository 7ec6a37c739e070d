package nightjar.alignment;

import java.util.List;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.numeric.Median;
import nightjar.numeric.Workers;
import nightjar.recording.FrameSource;
import nightjar.recording.Mask;
import nightjar.refusal.RefusedInput;

/**
 * Makes the image that frames are compared with. It begins as the median of the typical frames, or
 * as the one frame that the plan names; then the typical frames are aligned to it, and their median
 * takes its place. So a named frame says where rest is, and the noise of a single frame stays out.
 */
final class ReferenceImage {
  /** More frames than this do not make a median noticeably better. */
  private static final int MOST_FRAMES = 101;

  private static final int FRAMES_A_BLOCK = 8;
  private static final int VOXELS_A_BLOCK = 1024;

  private final FrameSource source;
  private final AlignmentSettings settings;
  private final Mask compared;
  private final double floor;
  private final List<Slab> slabs;

  /**
   * @param compared grid voxels to compare
   * @param floor power below which logarithms are not followed, positive
   */
  ReferenceImage(FrameSource source, AlignmentSettings settings, Mask compared, double floor) {
    this.source = source;
    this.settings = settings;
    this.compared = compared;
    this.floor = floor;
    slabs = Slab.of(source.grid(), settings.scope());
  }

  /** The templates, one a slab. */
  List<Template> build(List<Integer> typicalFrames, Scratch scratch, Workers workers) {
    int[] chosen = spread(typicalFrames);
    int voxels = source.grid().voxels();
    try (FloatRows logarithms = scratch.allocate(chosen.length, voxels)) {
      List<Template> first = templates(firstImage(chosen, logarithms, workers));
      workers.forEachBlock(
          chosen.length,
          FRAMES_A_BLOCK,
          (from, end) -> {
            FrameAligner aligner = new FrameAligner(first, floor);
            float[] frame = new float[voxels];
            float[] aligned = new float[voxels];
            for (int i = from; i < end; i++) {
              source.read(chosen[i], 1, frame, 0);
              aligner.align(frame, aligned);
              takeLogarithms(aligned);
              logarithms.write(i, 0, voxels, aligned, 0);
            }
          });
      return templates(median(logarithms, workers));
    }
  }

  private float[] firstImage(int[] chosen, FloatRows logarithms, Workers workers) {
    int voxels = source.grid().voxels();
    if (!settings.reference().isTypical()) {
      return namedFrame(settings.reference().frame());
    }
    workers.forEachBlock(
        chosen.length,
        FRAMES_A_BLOCK,
        (from, end) -> {
          float[] frame = new float[voxels];
          for (int i = from; i < end; i++) {
            source.read(chosen[i], 1, frame, 0);
            takeLogarithms(frame);
            logarithms.write(i, 0, voxels, frame, 0);
          }
        });
    return median(logarithms, workers);
  }

  private float[] namedFrame(int number) {
    int frames = source.times().size();
    if (number >= frames) {
      throw RefusedInput.because("the reference frame does not exist")
          .at("alignment.reference")
          .found(number)
          .expected("a frame from 0 to " + (frames - 1))
          .remedy("name another frame or write typical");
    }
    float[] frame = new float[source.grid().voxels()];
    source.read(number, 1, frame, 0);
    takeLogarithms(frame);
    for (float v : frame) {
      if (!Float.isNaN(v)) {
        return frame;
      }
    }
    throw RefusedInput.because("the reference frame has no values")
        .at("alignment.reference")
        .found(number)
        .remedy("name another frame or write typical");
  }

  private List<Template> templates(float[] logarithms) {
    return slabs.stream()
        .map(
            s ->
                new Template(
                    s,
                    settings.model(),
                    new LogImage(s, floor).ofLogarithms(logarithms),
                    v -> compared.contains(s.firstVoxel() + v)))
        .toList();
  }

  private void takeLogarithms(float[] power) {
    for (int v = 0; v < power.length; v++) {
      if (!Float.isNaN(power[v])) {
        power[v] = (float) Math.log(Math.max(power[v], floor));
      }
    }
  }

  /** Median over rows of every column; NaN where half of the rows or more have no value. */
  private static float[] median(FloatRows rows, Workers workers) {
    float[] medians = new float[rows.width()];
    workers.forEachBlock(
        rows.width(),
        VOXELS_A_BLOCK,
        (from, end) -> {
          int width = end - from;
          float[] block = new float[rows.rows() * width];
          for (int i = 0; i < rows.rows(); i++) {
            rows.read(i, from, width, block, i * width);
          }
          double[] values = new double[rows.rows()];
          for (int v = 0; v < width; v++) {
            int found = 0;
            for (int i = 0; i < rows.rows(); i++) {
              float value = block[i * width + v];
              if (!Float.isNaN(value)) {
                values[found++] = value;
              }
            }
            medians[from + v] =
                2 * found > rows.rows() ? (float) Median.selecting(values, found) : Float.NaN;
          }
        });
    return medians;
  }

  /**
   * At most {@link #MOST_FRAMES} of the frames, evenly spread; of all frames where none is given.
   */
  private int[] spread(List<Integer> typicalFrames) {
    int given = typicalFrames.isEmpty() ? source.times().size() : typicalFrames.size();
    int[] chosen = new int[Math.min(MOST_FRAMES, given)];
    for (int i = 0; i < chosen.length; i++) {
      int k = (int) ((long) i * given / chosen.length);
      chosen[i] = typicalFrames.isEmpty() ? k : typicalFrames.get(k);
    }
    return chosen;
  }
}
