package nightjar.picture;

/**
 * What stands around a chart.
 *
 * @param title read aloud in place of the picture
 * @param abscissa horizontal axis with its unit
 * @param ordinate vertical axis with its unit
 * @param width whole picture, pixels
 * @param height whole picture without the legend, pixels
 */
public record ChartFrame(
    String title, String abscissa, String ordinate, double width, double height) {}
