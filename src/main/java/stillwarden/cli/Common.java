package stillwarden.cli;

import java.nio.file.Path;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.time.format.DateTimeParseException;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import picocli.CommandLine.Spec.Target;
import stillwarden.describe.Policy;
import stillwarden.describe.Unusable;

/** Options that every judging command takes. */
final class Common {
  @Spec(Target.MIXEE) private CommandSpec spec;

  @Option(names = "--policy", paramLabel = "FILE", description = "the site's policy file; without it the built-in limits hold")
  private Path policyFile;

  @Option(names = "--format", paramLabel = "text|json", defaultValue = "text", description = "text (the default) or json")
  private Format format;

  @Option(names = "--at", paramLabel = "TIME", description = "judge as of this RFC 3339 time with its offset, or `now`")
  private String at;

  @Option(names = "--no-color", description = "accepted; no colour is ever printed")
  private boolean noColor;

  boolean json() {
    return format == Format.json;
  }

  Policy policy(Engine engine) throws Unusable {
    return policyFile == null ? Policy.NONE : engine.policy(policyFile);
  }

  Optional<OffsetDateTime> at(Clock clock) {
    if (at == null) {
      return Optional.empty();
    }
    try {
      return Optional.of(at.equals("now") ? OffsetDateTime.now(clock) : OffsetDateTime.parse(at));
    } catch (DateTimeParseException e) {
      throw new ParameterException(spec.commandLine(), "--at `" + at + "` is no RFC 3339 time; want for example 2026-04-14T10:52:05Z, or now");
    }
  }
}
