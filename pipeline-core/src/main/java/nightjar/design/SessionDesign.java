package nightjar.design;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import nightjar.numeric.OrthonormalBasis;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.NamedSeries;
import nightjar.refusal.RefusedInput;

/**
 * The model of a session: one design, or one a plane where planes have their own clocks.
 *
 * @param planes one design, or one a plane
 * @param warnings sentences for people
 */
public record SessionDesign(List<DesignMatrix> planes, List<String> warnings) {
  private static final double DRIFT_TAKES_ALL = 0.9;
  private static final double DRIFT_TAKES_MUCH = 0.5;

  public SessionDesign {
    planes = List.copyOf(planes);
    warnings = List.copyOf(warnings);
  }

  /** Whether planes have designs of their own. */
  public boolean isSwept() {
    return planes.size() > 1;
  }

  /** The design of plane {@code p}. */
  public DesignMatrix ofPlane(int p) {
    return planes.get(isSwept() ? p : 0);
  }

  /**
   * Builds the columns and drops dependent nuisance.
   *
   * @param kept rows of the fit
   * @param planeOffsetsSeconds one offset where all planes share the clock, else one a plane
   * @throws RefusedInput where drift takes the stimuli away, stimuli cannot be told apart, or too
   *     few frames are left
   */
  public static SessionDesign build(
      DesignRequest request, KeptFrames kept, double[] planeOffsetsSeconds) {
    List<String> warnings = new ArrayList<>();
    List<List<DesignColumn>> all = new ArrayList<>();
    Set<String> dropped = new HashSet<>();
    for (double offset : planeOffsetsSeconds) {
      List<DesignColumn> columns = columns(request, kept.times(), offset);
      requireRows(columns, kept);
      checkDrift(columns, request.drift(), kept, warnings);
      dropped.addAll(DesignRank.dependent(columns, kept));
      all.add(columns);
    }
    dropped.stream()
        .sorted()
        .forEach(
            n ->
                warnings.add(
                    "The nuisance column " + n + " depends on other columns and was left out."));
    return new SessionDesign(
        all.stream()
            .map(
                cs ->
                    new DesignMatrix(cs.stream().filter(c -> !dropped.contains(c.name())).toList()))
            .toList(),
        warnings.stream().distinct().toList());
  }

  private static List<DesignColumn> columns(
      DesignRequest request, FrameTimes times, double offset) {
    List<DesignColumn> columns = new ArrayList<>();
    for (ModelledStimulus s : request.stimuli()) {
      columns.add(
          new DesignColumn(
              s.name(),
              DesignColumn.Kind.STIMULUS,
              StimulusColumns.response(s, request.kernel(), times, offset)));
    }
    if (request.derivative()) {
      for (ModelledStimulus s : request.stimuli()) {
        columns.add(
            new DesignColumn(
                s.name() + ":slope",
                DesignColumn.Kind.SLOPE,
                StimulusColumns.slope(s, request.kernel(), times, offset)));
      }
    }
    columns.addAll(DriftColumns.of(times, request.drift(), offset));
    for (NamedSeries n : request.nuisance()) {
      columns.add(new DesignColumn(n.name(), DesignColumn.Kind.NUISANCE, n.toArray()));
    }
    if (request.segmentSteps()) {
      columns.addAll(steps(times));
    }
    double[] level = new double[times.size()];
    java.util.Arrays.fill(level, 1);
    columns.add(new DesignColumn("level", DesignColumn.Kind.LEVEL, level));
    return columns;
  }

  private static List<DesignColumn> steps(FrameTimes times) {
    List<DesignColumn> columns = new ArrayList<>();
    for (int s = 1; s < times.segments(); s++) {
      double[] v = new double[times.size()];
      for (int t = 0; t < v.length; t++) {
        v[t] = times.segment(t) == s ? 1 : 0;
      }
      columns.add(new DesignColumn("segment_" + (s + 1), DesignColumn.Kind.STEP, v));
    }
    return columns;
  }

  private static void requireRows(List<DesignColumn> columns, KeptFrames kept) {
    if (kept.count() <= columns.size() + 1) {
      throw RefusedInput.because("too few frames are kept for the model")
          .found(kept.count() + " frames for " + columns.size() + " columns")
          .expected("more frames than columns by at least two")
          .remedy("use a longer recording, a longer drift cutoff_s or fewer nuisance columns");
    }
  }

  /**
   * Share of each stimulus column's variance that drift explains: above 0.9 refused, above 0.5
   * warned.
   */
  private static void checkDrift(
      List<DesignColumn> columns, DriftSettings settings, KeptFrames kept, List<String> warnings) {
    OrthonormalBasis level = new OrthonormalBasis();
    OrthonormalBasis drift = new OrthonormalBasis();
    columns.stream()
        .filter(c -> c.kind() == DesignColumn.Kind.LEVEL)
        .forEach(
            c -> {
              level.add(DesignRank.rows(c, kept));
              drift.add(DesignRank.rows(c, kept));
            });
    columns.stream()
        .filter(c -> c.kind() == DesignColumn.Kind.DRIFT)
        .forEach(c -> drift.add(DesignRank.rows(c, kept)));
    for (DesignColumn c : columns) {
      double[] x = DesignRank.rows(c, kept);
      double total = level.independentShare(x);
      if (c.kind() != DesignColumn.Kind.STIMULUS || !(total > OrthonormalBasis.DEPENDENT)) {
        continue;
      }
      double left = drift.independentShare(x) / total;
      double share = 1 - left * left;
      if (share > DRIFT_TAKES_ALL) {
        throw RefusedInput.because("drift removal would take the stimulus " + c.name() + " away")
            .at("drift cutoff_s " + number(settings.cutoffSeconds()))
            .found(percent(share) + " of the column's variance")
            .expected("at most " + percent(DRIFT_TAKES_ALL))
            .remedy("give a longer cutoff_s");
      }
      if (share > DRIFT_TAKES_MUCH) {
        warnings.add(
            "Drift removal at cutoff_s "
                + number(settings.cutoffSeconds())
                + " takes "
                + percent(share)
                + " of the variance of the stimulus "
                + c.name()
                + "; a longer cutoff_s would keep more of it.");
      }
    }
  }

  private static String percent(double share) {
    return Math.round(100 * share) + " %";
  }

  private static String number(double value) {
    return value == Math.rint(value) ? Long.toString((long) value) : Double.toString(value);
  }
}
