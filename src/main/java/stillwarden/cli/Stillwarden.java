package stillwarden.cli;

import java.io.PrintWriter;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import picocli.CommandLine.UnmatchedArgumentException;
import stillwarden.describe.Unusable;

/** The command itself; without a subcommand it prints its usage. */
@Command(
    name = "stillwarden",
    mixinStandardHelpOptions = true,
    versionProvider = Stillwarden.Version.class,
    description = "Ordered, reasoned advice for steam distillation rigs: before heat, mid-run and at shutdown.",
    synopsisSubcommandLabel = "COMMAND",
    exitCodeListHeading = "%nExit status:%n",
    exitCodeList = {
      "0:nothing to do (start, carry-on)",
      "1:something to do or to find out",
      "2:the command line, a rig, a policy or a whole log could not be used"
    },
    footer = {"", "It defers to the site's own rules, the safety officer and the emergency services."})
final class Stillwarden implements Runnable {
  @Spec private CommandSpec spec;

  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "want a command: inspect, plan, advise, rules or schema");
  }

  static Exit run(Desk desk, String... args) {
    try {
      int code = commandLine(desk).execute(args);
      return code == 0 ? Exit.NOTHING_TO_DO : code == 1 ? Exit.SOMETHING_TO_DO : Exit.UNUSABLE;
    } catch (Throwable e) { // no stack trace ever reaches a user, whatever broke
      return Fault.say(desk, e);
    }
  }

  private static CommandLine commandLine(Desk desk) {
    CommandLine line = new CommandLine(new Stillwarden());
    line.addSubcommand(new InspectCommand(desk)).addSubcommand(new PlanCommand(desk)).addSubcommand(new AdviseCommand(desk));
    line.addSubcommand(new RulesCommand(desk)).addSubcommand(new SchemaCommand(desk));
    // no colour is used anywhere, so that NO_COLOR and --no-color hold without a switch in any view
    line.setColorScheme(CommandLine.Help.defaultColorScheme(Ansi.OFF)).setCaseInsensitiveEnumValuesAllowed(false);
    line.setOut(new PrintWriter(desk.out(), true)).setErr(new PrintWriter(desk.err(), true));
    line.setParameterExceptionHandler((e, a) -> usage(desk, e).code());
    line.setExecutionExceptionHandler((e, c, p) -> failed(desk, c, e).code());
    return line;
  }

  private static Exit usage(Desk desk, ParameterException e) {
    desk.say("stillwarden: " + message(e));
    desk.say("`" + e.getCommandLine().getCommandSpec().qualifiedName() + " --help` shows the usage");
    return Exit.UNUSABLE;
  }

  private static String message(ParameterException e) {
    boolean word = e instanceof UnmatchedArgumentException u && !u.isUnknownOption() && !u.getSuggestions().isEmpty();
    if (!word) {
      return Plain.words(e.getMessage());
    }
    UnmatchedArgumentException u = (UnmatchedArgumentException) e;
    return "unknown command `" + u.getUnmatched().get(0) + "`; the nearest is `" + u.getSuggestions().get(0) + "`";
  }

  private static Exit failed(Desk desk, CommandLine line, Exception e) {
    if (e instanceof Unusable u) {
      desk.defects(u.defects());
      return Exit.UNUSABLE;
    }
    return e instanceof ParameterException p ? usage(desk, p) : Fault.say(desk, e);
  }

  /** From the jar's manifest; a build that was never packaged says so. */
  static final class Version implements IVersionProvider {
    @Override
    public String[] getVersion() {
      String version = Stillwarden.class.getPackage().getImplementationVersion();
      return new String[] {"stillwarden " + (version == null ? "(not packaged)" : version)};
    }
  }
}
