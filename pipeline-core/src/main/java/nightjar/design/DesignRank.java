package nightjar.design;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import nightjar.numeric.OrthonormalBasis;
import nightjar.recording.KeptFrames;
import nightjar.refusal.RefusedInput;

/**
 * Which columns are independent (numerics section 7), decided in the order level, stimuli, drift,
 * steps, nuisance: a dependent nuisance, step or drift column is dropped, a dependent stimulus
 * column is refused.
 */
final class DesignRank {
  private DesignRank() {}

  private static int rankOf(DesignColumn c) {
    return switch (c.kind()) {
      case LEVEL -> 0;
      case STIMULUS -> 1;
      case SLOPE -> 2;
      case DRIFT -> 3;
      case STEP -> 4;
      case NUISANCE -> 5;
    };
  }

  /** Positions of the columns in the order in which they are taken. */
  static int[] order(List<DesignColumn> columns) {
    return IntStream.range(0, columns.size())
        .boxed()
        .sorted(Comparator.comparingInt(j -> rankOf(columns.get(j))))
        .mapToInt(Integer::intValue)
        .toArray();
  }

  /** The column's values at the kept frames. */
  static double[] rows(DesignColumn column, KeptFrames kept) {
    double[] v = new double[kept.count()];
    for (int r = 0; r < v.length; r++) {
      v[r] = column.at(kept.frame(r));
    }
    return v;
  }

  /**
   * Names of the columns to drop.
   *
   * @throws RefusedInput where a stimulus column depends on earlier ones
   */
  static List<String> dependent(List<DesignColumn> columns, KeptFrames kept) {
    OrthonormalBasis basis = new OrthonormalBasis();
    List<DesignColumn> taken = new ArrayList<>();
    List<String> dropped = new ArrayList<>();
    for (int j : order(columns)) {
      DesignColumn c = columns.get(j);
      if (basis.add(rows(c, kept))) {
        taken.add(c);
      } else if (c.isOfStimulus()) {
        throw refusal(c, taken, kept);
      } else {
        dropped.add(c.name());
      }
    }
    return dropped;
  }

  private static RefusedInput refusal(
      DesignColumn column, List<DesignColumn> taken, KeptFrames kept) {
    double[] x = rows(column, kept);
    if (IntStream.range(0, x.length).allMatch(i -> x[i] == 0)) {
      return RefusedInput.because("no kept frame shows a response to this stimulus")
          .at("column " + column.name())
          .remedy("check the onsets against the recording, or let the plan ignore the stimulus");
    }
    OrthonormalBasis others = new OrthonormalBasis();
    String partner = "";
    for (DesignColumn c : taken) {
      others.add(rows(c, kept));
      if (others.independentShare(x) <= OrthonormalBasis.DEPENDENT) {
        partner = c.name();
        break;
      }
    }
    return RefusedInput.because(
            "the stimulus columns " + partner + " and " + column.name() + " cannot be told apart")
        .remedy("give them different trials, or let the plan ignore one of them");
  }
}
