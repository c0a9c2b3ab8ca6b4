package stillwarden.cli;

import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** The JSON Schema of one kind of file. */
@Command(name = "schema", mixinStandardHelpOptions = true, versionProvider = Stillwarden.Version.class,
    description = "the JSON Schema of rig files, policies, log lines or answers")
final class SchemaCommand implements Callable<Integer> {
  private static final List<String> KNOWN = List.of("rig", "policy", "log", "advice");

  private final Desk desk;

  @Spec private CommandSpec spec;

  @Parameters(paramLabel = "rig|policy|log|advice", description = "which one")
  private String what;

  @Option(names = "--no-color", description = "accepted; no colour is ever printed")
  private boolean noColor;

  SchemaCommand(Desk desk) {
    this.desk = desk;
  }

  @Override
  public Integer call() {
    if (!KNOWN.contains(what)) {
      throw new ParameterException(spec.commandLine(), "unknown schema `" + what + "`; known are rig, policy, log and advice");
    }
    String text = desk.engine().schema(what);
    desk.answer(text.endsWith("\n") ? text : text + "\n");
    return Exit.NOTHING_TO_DO.code();
  }
}
