package nightjar.analysis;

import java.util.ArrayList;
import java.util.List;
import nightjar.mask.LeftOut;
import nightjar.results.Warning;

/** Tells how many voxels left the mask, and why. */
final class MaskWarnings {
  private MaskWarnings() {}

  static List<Warning> of(LeftOut left) {
    List<Warning> warnings = new ArrayList<>();
    add(warnings, left.leftField(), "their content left the field in over 5 % of the kept frames");
    add(warnings, left.missingValue(), "the recording lacks a value in a kept frame");
    add(warnings, left.nonPositiveBaseline(), "their mean power is not positive");
    add(warnings, left.noVariance(), "their value never changes");
    return warnings;
  }

  private static void add(List<Warning> warnings, int voxels, String because) {
    if (voxels > 0) {
      warnings.add(
          new Warning(
              "mask",
              voxels
                  + (voxels == 1 ? " voxel was" : " voxels were")
                  + " left out of the mask because "
                  + because
                  + "."));
    }
  }
}
