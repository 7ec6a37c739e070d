package nightjar.verdict;

import java.util.List;

/**
 * Judgement of one session.
 *
 * @param word what it comes to
 * @param reasons the grave ones first; empty for a usable session
 */
public record Verdict(Word word, List<Reason> reasons) {
  /** What a judgement comes to. */
  public enum Word {
    /** No reason against the session. */
    USABLE,
    /** A human should look at it. */
    REVIEW,
    /** Not to be used. */
    UNUSABLE;

    /** As it is written: usable, review, unusable. */
    public String text() {
      return name().toLowerCase(java.util.Locale.ROOT);
    }
  }

  public Verdict {
    reasons = List.copyOf(reasons);
  }
}
