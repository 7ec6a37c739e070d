package nightjar.storage;

import java.util.List;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/** Finds the variable that holds the frames and checks its shape and type. */
final class MainVariable {
  static final int FEWEST_FRAMES = 20;
  private static final String USUAL_NAME = "power_doppler";
  private static final String TIME = "time";
  private static final List<String> ONE_PLANE = List.of(TIME, "depth", "lateral");
  private static final List<String> PLANES = List.of(TIME, "plane", "depth", "lateral");
  private static final long MOST_FRAMES = 10_000_000;
  private static final long MOST_VOXELS = 32_000_000;

  private final Container container;
  private final RecordingRequest request;

  private MainVariable(Container container, RecordingRequest request) {
    this.container = container;
    this.request = request;
  }

  /**
   * The variable that the request names, else {@code power_doppler}, else the only one with three
   * or four dimensions of which the first is time.
   */
  static StoredVariable find(Container container, RecordingRequest request) {
    MainVariable m = new MainVariable(container, request);
    StoredVariable v = m.choose();
    m.checkShape(v);
    m.checkSize(v);
    return v;
  }

  private StoredVariable choose() {
    @Nullable String named = request.variable();
    if (named != null) {
      return container
          .variable(named)
          .orElseThrow(
              () ->
                  container
                      .refusal("the variable that the plan names is not in the file")
                      .at("variable " + named)
                      .found(namesOf(container.variables()))
                      .remedy("name one of these in the plan under recording: variable"));
    }
    return container.variable(USUAL_NAME).orElseGet(this::onlyCandidate);
  }

  private StoredVariable onlyCandidate() {
    List<StoredVariable> fit =
        container.variables().stream()
            .filter(v -> v.type().holdsFrames() && (v.rank() == 3 || v.rank() == 4))
            .filter(v -> v.dimensions().get(0).name().equals(TIME))
            .toList();
    if (fit.size() == 1) {
      return fit.get(0);
    }
    throw container
        .refusal(
            fit.isEmpty() ? "no variable holds frames" : "several variables could hold the frames")
        .found(namesOf(fit.isEmpty() ? container.variables() : fit))
        .expected(USUAL_NAME + ONE_PLANE + " or " + USUAL_NAME + PLANES)
        .remedy(
            fit.isEmpty()
                ? "store the frames under that name and order"
                : "name one of them in the plan under recording: variable");
  }

  private void checkShape(StoredVariable v) {
    if (!v.type().holdsFrames()) {
      throw container
          .refusal(v, "frames of this type are not read")
          .found("type " + v.type().label())
          .expected("short, int, float or double")
          .remedy("store the frames as one of these types");
    }
    if (v.rank() != 3 && v.rank() != 4) {
      throw container
          .refusal(v, "the number of dimensions is wrong")
          .found(v.rank() + " " + v.shape())
          .expected("3 " + ONE_PLANE + " or 4 " + PLANES)
          .remedy("store one image for each time");
    }
    List<String> wanted = v.rank() == 3 ? ONE_PLANE : PLANES;
    if (!v.dimensionNames().equals(wanted)) {
      throw container
          .refusal(v, "the dimensions are not in the order that is read")
          .found(v.dimensionNames())
          .expected(wanted.toString())
          .remedy("transpose the variable or rename its dimensions");
    }
  }

  private void checkSize(StoredVariable v) {
    if (v.rows() < FEWEST_FRAMES) {
      throw container
          .refusal(v, "there are too few frames")
          .found(v.rows())
          .expected("at least " + FEWEST_FRAMES)
          .remedy("record for longer");
    }
    if (v.values() == 0) {
      throw container
          .refusal(v, "the frames have no voxels")
          .found(v.shape())
          .remedy("export the recording again");
    }
    boolean tooMany = v.values() > request.largestVoxelFrames();
    if (tooMany || v.rows() > MOST_FRAMES || v.rowValues() > MOST_VOXELS) {
      long limit = Math.min(request.largestVoxelFrames(), MOST_FRAMES * MOST_VOXELS);
      throw container
          .refusal(v, "the recording is too large")
          .found(v.shape())
          .expected(
              "at most %d voxels x frames, %d frames and %d voxels a frame"
                  .formatted(limit, MOST_FRAMES, MOST_VOXELS))
          .remedy("split the recording or raise the limit");
    }
  }

  private static String namesOf(List<StoredVariable> variables) {
    String names =
        variables.stream()
            .limit(20)
            .map(v -> v.name() + v.dimensionNames())
            .collect(Collectors.joining(", "));
    return names.isEmpty() ? "no variable" : names;
  }
}
