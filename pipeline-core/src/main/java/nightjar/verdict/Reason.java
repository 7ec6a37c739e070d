package nightjar.verdict;

/**
 * Why a session is not simply usable.
 *
 * @param code fixed word for programs
 * @param sentence for people, with the number and the limit
 * @param value what was found
 * @param limit what it is held against
 */
public record Reason(String code, String sentence, double value, double limit) {}
