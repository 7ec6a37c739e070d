package nightjar.alignment;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.checks.CheckValues;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.Axis;
import nightjar.recording.FrameSource;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.recording.RigidMotion;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Analytic blobs at exact sub-pixel shifts; the tables name their source. */
class AlignmentReferenceTest {
  private static final int SIZE = 64;
  private static final List<CheckValues.Row> BLOBS =
      CheckValues.read("alignment/registration_blobs.csv");
  private static final List<CheckValues.Row> SHIFTS =
      CheckValues.read("alignment/registration_expected.csv");

  private static double pixel(CheckValues.Row shift, double y, double x) {
    double sum = 0;
    for (CheckValues.Row b : BLOBS) {
      double dy = (y - b.number("cy") - shift.number("dy")) / b.number("sy");
      double dx = (x - b.number("cx") - shift.number("dx")) / b.number("sx");
      sum += b.number("A") * Math.exp(-0.5 * (dy * dy + dx * dx));
    }
    return sum;
  }

  @ParameterizedTest
  @EnumSource(
      value = AlignmentSettings.Model.class,
      names = {"TRANSLATION", "RIGID"})
  void findsTheShiftsOfTheTable(AlignmentSettings.Model model) {
    for (CheckValues.Row s : SHIFTS) {
      // The recipe is understood as it was meant.
      assertEquals(s.number("pix_20_16"), pixel(s, 20, 16), 1e-12);
      assertEquals(s.number("pix_12_48"), pixel(s, 12, 48), 1e-12);
    }
    AlignmentSettings settings =
        new AlignmentSettings(
            model, AlignmentSettings.Scope.PLANE, AlignmentSettings.Reference.FIRST);
    Mask whole = Mask.all(SIZE * SIZE);
    List<Integer> all = IntStream.range(0, SHIFTS.size()).boxed().toList();
    ReferenceFrames reference = new ReferenceFrames(all, whole, 0.1);
    Scratch heap = new Scratch(java.nio.file.Path.of("unused"), Long.MAX_VALUE);
    try (Workers workers = new Workers(2);
        AlignedFilm film =
            Alignment.align(new Blobs(), settings, reference, heap, workers, Progress.SILENT)) {
      for (int t = 0; t < SHIFTS.size(); t++) {
        RigidMotion m = film.motion().at(t, 0);
        // The pass band that the table gives for images without noise.
        assertEquals(SHIFTS.get(t).number("dy"), m.shiftDepthMillimetres(), 0.02, "frame " + t);
        assertEquals(SHIFTS.get(t).number("dx"), m.shiftLateralMillimetres(), 0.02, "frame " + t);
        assertEquals(0, m.rotationDegrees(), 0.03, "frame " + t);
      }
    }
  }

  /** One frame a line of the table; a voxel is 1 mm. */
  private static final class Blobs implements FrameSource {
    @Override
    public Grid grid() {
      double[] mm = IntStream.range(0, SIZE).asDoubleStream().toArray();
      return new Grid(Axis.of(0), Axis.of(mm), Axis.of(mm), false);
    }

    @Override
    public FrameTimes times() {
      return FrameTimes.of(IntStream.range(0, SHIFTS.size()).asDoubleStream().toArray());
    }

    @Override
    public void read(int first, int count, float[] into, int offset) {
      for (int i = 0; i < count * SIZE * SIZE; i++) {
        CheckValues.Row shift = SHIFTS.get(first + i / (SIZE * SIZE));
        into[offset + i] = (float) pixel(shift, i / SIZE % SIZE, i % SIZE);
      }
    }
  }
}
