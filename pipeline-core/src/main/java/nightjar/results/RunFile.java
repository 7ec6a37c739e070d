package nightjar.results;

import java.util.LinkedHashMap;
import java.util.Map;

/** {@code run.json}: the only file that may differ between runs. */
public final class RunFile {
  /** Name in the result folder. */
  public static final String NAME = "run.json";

  private RunFile() {}

  /** The file's text. */
  public static String text(RunRecord run) {
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("date", run.begun().toString());
    m.put("host", run.host());
    m.put("threads", run.threads());
    m.put("seconds", round(run.stages().stream().mapToDouble(RunRecord.Stage::seconds).sum()));
    m.put("stages", run.stages().stream().map(RunFile::stage).toList());
    return JsonText.of(m);
  }

  private static Map<String, Object> stage(RunRecord.Stage s) {
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("name", s.name());
    m.put("seconds", round(s.seconds()));
    m.put("peak_heap_mb", round(s.peakHeapMegabytes()));
    return m;
  }

  private static double round(double x) {
    return Math.round(x * 1000) / 1000.0;
  }
}
