package nightjar.demo;

import java.util.ArrayList;
import java.util.List;

/**
 * The invented study of the Saltmarsh imaging core: two cohorts of four head-fixed rats, one or two
 * sessions each. One session is spoiled on purpose; one animal moves with the puffs.
 */
public final class DemoStudy {
  /** Name of the study in the recordings. */
  public static final String NAME = "saltmarsh-whisker";

  private static final DemoScan SCAN = new DemoScan(1, 96, 112, 600, 0.4, 0);
  private static final DemoScan SMALL_SCAN = new DemoScan(1, 48, 56, 400, 0.4, 0);
  private static final int ANIMALS = 4;
  private static final double AGED_SHARE = 0.65;
  private static final double RHO = 0.35;
  private static final String SPOILED = "aged-3_b";
  private static final String STARTLED = "young-4";

  private DemoStudy() {}

  /** All sessions, the young first; animals 1 and 3 of each cohort have two. */
  public static List<DemoSession> sessions() {
    List<DemoSession> sessions = new ArrayList<>();
    for (String cohort : List.of("young", "aged")) {
      for (int k = 1; k <= ANIMALS; k++) {
        DemoAnimal animal = animal(cohort, k);
        sessions.add(session(animal, "a"));
        if (k % 2 == 1) {
          sessions.add(session(animal, "b"));
        }
      }
    }
    return List.copyOf(sessions);
  }

  /** An ordinary good session, the first of the study. */
  public static DemoSession firstSession() {
    return sessions().get(0);
  }

  /** A small session of the same kind, quick to make and to analyse. */
  public static DemoSession smallSession() {
    return new DemoSession(
        "small", 20260301L, SMALL_SCAN, animal("young", 1), DemoDisturbance.ORDINARY, RHO);
  }

  private static DemoAnimal animal(String cohort, int number) {
    String name = cohort + "-" + number;
    // Animals of a cohort differ: 0.88, 0.96, 1.04, 1.12 of its mean.
    double own = 0.8 + 0.08 * number;
    double share = own * (cohort.equals("aged") ? AGED_SHARE : 1);
    return new DemoAnimal(name, cohort, share, name.equals(STARTLED) ? 0.06 : 0);
  }

  private static DemoSession session(DemoAnimal animal, String letter) {
    String name = animal.name() + "_" + letter;
    DemoDisturbance disturbance =
        name.equals(SPOILED) ? DemoDisturbance.SPOILED : DemoDisturbance.ORDINARY;
    return new DemoSession(name, seed(name), SCAN, animal, disturbance, RHO);
  }

  /** A seed of the name's letters (FNV-1a), so that each session can be made alone. */
  private static long seed(String name) {
    long hash = 0xcbf29ce484222325L;
    for (int i = 0; i < name.length(); i++) {
      hash = (hash ^ name.charAt(i)) * 0x100000001b3L;
    }
    return hash;
  }
}
