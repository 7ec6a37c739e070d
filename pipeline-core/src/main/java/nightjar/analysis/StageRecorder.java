package nightjar.analysis;

import java.lang.management.ManagementFactory;
import java.lang.management.MemoryPoolMXBean;
import java.lang.management.MemoryType;
import java.util.ArrayList;
import java.util.List;
import nightjar.recording.Progress;
import nightjar.results.RunRecord;
import org.jspecify.annotations.Nullable;

/** Passes stages on to the listener and records what each took. */
final class StageRecorder {
  private static final double MEGABYTE = 1e6;

  private final StageListener listener;
  private final List<RunRecord.Stage> stages = new ArrayList<>();
  private @Nullable String name;
  private long begun;

  StageRecorder(StageListener listener) {
    this.listener = listener;
  }

  /** Ends the stage before and begins the next. */
  Progress begin(String next, double share) {
    end();
    if (Thread.currentThread().isInterrupted()) {
      throw new java.util.concurrent.CancellationException("interrupted");
    }
    name = next;
    begun = System.nanoTime();
    heapPools().forEach(MemoryPoolMXBean::resetPeakUsage);
    return listener.stage(next, share);
  }

  /** Ends the last stage; the record of all. */
  List<RunRecord.Stage> end() {
    if (name != null) {
      double seconds = (System.nanoTime() - begun) / 1e9;
      double heap = heapPools().stream().mapToDouble(p -> p.getPeakUsage().getUsed()).sum();
      stages.add(new RunRecord.Stage(name, seconds, heap / MEGABYTE));
      name = null;
    }
    return List.copyOf(stages);
  }

  private static List<MemoryPoolMXBean> heapPools() {
    return ManagementFactory.getMemoryPoolMXBeans().stream()
        .filter(p -> p.getType() == MemoryType.HEAP)
        .toList();
  }
}
