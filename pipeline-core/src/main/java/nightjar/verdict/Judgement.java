package nightjar.verdict;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Turns facts and limits into a verdict (numerics section 14); pure. */
public final class Judgement {
  /**
   * Rejection in responses counts above this ratio to the rate elsewhere (common practice, no
   * source).
   */
  private static final double RESPONSE_REJECTION_RATIO = 3;

  /** Fewer rejected frames than this within responses say nothing about their rate. */
  private static final int FEWEST_REJECTED_IN_RESPONSES = 5;

  private final SessionFacts facts;
  private final VerdictLimits limits;
  private final List<Reason> unusable = new ArrayList<>();
  private final List<Reason> review = new ArrayList<>();

  private Judgement(SessionFacts facts, VerdictLimits limits) {
    this.facts = facts;
    this.limits = limits;
  }

  /** Judges a session by itself. */
  public static Verdict of(SessionFacts facts, VerdictLimits limits) {
    Judgement j = new Judgement(facts, limits);
    j.rejected();
    j.rejectedInResponses();
    j.displacement();
    j.tsnr();
    j.trials();
    j.inflation();
    j.coverage();
    Verdict.Word word =
        !j.unusable.isEmpty()
            ? Verdict.Word.UNUSABLE
            : !j.review.isEmpty() ? Verdict.Word.REVIEW : Verdict.Word.USABLE;
    List<Reason> all = new ArrayList<>(j.unusable);
    all.addAll(j.review);
    return new Verdict(word, all);
  }

  private void rejected() {
    double share = (double) facts.rejected() / facts.frames();
    boolean grave = share > limits.rejectedUnusable();
    double limit = grave ? limits.rejectedUnusable() : limits.rejectedReview();
    if (share > limit) {
      (grave ? unusable : review)
          .add(
              new Reason(
                  "rejected_frames",
                  String.format(
                      Locale.ROOT,
                      "%d of %d frames (%s) were rejected; the limit is %s.",
                      facts.rejected(),
                      facts.frames(),
                      percent(share),
                      percent(limit)),
                  share,
                  limit));
    }
  }

  private void rejectedInResponses() {
    int elsewhereFrames = facts.frames() - facts.responseFrames();
    int elsewhere = facts.rejected() - facts.rejectedInResponses();
    if (facts.rejectedInResponses() < FEWEST_REJECTED_IN_RESPONSES || elsewhereFrames == 0) {
      return;
    }
    double inside = (double) facts.rejectedInResponses() / facts.responseFrames();
    double outside = (double) elsewhere / elsewhereFrames;
    if (inside > RESPONSE_REJECTION_RATIO * outside) {
      review.add(
          new Reason(
              "rejected_in_responses",
              String.format(
                  Locale.ROOT,
                  "%s of the frames during responses were rejected against %s elsewhere; the limit is"
                      + " %.0f times the rate elsewhere.",
                  percent(inside),
                  percent(outside),
                  RESPONSE_REJECTION_RATIO),
              inside,
              RESPONSE_REJECTION_RATIO * outside));
    }
  }

  private void displacement() {
    double d = facts.medianDisplacementVoxels();
    if (d > limits.displacementVoxels()) {
      review.add(
          new Reason(
              "displacement",
              String.format(
                  Locale.ROOT,
                  "The median displacement is %.2f voxels; the limit is %s.",
                  d,
                  number(limits.displacementVoxels())),
              d,
              limits.displacementVoxels()));
    }
  }

  private void tsnr() {
    if (facts.tsnr() < limits.tsnr()) {
      review.add(
          new Reason(
              "tsnr",
              String.format(
                  Locale.ROOT,
                  "The median temporal signal-to-noise ratio is %.1f; at least %s is wanted.",
                  facts.tsnr(),
                  number(limits.tsnr())),
              facts.tsnr(),
              limits.tsnr()));
    }
  }

  private void trials() {
    for (TrialCount t : facts.trials()) {
      if (t.complete() < limits.trials()) {
        boolean none = t.complete() == 0;
        (none ? unusable : review)
            .add(
                new Reason(
                    "trials",
                    String.format(
                        Locale.ROOT,
                        "The stimulus %s has %s complete %s of %d; at least %d are wanted.",
                        t.stimulus(),
                        none ? "no" : Integer.toString(t.complete()),
                        t.complete() == 1 ? "trial" : "trials",
                        t.all(),
                        limits.trials()),
                    t.complete(),
                    limits.trials()));
      }
    }
  }

  private void inflation() {
    for (SessionFacts.Inflation i : facts.inflations()) {
      if (i.factor() > limits.varianceInflation()) {
        review.add(
            new Reason(
                "variance_inflation",
                String.format(
                    Locale.ROOT,
                    "The stimulus column %s overlaps with other columns: its variance inflation"
                        + " factor is %.1f, the limit is %s.",
                    i.column(),
                    i.factor(),
                    number(limits.varianceInflation())),
                i.factor(),
                limits.varianceInflation()));
      }
    }
  }

  private void coverage() {
    if (facts.coverage() < limits.coverage()) {
      review.add(
          new Reason(
              "coverage",
              String.format(
                  Locale.ROOT,
                  "Kept frames cover %s of the recording's span; at least %s is wanted.",
                  percent(facts.coverage()),
                  percent(limits.coverage())),
              facts.coverage(),
              limits.coverage()));
    }
  }

  private static String percent(double share) {
    return String.format(Locale.ROOT, "%.1f %%", 100 * share).replace(".0 %", " %");
  }

  private static String number(double x) {
    return x == Math.rint(x) ? Long.toString((long) x) : Double.toString(x);
  }
}
