package nightjar.storage;

import java.util.List;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.refusal.RefusedInput;

/** The coordinates {@code plane}, {@code depth} and {@code lateral} of a recording's grid. */
final class SpatialAxes {
  /** Steps may differ from their mean by this share. */
  private static final double STEP_TOLERANCE = 0.01;

  private SpatialAxes() {}

  /** Reads the grid whose dimensions, slowest first, are [plane,] depth, lateral. */
  static Grid read(Container container, List<StoredDimension> dimensions) {
    int n = dimensions.size();
    Axis planes = n == 3 ? axis(container, dimensions.get(0)) : Axis.of(0);
    return new Grid(
        planes,
        axis(container, dimensions.get(n - 2)),
        axis(container, dimensions.get(n - 1)),
        n == 3);
  }

  private static Axis axis(Container container, StoredDimension dimension) {
    String name = dimension.name();
    StoredVariable v =
        container
            .variable(name)
            .orElseThrow(
                () ->
                    container
                        .refusal("the coordinates of the dimension " + name + " are missing")
                        .at("variable " + name)
                        .remedy("add a variable of that name with units " + Units.LENGTHS));
    double[] mm = AxisValues.millimetres(container, v, dimension);
    checkSpacing(container, v, mm);
    return Axis.of(mm);
  }

  private static void checkSpacing(Container container, StoredVariable v, double[] mm) {
    double mean = (mm[mm.length - 1] - mm[0]) / Math.max(1, mm.length - 1);
    for (int i = 1; i < mm.length; i++) {
      double step = mm[i] - mm[i - 1];
      if (!(Math.abs(step - mean) <= STEP_TOLERANCE * Math.abs(mean)) || mean == 0) {
        RefusedInput refusal =
            container.refusal(
                v, "the positions " + (i - 1) + " and " + i + " are not equally spaced");
        throw refusal
            .found(AxisValues.shown(step) + " mm")
            .expected(AxisValues.shown(mean) + " mm within 1 %")
            .remedy("resample the recording to equal steps");
      }
    }
  }
}
