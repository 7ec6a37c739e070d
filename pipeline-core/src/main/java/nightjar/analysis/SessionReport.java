package nightjar.analysis;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import nightjar.design.DesignColumn;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;
import nightjar.report.BrainMaps;
import nightjar.report.ContrastMap;
import nightjar.report.MethodsFacts;
import nightjar.report.MethodsText;
import nightjar.report.ReportContent;
import nightjar.report.ReportPage;
import nightjar.report.ReportedFrames;
import nightjar.report.ReportedRegions;
import nightjar.results.ColumnMean;
import nightjar.results.Findings;
import nightjar.results.FrameFindings;
import nightjar.results.MapFindings;
import nightjar.results.MapPeak;
import nightjar.results.RegionFindings;
import nightjar.results.SessionResults;
import nightjar.results.Warning;
import nightjar.storage.ResultFolder;
import org.jspecify.annotations.Nullable;

/** Hands the findings to the report page and the methods text. */
final class SessionReport {
  private static final double STRONG = 0.001;

  private final Findings findings;
  private final OpenedSession session;

  private SessionReport(Findings findings, OpenedSession session) {
    this.findings = findings;
    this.session = session;
  }

  /** Writes {@code methods.md} and {@code report.html}; true when both are there. */
  static boolean write(Findings findings, OpenedSession session, ResultFolder folder) {
    SessionReport r = new SessionReport(findings, session);
    String methods = MethodsText.of(r.methods());
    SessionResults.writeText(folder, "methods.md", methods);
    SessionResults.writeText(folder, "report.html", ReportPage.render(r.content(methods)));
    return true;
  }

  private MethodsFacts methods() {
    KeptFrames kept = findings.frames().kept();
    int drift =
        (int)
            findings.frames().design().ofPlane(0).columns().stream()
                .filter(c -> c.kind() == DesignColumn.Kind.DRIFT)
                .count();
    int df = findings.maps().model().residualDegreesOfFreedom();
    return new MethodsFacts(
        session.plan(),
        findings.provenance().version(),
        findings.provenance().grid(),
        kept,
        new MethodsFacts.ModelSize(findings.maps().order().size(), drift, kept.count() - df, df),
        session.stimuli().stream()
            .map(
                s ->
                    new MethodsFacts.StimulusFact(
                        s.name(), s.trials().size(), ColumnMean.of(findings.frames(), s.name())))
            .toList());
  }

  private ReportContent content(String methods) {
    return new ReportContent(
        heading(),
        findings.verdict(),
        findings.warnings().stream().map(Warning::sentence).toList(),
        facts(),
        maps(),
        regions(),
        frames(),
        findings.frames().design().ofPlane(0),
        session.plan().inference().level(),
        methods);
  }

  private ReportContent.Heading heading() {
    String title =
        findings
            .provenance()
            .metadata()
            .attributes()
            .getOrDefault("title", session.recording().fileName());
    return new ReportContent.Heading(
        title,
        session.plan().name(),
        findings.provenance().version(),
        findings.provenance().inputs().stream()
            .map(f -> new ReportContent.Input(f.role(), f.name(), f.sha256()))
            .toList());
  }

  private List<ReportContent.Fact> facts() {
    List<ReportContent.Fact> facts = new ArrayList<>();
    findings
        .provenance()
        .metadata()
        .attributes()
        .forEach((name, value) -> facts.add(new ReportContent.Fact(name, value)));
    Grid g = findings.provenance().grid();
    KeptFrames kept = findings.frames().kept();
    FrameTimes times = kept.times();
    facts.add(
        new ReportContent.Fact(
            "grid",
            (g.hasPlaneAxis() ? g.planes().size() + " planes of " : "")
                + g.depths().size()
                + " x "
                + g.laterals().size()
                + " voxels of "
                + number(g.depths().spacingMillimetres())
                + " x "
                + number(g.laterals().spacingMillimetres())
                + " mm"));
    facts.add(
        new ReportContent.Fact(
            "frames",
            kept.count()
                + " kept of "
                + kept.frames()
                + ", every "
                + number(times.intervalSeconds())
                + " s"));
    facts.add(
        new ReportContent.Fact(
            "recorded",
            number(times.recordedLengthSeconds())
                + " s in "
                + times.segments()
                + (times.segments() == 1 ? " segment" : " segments")));
    facts.add(
        new ReportContent.Fact(
            "voxels analysed", Integer.toString(findings.maps().order().size())));
    facts.add(
        new ReportContent.Fact(
            "residual degrees of freedom",
            Integer.toString(findings.maps().model().residualDegreesOfFreedom())));
    return facts;
  }

  private static String number(double x) {
    return String.format(Locale.ROOT, "%.4g", x)
        .replaceFirst("(\\.\\d*?)0+$", "$1")
        .replaceFirst("\\.$", "");
  }

  private BrainMaps maps() {
    MapFindings m = findings.maps();
    List<ContrastMap> contrasts = new ArrayList<>();
    for (int c = 0; c < m.model().contrasts().size(); c++) {
      contrasts.add(
          new ContrastMap(
              summary(m, c),
              m.order().spread(floats(m.fit().effect(c)), Float.NaN),
              m.order().spread(floats(m.fit().t(c)), Float.NaN),
              m.order().spread(m.tests().q(c), Double.NaN)));
    }
    boolean[] inside = new boolean[m.order().gridVoxels()];
    for (int k = 0; k < m.order().size(); k++) {
      inside[m.order().voxel(k)] = true;
    }
    return new BrainMaps(
        findings.provenance().grid(),
        Mask.of(inside.length, v -> inside[v]),
        m.meanPower().values(),
        findings.regions().labels(),
        contrasts);
  }

  private ContrastMap.ContrastSummary summary(MapFindings m, int c) {
    return new ContrastMap.ContrastSummary(
        m.model().contrasts().get(c).name(),
        below(m.fit().p(c), STRONG),
        below(m.tests().q(c), session.plan().inference().level()),
        peak(m, c));
  }

  private static int below(double[] values, double level) {
    return (int) Arrays.stream(values).filter(v -> v < level).count();
  }

  private ContrastMap.@Nullable Peak peak(MapFindings m, int c) {
    int k = MapPeak.of(m.fit().t(c));
    if (k < 0) {
      return null;
    }
    Grid g = findings.provenance().grid();
    int v = m.order().voxel(k);
    return new ContrastMap.Peak(
        g.planeOf(v),
        g.depths().at(g.depthOf(v)),
        g.laterals().at(g.lateralOf(v)),
        m.fit().t(c)[k]);
  }

  private static float[] floats(double[] values) {
    float[] f = new float[values.length];
    for (int k = 0; k < f.length; k++) {
      f[k] = (float) values[k];
    }
    return f;
  }

  private ReportedRegions regions() {
    RegionFindings r = findings.regions();
    KeptFrames kept = findings.frames().kept();
    double[][] courses = r.fits().timeCourses();
    List<NamedSeries> series = new ArrayList<>();
    for (int i = 0; i < courses.length; i++) {
      double[] all = new double[kept.frames()];
      Arrays.fill(all, Double.NaN);
      for (int row = 0; row < kept.count(); row++) {
        all[kept.frame(row)] = courses[i][row];
      }
      series.add(new NamedSeries(r.fits().name(i), all));
    }
    return new ReportedRegions(r.contrasts(), r.responses().bins(), series);
  }

  private ReportedFrames frames() {
    FrameFindings f = findings.frames();
    int n = f.kept().frames();
    return new ReportedFrames(
        f.kept(),
        f.motion(),
        session.stimuli(),
        List.of(
            new NamedSeries(
                "log_power", IntStream.range(0, n).mapToDouble(f.judgement()::logPower).toArray()),
            new NamedSeries(
                "change", IntStream.range(0, n).mapToDouble(f.judgement()::change).toArray())));
  }
}
