package nightjar.alignment;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.IntPredicate;

/**
 * The reference of one slab, prepared for {@link Registration}: the voxels that are compared, and a
 * matrix of a row a column of the linear model of an image near the reference: the change by each
 * parameter of motion (per mm or radian), the reference itself about its mean (gain), and ones
 * (offset). Immutable; shared by all threads.
 */
final class Template {
  /** A parameter of motion: its component of shift, or its angle. */
  enum Parameter {
    SHIFT_DEPTH,
    SHIFT_LATERAL,
    ROTATION,
    SHIFT_PLANE,
    TILT_DEPTH,
    TILT_LATERAL
  }

  private static final int FEWEST_VOXELS = 50;
  private static final int ENOUGH_VOXELS = 2000;

  private final Slab slab;
  private final List<Parameter> parameters;
  private final int[] voxels;
  private final double[][] columns;
  private final double[][] gradientSpectra;

  /**
   * @param reference smoothed logarithms of the slab, NaN where missing; not modified
   * @param compared slab voxels to compare; all where it leaves too few
   */
  Template(Slab slab, AlignmentSettings.Model model, float[] reference, IntPredicate compared) {
    this.slab = slab;
    parameters = parameters(model, slab.planes() > 1);
    Gradient gradient = new Gradient(slab, reference);
    int[] chosen = gradient.voxels(compared);
    voxels = thinned(chosen.length >= FEWEST_VOXELS ? chosen : gradient.voxels(v -> true));
    columns = new double[parameters.size() + 2][voxels.length];
    for (int k = 0; k < voxels.length; k++) {
      for (int j = 0; j < parameters.size(); j++) {
        columns[j][k] = gradient.by(parameters.get(j), voxels[k]);
      }
    }
    fillGainAndOffset(reference);
    gradientSpectra = new ShiftSearch(slab).gradients(reference);
  }

  /**
   * Every fourth or every second voxel where enough are left: neighbours of a smoothed image say
   * much the same (measured on simulated speckle: the error grows by less than 5 %).
   */
  private int[] thinned(int[] chosen) {
    if (chosen.length >= 4 * ENOUGH_VOXELS) {
      return Arrays.stream(chosen).filter(v -> depth(v) % 2 == 0 && lateral(v) % 2 == 0).toArray();
    }
    if (chosen.length >= 2 * ENOUGH_VOXELS) {
      return Arrays.stream(chosen).filter(v -> (depth(v) + lateral(v)) % 2 == 0).toArray();
    }
    return chosen;
  }

  private int depth(int v) {
    return v / slab.laterals() % slab.depths();
  }

  private int lateral(int v) {
    return v % slab.laterals();
  }

  private void fillGainAndOffset(float[] reference) {
    double mean = 0;
    for (int v : voxels) {
      mean += reference[v] / voxels.length;
    }
    for (int k = 0; k < voxels.length; k++) {
      columns[parameters.size()][k] = reference[voxels[k]] - mean;
      columns[parameters.size() + 1][k] = 1;
    }
  }

  private static List<Parameter> parameters(AlignmentSettings.Model model, boolean volume) {
    boolean turns = model == AlignmentSettings.Model.RIGID;
    List<Parameter> list = new ArrayList<>(List.of(Parameter.SHIFT_DEPTH, Parameter.SHIFT_LATERAL));
    if (turns) {
      list.add(Parameter.ROTATION);
    }
    if (volume) {
      list.add(Parameter.SHIFT_PLANE);
    }
    if (volume && turns) {
      list.add(Parameter.TILT_DEPTH);
      list.add(Parameter.TILT_LATERAL);
    }
    return List.copyOf(list);
  }

  Slab slab() {
    return slab;
  }

  /** The parameters of motion in the order of the columns. */
  List<Parameter> parameters() {
    return parameters;
  }

  /** Number of compared voxels. */
  int size() {
    return voxels.length;
  }

  /** The slab's number of compared voxel {@code k}. */
  int voxel(int k) {
    return voxels[k];
  }

  /** The columns; shared, not to be modified. */
  double[][] columns() {
    return columns;
  }

  /** What {@link ShiftSearch#find} compares with; shared, not to be modified. */
  double[][] gradientSpectra() {
    return gradientSpectra;
  }
}
