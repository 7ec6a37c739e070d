package nightjar.cli;

import picocli.CommandLine;
import picocli.CommandLine.Command;

/** The launcher's main command. */
@Command(
    name = "nightjar",
    description = "Overnight analysis of functional-ultrasound sessions.",
    mixinStandardHelpOptions = true)
public final class Nightjar {
  private Nightjar() {}

  /** Runs a command and exits with its code. */
  public static void main(String[] arguments) {
    System.exit(new CommandLine(new Nightjar()).execute(arguments));
  }
}
