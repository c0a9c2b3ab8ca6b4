package stillwarden.cli;

import java.io.IOException;
import java.nio.file.Path;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.time.format.DateTimeParseException;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.show.JsonView;
import stillwarden.show.TextView;

/** Mid-run: what do I do now. */
@Command(name = "advise", mixinStandardHelpOptions = true, versionProvider = Stillwarden.Version.class,
    description = "mid-run: what do I do now (LOG is a file, or - for standard input)")
final class AdviseCommand implements Callable<Integer> {
  /** An answer older than this is said to be old. */
  private static final Duration FRESH = Duration.ofMinutes(2);

  private final Desk desk;

  @Spec private CommandSpec spec;
  @Mixin private Common common;

  @Parameters(index = "0", paramLabel = "RIG", description = "the rig file")
  private Path rigFile;

  @Parameters(index = "1", paramLabel = "LOG", description = "the run log, or - for standard input")
  private String logFile;

  @Option(names = "--follow", description = "go on reading; print whenever verdict, actions, bans or questions change")
  private boolean follow;

  AdviseCommand(Desk desk) {
    this.desk = desk;
  }

  @Override
  public Integer call() throws Unusable, IOException, InterruptedException {
    Optional<OffsetDateTime> at = common.at(desk.clock());
    if (follow && at.isPresent()) {
      throw new ParameterException(spec.commandLine(), "--follow runs on the machine's clock; leave out --at");
    }
    Rig rig = desk.engine().rig(rigFile);
    Policy policy = common.policy(desk.engine());
    if (follow) {
      return new Follow(desk, rig, policy, common.json()).run(logFile).code();
    }
    RunLog log = logFile.equals("-") ? desk.engine().log(desk.in(), "-") : desk.engine().log(Path.of(logFile));
    Advice advice = desk.engine().advise(rig, policy, log, at);
    if (at.isEmpty()) {
      age(advice.at()).ifPresent(desk::say);
    }
    desk.answer(common.json() ? JsonView.of(advice) : TextView.of(advice));
    return Exit.of(advice.exit()).code();
  }

  /** Says how old the answer is when the machine's clock is well ahead of it: the answer itself never depends on that clock. */
  private Optional<String> age(String answered) {
    try {
      OffsetDateTime at = OffsetDateTime.parse(answered);
      Duration ahead = Duration.between(at.toInstant(), desk.clock().instant());
      String since = at.format(DateTimeFormatter.ofPattern("HH:mm:ss"));
      return ahead.compareTo(FRESH) <= 0
          ? Optional.empty()
          : Optional.of("as of " + since + ", " + span(ahead) + " ago; for this minute add --at now");
    } catch (DateTimeParseException e) {
      return Optional.empty();
    }
  }

  private static String span(Duration d) {
    if (d.toHours() == 0) {
      return d.toMinutes() + " min";
    }
    return d.toDays() == 0 ? d.toHours() + " h " + d.toMinutesPart() + " min" : d.toDays() + " d " + d.toHoursPart() + " h";
  }
}
