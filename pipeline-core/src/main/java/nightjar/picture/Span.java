package nightjar.picture;

/**
 * A stretch of a chart's horizontal axis that is shaded, e.g. while a stimulus lasted.
 *
 * @param name equal names share a lane, a colour and a line of the legend
 * @param from start, in the axis' unit
 * @param to end; equal to the start for a moment
 */
public record Span(String name, double from, double to) {}
