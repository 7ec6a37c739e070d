package nightjar.storage;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Region;
import nightjar.recording.RegionLabels;
import nightjar.refusal.RefusedInput;

/** The variables {@code roi} and {@code brain_mask}: one whole number a voxel. */
final class LabelVariable {
  static final String REGIONS = "roi";
  static final String BRAIN = "brain_mask";
  private static final int MOST_REGIONS = 2000;

  private final Container container;
  private final StoredVariable variable;

  private LabelVariable(Container container, StoredVariable variable) {
    this.container = container;
    this.variable = variable;
  }

  /** The regions of a variable by CF's {@code flag_values} and {@code flag_meanings}. */
  static RegionLabels regions(Container container, StoredVariable v, Grid grid) {
    LabelVariable labels = new LabelVariable(container, v);
    labels.checkGrid(grid);
    double[] values = labels.flagValues();
    String[] names = labels.flagMeanings(values.length);
    int[] regionOfVoxel = labels.numbered(labels.read(), values, grid);
    List<Region> regions = new ArrayList<>();
    for (int r = 0; r < names.length; r++) {
      int number = r;
      if (values[r] != 0) {
        regions.add(
            new Region(names[r], Mask.of(regionOfVoxel.length, i -> regionOfVoxel[i] == number)));
      }
    }
    return new RegionLabels(regions);
  }

  /** The voxels where a mask variable is 1. */
  static Mask mask(Container container, StoredVariable v, Grid grid) {
    LabelVariable labels = new LabelVariable(container, v);
    labels.checkGrid(grid);
    double[] values = labels.read();
    for (int i = 0; i < values.length; i++) {
      if (values[i] != 0 && values[i] != 1) {
        throw labels
            .refusal("the voxel at " + place(grid, i) + " is neither inside nor outside")
            .found(values[i])
            .expected("1 inside, 0 outside")
            .remedy("write 1 and 0");
      }
    }
    Mask mask = Mask.of(values.length, i -> values[i] == 1);
    if (mask.count() == 0) {
      throw labels.refusal("no voxel is inside").remedy("write 1 for the voxels of the brain");
    }
    return mask;
  }

  private RefusedInput refusal(String what) {
    return container.refusal(variable, what);
  }

  private void checkGrid(Grid grid) {
    List<StoredDimension> wanted = new ArrayList<>();
    if (grid.hasPlaneAxis()) {
      wanted.add(new StoredDimension("plane", grid.planes().size()));
    }
    wanted.add(new StoredDimension("depth", grid.depths().size()));
    wanted.add(new StoredDimension("lateral", grid.laterals().size()));
    if (!variable.dimensions().equals(wanted)) {
      StoredVariable onGrid = new StoredVariable("", variable.type(), wanted, Map.of());
      throw refusal("the labels are on another grid than the recording")
          .found(variable.shape())
          .expected(onGrid.shape())
          .remedy("draw them on the grid of the recording");
    }
    if (!variable.type().isWhole()) {
      throw refusal("the labels are not whole numbers")
          .found("type " + variable.type().label())
          .expected("byte, short or int")
          .remedy("write them as whole numbers, 0 for none");
    }
  }

  /** All values; 0 where one is missing. */
  private double[] read() {
    double[] values = new double[(int) variable.values()];
    Packing packing = Packing.of(container, variable);
    int[] filled = {0};
    container.read(
        variable,
        0,
        variable.rows(),
        (primitives, first, count) -> {
          packing.toDoubles(primitives, first, count, values, filled[0]);
          filled[0] += count;
        });
    return Arrays.stream(values).map(x -> Double.isNaN(x) ? 0 : x).toArray();
  }

  private double[] flagValues() {
    Attribute a = variable.attribute("flag_values");
    if (a == null || a.numbers().length == 0) {
      throw refusal("the regions have no names")
          .expected("the attributes flag_values (numbers) and flag_meanings (names)")
          .remedy("add both");
    }
    double[] values = a.numbers();
    if (values.length > MOST_REGIONS) {
      throw refusal("there are too many regions")
          .found(values.length)
          .expected("at most " + MOST_REGIONS)
          .remedy("leave some out");
    }
    Set<Double> seen = new HashSet<>();
    for (double value : values) {
      if (!seen.add(value)) {
        throw refusal("flag_values gives a label twice")
            .found(Attribute.numbers(a.type(), new double[] {value}).display())
            .remedy("give each region a label of its own");
      }
    }
    return values;
  }

  private String[] flagMeanings(int count) {
    Attribute a = variable.attribute("flag_meanings");
    String[] names = a == null || a.display().isEmpty() ? new String[0] : a.display().split("\\s+");
    if (names.length != count) {
      throw refusal("flag_meanings and flag_values do not have the same length")
          .found(names.length + " names for " + count + " labels")
          .remedy("give each label one name without blanks");
    }
    Set<String> seen = new HashSet<>();
    for (String name : names) {
      if (!seen.add(name)) {
        throw refusal("two regions have the same name").found(name).remedy("rename one of them");
      }
    }
    return names;
  }

  /** The position in {@code flags} of each voxel's label; -1 for none. */
  private int[] numbered(double[] labels, double[] flags, Grid grid) {
    Map<Double, Integer> numbers = new HashMap<>();
    for (int r = 0; r < flags.length; r++) {
      numbers.put(flags[r], r);
    }
    int[] region = new int[labels.length];
    for (int i = 0; i < labels.length; i++) {
      Integer number = labels[i] == 0 ? Integer.valueOf(-1) : numbers.get(labels[i]);
      if (number == null) {
        throw refusal("the label at " + place(grid, i) + " is not listed in flag_values")
            .found((long) labels[i])
            .remedy("add it to flag_values and flag_meanings");
      }
      region[i] = number;
    }
    return region;
  }

  private static String place(Grid grid, int voxel) {
    String inPlane = "depth " + grid.depthOf(voxel) + ", lateral " + grid.lateralOf(voxel);
    return grid.hasPlaneAxis() ? "plane " + grid.planeOf(voxel) + ", " + inPlane : inPlane;
  }
}
