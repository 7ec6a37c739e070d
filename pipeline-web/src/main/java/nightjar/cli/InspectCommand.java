package nightjar.cli;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.concurrent.Callable;
import nightjar.analysis.InspectedFiles;
import nightjar.analysis.Inspection;
import nightjar.analysis.SessionInspection;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code nightjar inspect}: what is there, and what would be refused. */
@Command(
    name = "inspect",
    sortOptions = false,
    mixinStandardHelpOptions = true,
    description = {
      "Says what the files of a session hold and what an analysis would refuse; any of the files"
          + " alone, or together.",
      ""
    },
    exitCodeListHeading = "%nExit codes:%n",
    exitCodeList = {
      "0:nothing would be refused",
      "2:something would be refused, one sentence each; or the command line was refused",
      "3:the inspection failed; an incident was logged"
    },
    footer = {
      "",
      "Example:",
      "  ./nightjar inspect --recording scan.nc --events scan_events.tsv \\",
      "      --plan configs/whisker-puff.yaml --json"
    })
final class InspectCommand implements Callable<Integer> {
  @Option(
      names = "--recording",
      paramLabel = "FILE",
      description = "Power-Doppler recording, NetCDF (default: none).")
  private @Nullable Path recording;

  @Option(
      names = "--events",
      paramLabel = "FILE",
      description = "Event table with onset, duration (s) and trial_type (default: none).")
  private @Nullable Path events;

  @Option(names = "--plan", paramLabel = "FILE", description = "Plan, YAML (default: none).")
  private @Nullable Path plan;

  @Option(
      names = "--regions",
      paramLabel = "FILE",
      description = "Label file (NetCDF) or polygons (JSON, mm) (default: none).")
  private @Nullable Path regions;

  @Option(
      names = "--traces",
      paramLabel = "FILE",
      description = "Continuous traces with their time (s) (default: none).")
  private @Nullable Path traces;

  @Option(
      names = "--json",
      description =
          "The same as JSON, with the heap and scratch space (MB) that a run needs as heap_mb and"
              + " scratch_mb (default: off).")
  private boolean json;

  @Spec private @Nullable CommandSpec spec;

  @Override
  public Integer call() throws JsonProcessingException {
    InspectedFiles files = new InspectedFiles(recording, events, plan, regions, traces);
    if (files.equals(new InspectedFiles(null, null, null, null, null))) {
      throw RefusedInput.because("there is no file to inspect")
          .remedy("name one with --recording, --events, --plan, --regions or --traces");
    }
    Inspection found = SessionInspection.of(files);
    if (spec != null) {
      PrintWriter out = spec.commandLine().getOut();
      out.print(json ? asJson(found) : InspectionText.of(found));
      out.flush();
      found.refusals().forEach(r -> spec.commandLine().getErr().println(r.getMessage()));
    }
    return found.refusals().isEmpty() ? 0 : Nightjar.REFUSED;
  }

  private static String asJson(Inspection found) throws JsonProcessingException {
    Map<String, Object> m = new LinkedHashMap<>(found.sections());
    Map<String, Object> needs = found.sections().get("needs");
    m.remove("needs");
    if (needs != null) {
      m.putAll(needs);
    }
    m.put("warnings", found.warnings());
    m.put("refused", found.refusals().stream().map(RefusedInput::facts).toList());
    return new ObjectMapper().writerWithDefaultPrettyPrinter().writeValueAsString(m) + "\n";
  }
}
