package nightjar.report;

import gg.jte.ContentType;
import gg.jte.TemplateEngine;
import gg.jte.TemplateOutput;
import gg.jte.output.StringOutput;

/** The report of a session: one page of HTML that needs nothing but itself. */
public final class ReportPage {
  private ReportPage() {}

  /** The page; equal content gives equal text. */
  public static String render(ReportContent content) {
    TemplateOutput page = new StringOutput();
    TemplateEngine.createPrecompiled(ContentType.Html)
        .render("session-report.jte", new PageView(content), page);
    return page.toString();
  }
}
