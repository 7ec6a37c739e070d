package nightjar.results;

/**
 * A file that the analysis read.
 *
 * @param role recording, events, plan, regions or traces
 * @param name its last name
 * @param sha256 of its bytes, hexadecimal
 */
public record InputFile(String role, String name, String sha256) {}
