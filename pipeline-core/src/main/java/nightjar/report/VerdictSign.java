package nightjar.report;

import nightjar.verdict.Verdict;

/** A verdict as a shape: it can be told without colour. */
final class VerdictSign {
  private VerdictSign() {}

  /** A disc with a tick, a triangle with a bar and dot, a square on its corner with a cross. */
  static String svg(Verdict.Word word) {
    String shape =
        switch (word) {
          case USABLE -> "<circle cx=\"24\" cy=\"24\" r=\"20\"/><path d=\"M14 25l7 7 13-15\"/>";
          case REVIEW -> "<path d=\"M24 5L45 42H3z\"/><path d=\"M24 18v11M24 35v1\"/>";
          case UNUSABLE ->
              "<path d=\"M24 2L46 24 24 46 2 24z\"/><path d=\"M17 17l14 14M31 17l-14 14\"/>";
        };
    return "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"48\" height=\"48\" viewBox=\"0 0 48"
        + " 48\" aria-hidden=\"true\" fill=\"none\" stroke=\"currentColor\" stroke-width=\"3.5\""
        + " stroke-linecap=\"round\" stroke-linejoin=\"round\">"
        + shape
        + "</svg>";
  }
}
