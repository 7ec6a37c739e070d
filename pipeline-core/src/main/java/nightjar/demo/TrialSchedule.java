package nightjar.demo;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import nightjar.recording.EventTable;
import nightjar.recording.Trial;

/** When the puffs come: equal numbers of each, in random order, at irregular distances. */
final class TrialSchedule {
  static final double DURATION_SECONDS = 2;
  private static final double LEAD_SECONDS = 8;
  private static final double TAIL_SECONDS = 10;
  private static final double MEAN_DISTANCE_SECONDS = 6;

  private TrialSchedule() {}

  /** Trials that fill the recording; onsets are whole milliseconds, as the event table says. */
  static List<Trial> of(DemoScan scan, NormalStream random) {
    double room = scan.lengthSeconds() - LEAD_SECONDS - TAIL_SECONDS;
    DemoStimulus[] stimuli = DemoStimulus.values();
    int each = (int) Math.max(1, room / MEAN_DISTANCE_SECONDS / stimuli.length);
    DemoStimulus[] order = new DemoStimulus[each * stimuli.length];
    for (int i = 0; i < order.length; i++) {
      order[i] = stimuli[i % stimuli.length];
    }
    shuffle(order, random);
    double distance = room / order.length;
    List<Trial> trials = new ArrayList<>();
    for (int i = 0; i < order.length; i++) {
      double onset = LEAD_SECONDS + distance * (i + random.uniform(0, 0.5));
      double milliseconds = Math.rint(onset * 1000);
      trials.add(
          new Trial(
              order[i].label(), milliseconds / 1000, DURATION_SECONDS, null, Map.of(), i + 2));
    }
    return trials;
  }

  private static void shuffle(DemoStimulus[] order, NormalStream random) {
    for (int i = order.length - 1; i > 0; i--) {
      int j = random.below(i + 1);
      DemoStimulus s = order[i];
      order[i] = order[j];
      order[j] = s;
    }
  }

  /** The event table's text. */
  static String text(EventTable events) {
    StringBuilder s = new StringBuilder("onset\tduration\ttrial_type\n");
    for (Trial t : events.trials()) {
      s.append(DemoText.decimal(t.onsetSeconds(), 3))
          .append('\t')
          .append(DemoText.decimal(t.durationSeconds(), 3))
          .append('\t')
          .append(t.stimulus())
          .append('\n');
    }
    return s.toString();
  }
}
