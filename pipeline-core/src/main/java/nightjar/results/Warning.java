package nightjar.results;

/**
 * Something that a person should know and that stopped nothing.
 *
 * @param code fixed word for programs
 * @param sentence for people
 */
public record Warning(String code, String sentence) {}
