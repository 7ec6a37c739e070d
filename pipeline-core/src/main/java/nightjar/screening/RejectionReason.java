package nightjar.screening;

import java.util.EnumSet;
import java.util.Locale;
import java.util.stream.Collectors;

/** Why a frame is rejected. The code is the name in small letters. */
public enum RejectionReason {
  /** Its power stands out from the frames around it. */
  POWER,
  /** Its image differs from the frames around it. */
  CHANGE,
  /** It lies too far from the median position. */
  DISPLACEMENT,
  /** More than half of the mask is outside the field. */
  OUTSIDE,
  /** More than half of the mask has no value. */
  MISSING;

  /** The word in results: {@code power, change, displacement, outside, missing}. */
  public String code() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** The codes of several reasons in fixed order, joined by {@code +}. */
  static String codes(EnumSet<RejectionReason> reasons) {
    return reasons.stream().map(RejectionReason::code).collect(Collectors.joining("+"));
  }
}
