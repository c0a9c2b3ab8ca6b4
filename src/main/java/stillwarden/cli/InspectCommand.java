package stillwarden.cli;

import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;
import stillwarden.describe.Policy;
import stillwarden.describe.Unusable;

/** Before heat goes on: what is missing, wrong or unknown, in walk-round order. */
@Command(name = "inspect", mixinStandardHelpOptions = true, versionProvider = Stillwarden.Version.class,
    description = "before heat goes on: what is missing, wrong or unknown, in walk-round order")
final class InspectCommand implements Callable<Integer> {
  private final Desk desk;

  @Mixin private Common common;

  @Parameters(paramLabel = "RIG", arity = "1..*", description = "rig files; several: the worst gives the exit status")
  private List<Path> rigs;

  InspectCommand(Desk desk) {
    this.desk = desk;
  }

  @Override
  public Integer call() throws Unusable {
    Optional<OffsetDateTime> at = common.at(desk.clock());
    Policy policy = common.policy(desk.engine());
    return new Inspection(desk, rigs, policy, common.json(), at).run().code();
  }
}
