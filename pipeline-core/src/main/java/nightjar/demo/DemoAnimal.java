package nightjar.demo;

/**
 * An invented animal.
 *
 * @param name such as {@code young-1}
 * @param cohort {@code young} or {@code aged}
 * @param responseShare scales every planted response; 1 = as in the table of {@link DemoRegion}
 * @param startleMillimetres how far the brain moves at once when a whisker puff comes; 0 = calm
 */
public record DemoAnimal(
    String name, String cohort, double responseShare, double startleMillimetres) {}
