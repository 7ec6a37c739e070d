package nightjar.cli;

import java.io.PrintWriter;
import nightjar.analysis.Version;
import nightjar.refusal.RefusedInput;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.ParameterException;

/** The launcher's main command. */
@Command(
    name = "nightjar",
    description = {
      "Analyses functional-ultrasound sessions: which places answered stimulus A more than B,"
          + " how strongly, how sure, and whether the recording is fit to say so.",
      ""
    },
    footer = {
      "",
      "Exit codes: 0 done; 2 the input or the command line was refused; 3 the analysis failed;"
          + " 130 interrupted. 'nightjar COMMAND --help' explains a command.",
      "",
      "For research. The local animal-welfare body and the licence decide on animal work. A"
          + " significant map is not a verdict on a recording: read the verdict first."
    },
    synopsisSubcommandLabel = "COMMAND",
    versionProvider = Nightjar.OwnVersion.class,
    mixinStandardHelpOptions = true,
    subcommands = {AnalyseCommand.class, InspectCommand.class, DemoCommand.class})
public final class Nightjar implements Runnable {
  /** The input or the command line was refused. */
  static final int REFUSED = 2;

  /** We failed. */
  static final int FAILED = 3;

  /** Somebody stopped us. */
  static final int INTERRUPTED = 130;

  @CommandLine.Spec private CommandLine.Model.@org.jspecify.annotations.Nullable CommandSpec spec;

  /** Runs a command and exits with its code. */
  public static void main(String[] arguments) {
    System.exit(run(commandLine(), arguments));
  }

  /** The exit code of a command; faults that are no exceptions are incidents too. */
  static int run(CommandLine line, String... arguments) {
    try {
      return line.execute(arguments);
    } catch (Error e) {
      line.getErr().println(Incident.record(e));
      return FAILED;
    }
  }

  /** The parser with our ways of telling what went wrong. */
  static CommandLine commandLine() {
    return new CommandLine(new Nightjar())
        .setUsageHelpAutoWidth(true)
        .setCaseInsensitiveEnumValuesAllowed(true)
        .setParameterExceptionHandler(Nightjar::refuseArguments)
        .setExecutionExceptionHandler((e, command, parsed) -> told(e, command.getErr()));
  }

  private static int refuseArguments(ParameterException e, String[] arguments) {
    CommandLine command = e.getCommandLine();
    String sentence = String.valueOf(e.getMessage()).strip().replaceAll("\\s*[\\r\\n]+\\s*", " ");
    command
        .getErr()
        .println(
            sentence
                + (sentence.endsWith(".") ? " See '" : "; see '")
                + command.getCommandSpec().qualifiedName()
                + " --help'.");
    return REFUSED;
  }

  private static int told(Exception e, PrintWriter err) {
    if (e instanceof RefusedInput) {
      err.println(e.getMessage());
      return REFUSED;
    }
    if (e instanceof java.util.concurrent.CancellationException) {
      err.println("Interrupted; nothing was written.");
      return INTERRUPTED;
    }
    err.println(Incident.record(e));
    return FAILED;
  }

  /** Without a command: what there is. */
  @Override
  public void run() {
    if (spec != null) {
      throw new ParameterException(spec.commandLine(), "A command is missing: analyse or inspect");
    }
  }

  /** The version of the build. */
  static final class OwnVersion implements IVersionProvider {
    @Override
    public String[] getVersion() {
      return new String[] {"Nightjar " + Version.current()};
    }
  }
}
