package nightjar.design;

/**
 * Plan section {@code stimuli}, one entry.
 *
 * @param name the stimulus' name in the model and the results
 * @param loggedAs its name in the event table
 * @param ignored true: its trials are left out of the model
 */
public record StimulusSettings(String name, String loggedAs, boolean ignored) {}
