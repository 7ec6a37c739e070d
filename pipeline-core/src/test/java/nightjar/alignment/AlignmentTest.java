package nightjar.alignment;

import static nightjar.alignment.MovingTexture.axis;
import static nightjar.alignment.MovingTexture.plane;
import static nightjar.alignment.MovingTexture.shifted;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.concurrent.CancellationException;
import java.util.stream.IntStream;
import nightjar.alignment.AlignmentSettings.Model;
import nightjar.alignment.AlignmentSettings.Reference;
import nightjar.alignment.AlignmentSettings.Scope;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.RigidMotion;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

class AlignmentTest {
  /** mm a voxel in depth and lateral. */
  private static final double STEP = 0.1;

  /** 0.01 voxel: ten times the step at which the iteration ends. */
  private static final double CLOSE = 0.01 * STEP;

  /** 0.02 voxel at the edge of the field, 2.4 mm from its centre, as an angle. */
  private static final double CLOSE_DEGREES = Math.toDegrees(2 * CLOSE / 2.4);

  /** 0.03 voxel across planes, which are 0.2 mm apart and few. */
  private static final double CLOSE_PLANE = 0.03 * 0.2;

  /** The same at the edge of the volume, as an angle. */
  private static final double CLOSE_TILT = Math.toDegrees(CLOSE_PLANE / 2.4);

  private static final Scratch HEAP = new Scratch(Path.of("unused"), Long.MAX_VALUE);

  private static final List<RigidMotion> SHIFTS =
      List.of(
          RigidMotion.NONE,
          shifted(0.03, 0),
          shifted(0, 0.05),
          shifted(-0.07, 0.11),
          shifted(0.2, -0.15),
          shifted(-0.01, -0.02));

  private static void assertMotion(RigidMotion want, RigidMotion got, String where) {
    assertEquals(want.shiftDepthMillimetres(), got.shiftDepthMillimetres(), CLOSE, where);
    assertEquals(want.shiftLateralMillimetres(), got.shiftLateralMillimetres(), CLOSE, where);
    assertEquals(want.shiftPlaneMillimetres(), got.shiftPlaneMillimetres(), CLOSE_PLANE, where);
    assertEquals(want.rotationDegrees(), got.rotationDegrees(), CLOSE_DEGREES, where);
    assertEquals(want.tiltDepthDegrees(), got.tiltDepthDegrees(), CLOSE_TILT, where);
    assertEquals(want.tiltLateralDegrees(), got.tiltLateralDegrees(), CLOSE_TILT, where);
  }

  @ParameterizedTest
  @EnumSource(
      value = Model.class,
      names = {"TRANSLATION", "RIGID"})
  void findsShiftsPositiveTowardsDepthAndLateral(Model model) {
    try (AlignedFilm film = new MovingTexture(plane(60, 52), SHIFTS, 1).align(model, Scope.PLANE)) {
      for (int t = 0; t < SHIFTS.size(); t++) {
        RigidMotion m = SHIFTS.get(t);
        assertMotion(m, film.motion().at(t, 0), "frame " + t);
        double length = Math.hypot(m.shiftDepthMillimetres(), m.shiftLateralMillimetres());
        assertEquals(length, film.motion().displacementMillimetres(t, 0), 2 * CLOSE);
      }
    }
  }

  @Test
  void findsRotationsPositiveFromDepthTowardsLateral() {
    List<RigidMotion> turns =
        List.of(
            RigidMotion.NONE,
            new RigidMotion(0, 0, 0, 1, 0, 0),
            new RigidMotion(0, 0, 0, -2, 0, 0),
            new RigidMotion(0.05, -0.12, 0, 0.7, 0, 0));
    Grid uneven = new Grid(Axis.of(0), axis(60, 0.1), axis(70, 0.08), false);
    try (AlignedFilm film = new MovingTexture(uneven, turns, 2).align(Model.RIGID, Scope.PLANE)) {
      for (int t = 0; t < turns.size(); t++) {
        assertMotion(turns.get(t), film.motion().at(t, 0), "frame " + t);
      }
    }
  }

  @Test
  void fallingCoordinatesTurnTheSign() {
    double[] falling = IntStream.range(0, 52).mapToDouble(i -> 3 - STEP * i).toArray();
    Grid mirrored = new Grid(Axis.of(0), axis(60, STEP), Axis.of(falling), false);
    List<RigidMotion> motions =
        List.of(RigidMotion.NONE, shifted(0.04, 0.12), new RigidMotion(0, 0, 0, 1, 0, 0));
    try (AlignedFilm film =
        new MovingTexture(mirrored, motions, 3).align(Model.RIGID, Scope.PLANE)) {
      for (int t = 0; t < motions.size(); t++) {
        assertMotion(motions.get(t), film.motion().at(t, 0), "frame " + t);
      }
    }
  }

  @Test
  void putsTheContentBack() {
    MovingTexture source = new MovingTexture(plane(60, 52), SHIFTS, 4);
    try (AlignedFilm film = source.align(Model.RIGID, Scope.PLANE)) {
      float[] row = new float[60 * 52];
      for (int t = 0; t < SHIFTS.size(); t++) {
        film.rows().read(t, 0, row.length, row, 0);
        for (int v = 0; v < row.length; v++) {
          int z = source.grid().depthOf(v);
          int x = source.grid().lateralOf(v);
          if (z >= 6 && z < 54 && x >= 6 && x < 46) {
            // 0.01 voxel on slopes of up to 0.5 a voxel, and the spline's own error.
            assertEquals(source.atRest(v), row[v], 0.01, "frame " + t + " voxel " + v);
          }
        }
      }
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {-9, 6.4, 11.7})
  void findsJerksOfManyVoxels(double voxels) {
    List<RigidMotion> motions =
        List.of(
            RigidMotion.NONE,
            RigidMotion.NONE,
            shifted(voxels * STEP, -0.6 * voxels * STEP),
            RigidMotion.NONE);
    try (AlignedFilm film =
        new MovingTexture(plane(60, 52), motions, 5).align(Model.RIGID, Scope.PLANE)) {
      assertMotion(motions.get(2), film.motion().at(2, 0), "jerk");
    }
  }

  @Test
  void aGainAndAFlashAreNoMotion() {
    MovingTexture source =
        new MovingTexture(plane(60, 52), SHIFTS, 6)
            .with((t, v, power) -> t == 3 ? 2.5 * power : t == 4 ? 2 * power + 2 : power);
    try (AlignedFilm film = source.align(Model.RIGID, Scope.PLANE)) {
      assertMotion(SHIFTS.get(3), film.motion().at(3, 0), "gain");
      // The added level takes most of the contrast of the logarithm and bends the rest, which
      // gain and offset follow in part.
      RigidMotion flash = film.motion().at(4, 0);
      assertEquals(0.2, flash.shiftDepthMillimetres(), 3 * CLOSE);
      assertEquals(-0.15, flash.shiftLateralMillimetres(), 3 * CLOSE);
    }
  }

  @Test
  void aLocalChangeOfBloodVolumeIsNoMotion() {
    MovingTexture source = new MovingTexture(plane(60, 52), SHIFTS, 7);
    source.with(
        (t, v, power) -> {
          double z = source.grid().depthOf(v) - 20;
          double x = source.grid().lateralOf(v) - 30;
          return t == 2 ? power * (1 + 0.2 * Math.exp(-(z * z + x * x) / 72)) : power;
        });
    try (AlignedFilm film = source.align(Model.RIGID, Scope.PLANE)) {
      assertMotion(SHIFTS.get(2), film.motion().at(2, 0), "active frame");
    }
  }

  @Test
  void isWithinAFiftiethOfAVoxelOnNoisySpeckle() {
    Random random = new Random(11);
    List<RigidMotion> motions = new ArrayList<>();
    for (int t = 0; t < 60; t++) {
      motions.add(shifted(0.07 * random.nextGaussian(), 0.07 * random.nextGaussian()));
    }
    int voxels = 80 * 72;
    double[] noise = random.doubles(60L * voxels).map(u -> u * 0.35).toArray();
    // Uniform noise with a standard deviation of 10 % of the power.
    MovingTexture source =
        new MovingTexture(plane(80, 72), motions, 8)
            .with((t, v, power) -> power * (0.825 + noise[t * voxels + v]));
    AlignmentSettings settings = new AlignmentSettings(Model.RIGID, Scope.PLANE, Reference.TYPICAL);
    try (AlignedFilm film = source.align(settings, HEAP, 2)) {
      double squares = 0;
      double meanDepth = 0;
      double meanLateral = 0;
      for (int t = 0; t < 60; t++) {
        meanDepth += errorDepth(film, motions, t) / 60;
        meanLateral += errorLateral(film, motions, t) / 60;
      }
      for (int t = 0; t < 60; t++) {
        squares += Math.pow(errorDepth(film, motions, t) - meanDepth, 2) / 120;
        squares += Math.pow(errorLateral(film, motions, t) - meanLateral, 2) / 120;
      }
      assertTrue(Math.sqrt(squares) < 0.02 * STEP, "rms " + Math.sqrt(squares) / STEP + " voxel");
    }
  }

  private static double errorDepth(AlignedFilm film, List<RigidMotion> motions, int t) {
    return film.motion().at(t, 0).shiftDepthMillimetres() - motions.get(t).shiftDepthMillimetres();
  }

  private static double errorLateral(AlignedFilm film, List<RigidMotion> motions, int t) {
    return film.motion().at(t, 0).shiftLateralMillimetres()
        - motions.get(t).shiftLateralMillimetres();
  }

  @Test
  void missingColumnsAreNeitherMotionNorFilledIn() {
    MovingTexture source =
        new MovingTexture(plane(60, 52), SHIFTS, 9)
            .with((t, v, power) -> v % 52 == 20 || v % 52 == 21 ? Double.NaN : power);
    try (AlignedFilm film = source.align(Model.RIGID, Scope.PLANE)) {
      float[] row = new float[60 * 52];
      for (int t = 0; t < SHIFTS.size(); t++) {
        assertMotion(SHIFTS.get(t), film.motion().at(t, 0), "frame " + t);
      }
      // Frame 3 lies 1.1 voxel to the right: its columns 20 and 21 hold the content of 18.9, 19.9.
      film.rows().read(3, 0, row.length, row, 0);
      for (int x = 15; x < 25; x++) {
        boolean missing = x >= 18 && x <= 20;
        assertEquals(missing, Float.isNaN(row[30 * 52 + x]), "lateral " + x);
      }
    }
  }

  @Test
  void scatteredMissingVoxelsLeaveEnoughToHoldOnTo() {
    Random random = new Random(22);
    boolean[] missing = new boolean[60 * 52];
    for (int v = 0; v < missing.length; v++) {
      missing[v] = random.nextDouble() < 0.04;
    }
    MovingTexture source =
        new MovingTexture(plane(60, 52), SHIFTS, 23)
            .with((t, v, power) -> missing[v] ? Double.NaN : power);
    try (AlignedFilm film = source.align(Model.RIGID, Scope.PLANE)) {
      for (int t = 0; t < SHIFTS.size(); t++) {
        // What is filled in is not what was there: twice the usual margin.
        RigidMotion found = film.motion().at(t, 0);
        RigidMotion want = SHIFTS.get(t);
        assertEquals(want.shiftDepthMillimetres(), found.shiftDepthMillimetres(), 3 * CLOSE);
        assertEquals(want.shiftLateralMillimetres(), found.shiftLateralMillimetres(), 2 * CLOSE);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3})
  void aFieldTooSmallToCompareStaysAsItIs(int size) {
    MovingTexture source = new MovingTexture(plane(size, size), SHIFTS, 24);
    try (AlignedFilm film = source.align(Model.RIGID, Scope.PLANE)) {
      float[] want = new float[size * size];
      float[] got = new float[size * size];
      source.read(3, 1, want, 0);
      film.rows().read(3, 0, got.length, got, 0);
      assertEquals(RigidMotion.NONE, film.motion().at(3, 0));
      assertArrayEquals(want, got, 1e-6f, "rounding of the spline");
    }
  }

  @Test
  void aFrameWithoutValuesHasNoMotionAndStaysMissing() {
    MovingTexture source =
        new MovingTexture(plane(60, 52), SHIFTS, 10)
            .with((t, v, power) -> t == 2 ? Double.NaN : t == 4 ? 1 : power);
    try (AlignedFilm film = source.align(Model.RIGID, Scope.PLANE)) {
      assertEquals(RigidMotion.NONE, film.motion().at(2, 0));
      assertEquals(0, film.motion().displacementMillimetres(2, 0));
      float[] row = new float[60 * 52];
      film.rows().read(2, 0, row.length, row, 0);
      for (float v : row) {
        assertTrue(Float.isNaN(v));
      }
      assertMotion(SHIFTS.get(3), film.motion().at(3, 0), "its neighbour");
      assertTrue(Double.isFinite(film.motion().displacementMillimetres(4, 0)), "a flat frame");
    }
  }

  @Test
  void planesMoveByThemselvesUnlessTheVolumeIsOne() {
    Grid grid = new Grid(axis(6, 0.2), axis(48, 0.1), axis(44, 0.1), true);
    List<RigidMotion> motions =
        List.of(
            RigidMotion.NONE,
            new RigidMotion(0.05, -0.08, 0.06, 0, 0, 0),
            new RigidMotion(0, 0, 0, 1, 0, 0),
            new RigidMotion(0, 0, 0, 0, 1, 0),
            new RigidMotion(0, 0, 0, 0, 0, -1.2));
    MovingTexture source = new MovingTexture(grid, motions, 12);
    try (AlignedFilm film = source.align(Model.RIGID, Scope.VOLUME)) {
      assertTrue(film.motion().wholeVolume());
      assertEquals(1, film.motion().units());
      for (int t = 0; t < motions.size(); t++) {
        assertMotion(motions.get(t), film.motion().at(t, 0), "frame " + t);
      }
    }
    try (AlignedFilm film = source.align(Model.TRANSLATION, Scope.PLANE)) {
      assertEquals(6, film.motion().units());
      // A depth tilt of 1 degree moves the outermost planes, 0.5 mm from the centre, in depth
      // (and their content a little out of the plane: hence three times the usual margin).
      double tilted = 0.5 * Math.sin(Math.toRadians(1));
      assertEquals(-tilted, film.motion().at(3, 0).shiftDepthMillimetres(), 3 * CLOSE);
      assertEquals(tilted, film.motion().at(3, 5).shiftDepthMillimetres(), 3 * CLOSE);
    }
  }

  @Test
  void isTheSameForAnyNumberOfThreadsAndPlaceOfTheRows(@TempDir Path folder) {
    Grid grid = new Grid(axis(2, 0.4), axis(50, 0.1), axis(50, 0.1), true);
    Random random = new Random(13);
    List<RigidMotion> motions = new ArrayList<>();
    for (int t = 0; t < 40; t++) {
      motions.add(shifted(0.05 * random.nextGaussian(), 0.05 * random.nextGaussian()));
    }
    MovingTexture source = new MovingTexture(grid, motions, 14);
    float[] one = bytes(source, HEAP, 1);
    assertArrayEquals(one, bytes(source, HEAP, 2));
    assertArrayEquals(one, bytes(source, HEAP, 4));
    assertArrayEquals(one, bytes(source, new Scratch(folder, 0), 2));
  }

  /** The aligned rows, then all shifts. */
  private static float[] bytes(MovingTexture source, Scratch scratch, int threads) {
    try (AlignedFilm film = source.align(AlignmentSettings.DEFAULT, scratch, threads)) {
      int width = source.grid().voxels();
      float[] all = new float[40 * width + 80];
      for (int t = 0; t < 40; t++) {
        film.rows().read(t, 0, width, all, t * width);
        for (int u = 0; u < 2; u++) {
          all[40 * width + 2 * t + u] = (float) film.motion().at(t, u).shiftDepthMillimetres();
        }
      }
      return all;
    }
  }

  @Test
  void withoutAModelTheFilmIsTheFramesAsRead() {
    MovingTexture source =
        new MovingTexture(plane(30, 20), SHIFTS, 15)
            .with((t, v, power) -> v == 7 ? Double.NaN : power);
    try (AlignedFilm film = source.align(Model.NONE, Scope.PLANE)) {
      float[] want = new float[600];
      float[] got = new float[600];
      for (int t = 0; t < SHIFTS.size(); t++) {
        source.read(t, 1, want, 0);
        film.rows().read(t, 0, 600, got, 0);
        assertArrayEquals(want, got);
        assertEquals(RigidMotion.NONE, film.motion().at(t, 0));
        assertFalse(film.isOutsideField(t, 0));
      }
    }
  }

  @Test
  void aNamedFrameSaysWhereRestIs() {
    AlignmentSettings settings = new AlignmentSettings(Model.RIGID, Scope.PLANE, new Reference(4));
    MovingTexture source = new MovingTexture(plane(60, 52), SHIFTS, 16);
    try (AlignedFilm film = source.align(settings, HEAP, 2)) {
      assertMotion(RigidMotion.NONE, film.motion().at(4, 0), "itself");
      assertMotion(shifted(-0.2, 0.15), film.motion().at(0, 0), "another");
    }
    AlignmentSettings beyond = new AlignmentSettings(Model.RIGID, Scope.PLANE, new Reference(6));
    RefusedInput refused =
        assertThrows(RefusedInput.class, () -> source.align(beyond, HEAP, 2).close());
    assertTrue(refused.getMessage().contains("frame from 0 to 5"), refused.getMessage());
  }

  @Test
  void stopsWhenProgressSaysSo() {
    MovingTexture source = new MovingTexture(plane(30, 20), SHIFTS, 17);
    ReferenceFrames reference = new ReferenceFrames(List.of(0, 1), Mask.all(600), 0.3);
    try (Workers workers = new Workers(2)) {
      assertThrows(
          CancellationException.class,
          () ->
              Alignment.align(
                      source,
                      AlignmentSettings.DEFAULT,
                      reference,
                      HEAP,
                      workers,
                      share -> {
                        throw new CancellationException();
                      })
                  .close());
    }
  }

  @Test
  void withoutPositivePowerIsRefused() {
    MovingTexture source = new MovingTexture(plane(30, 20), SHIFTS, 18);
    ReferenceFrames reference = new ReferenceFrames(List.of(0, 1), Mask.all(600), -3);
    try (Workers workers = new Workers(1)) {
      assertThrows(
          RefusedInput.class,
          () ->
              Alignment.align(
                      source, AlignmentSettings.DEFAULT, reference, HEAP, workers, share -> {})
                  .close());
    }
  }
}
