package nightjar.storage;

import java.util.Locale;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The units that axes may have, in the spellings that CF files use. */
final class Units {
  static final String LENGTHS = "mm, um or m";
  static final String TIMES = "s, ms or \"seconds since\" and a date";

  private static final Set<String> SECONDS = Set.of("s", "sec", "secs", "second", "seconds");
  private static final Set<String> MILLISECONDS =
      Set.of("ms", "msec", "msecs", "millisecond", "milliseconds");
  private static final Set<String> MILLIMETRES =
      Set.of("mm", "millimetre", "millimetres", "millimeter", "millimeters");
  // The micro sign and the Greek letter are two characters.
  private static final Set<String> MICROMETRES =
      Set.of(
          "um",
          "\u00b5m",
          "\u03bcm",
          "micrometre",
          "micrometres",
          "micrometer",
          "micrometers",
          "micron",
          "microns");
  private static final Set<String> METRES = Set.of("m", "metre", "metres", "meter", "meters");
  private static final Pattern SINCE =
      Pattern.compile("(\\w+)\\s+since\\s+\\d{1,4}-\\d{1,2}-\\d{1,2}(\\D.*)?", Pattern.DOTALL);

  private Units() {}

  /** Millimetres a unit; empty where the unit is unknown. */
  static OptionalDouble millimetres(String unit) {
    String u = spelled(unit);
    if (MILLIMETRES.contains(u)) {
      return OptionalDouble.of(1);
    }
    if (MICROMETRES.contains(u)) {
      return OptionalDouble.of(1e-3);
    }
    return METRES.contains(u) ? OptionalDouble.of(1e3) : OptionalDouble.empty();
  }

  /** Seconds a unit, which may count since a date; empty where the unit is unknown. */
  static OptionalDouble seconds(String unit) {
    Matcher since = SINCE.matcher(unit.strip());
    String u = spelled(since.matches() ? since.group(1) : unit);
    if (SECONDS.contains(u)) {
      return OptionalDouble.of(1);
    }
    return MILLISECONDS.contains(u) ? OptionalDouble.of(1e-3) : OptionalDouble.empty();
  }

  /** Names may be written with capitals; symbols may not (Mm is no millimetre). */
  private static String spelled(String unit) {
    String u = unit.strip();
    return u.length() > 3 ? u.toLowerCase(Locale.ROOT) : u;
  }
}
