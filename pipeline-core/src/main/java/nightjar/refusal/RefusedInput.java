package nightjar.refusal;

import java.util.LinkedHashMap;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * The user's input is at fault and can be mended by the user. The message is one sentence that
 * names the file, the place, the value and the remedy; the same facts are accessors.
 *
 * <p>Instances are immutable; {@link #in}, {@link #at}, {@link #found}, {@link #expected} and
 * {@link #remedy} return a completed copy with the stack trace of the first.
 */
public final class RefusedInput extends RuntimeException {
  private final String what;
  private final @Nullable String file;
  private final @Nullable String place;
  private final @Nullable String found;
  private final @Nullable String expected;
  private final @Nullable String remedy;

  private RefusedInput(
      String what,
      @Nullable String file,
      @Nullable String place,
      @Nullable String found,
      @Nullable String expected,
      @Nullable String remedy) {
    super(what);
    this.what = what;
    this.file = file;
    this.place = place;
    this.found = found;
    this.expected = expected;
    this.remedy = remedy;
  }

  /**
   * Begins a refusal; {@code what} is a clause without a full stop, such as "the onset is not a
   * number".
   */
  public static RefusedInput because(String what) {
    return new RefusedInput(what, null, null, null, null, null);
  }

  /** The file as the user named it (its last name is enough). */
  public RefusedInput in(String fileName) {
    return copy(fileName, place, found, expected, remedy);
  }

  /** The place within the file: "line 4", "variable power_doppler", "line 3, column 7". */
  public RefusedInput at(String where) {
    return copy(file, where, found, expected, remedy);
  }

  /** The value that is wrong. */
  public RefusedInput found(Object value) {
    return copy(file, place, String.valueOf(value), expected, remedy);
  }

  /** What would be right. */
  public RefusedInput expected(String wanted) {
    return copy(file, place, found, wanted, remedy);
  }

  /** What the user can do, as an imperative clause without a full stop. */
  public RefusedInput remedy(String action) {
    return copy(file, place, found, expected, action);
  }

  private RefusedInput copy(
      @Nullable String newFile,
      @Nullable String newPlace,
      @Nullable String newFound,
      @Nullable String newExpected,
      @Nullable String newRemedy) {
    RefusedInput r = new RefusedInput(what, newFile, newPlace, newFound, newExpected, newRemedy);
    r.setStackTrace(getStackTrace());
    return r;
  }

  /** The whole refusal as one sentence on one line. */
  @Override
  public String getMessage() {
    StringBuilder s = new StringBuilder();
    if (file != null) {
      s.append(file);
    }
    if (place != null) {
      s.append(s.length() > 0 ? ", " : "").append(place);
    }
    s.append(s.length() > 0 ? ": " : "").append(what);
    if (found != null && expected != null) {
      s.append(" (found ").append(found).append(", expected ").append(expected).append(')');
    } else if (found != null) {
      s.append(" (found ").append(found).append(')');
    } else if (expected != null) {
      s.append(" (expected ").append(expected).append(')');
    }
    if (remedy != null) {
      s.append("; ").append(remedy);
    }
    return s.append('.').toString().replaceAll("\\s*[\\r\\n]+\\s*", " ");
  }

  /**
   * The facts by name (what, file, place, found, expected, remedy, sentence), absent ones left out.
   */
  public Map<String, String> facts() {
    Map<String, String> m = new LinkedHashMap<>();
    m.put("what", what);
    put(m, "file", file);
    put(m, "place", place);
    put(m, "found", found);
    put(m, "expected", expected);
    put(m, "remedy", remedy);
    m.put("sentence", getMessage());
    return m;
  }

  private static void put(Map<String, String> m, String key, @Nullable String value) {
    if (value != null) {
      m.put(key, value);
    }
  }
}
