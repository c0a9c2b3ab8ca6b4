package stillwarden.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;
import stillwarden.describe.Rig;
import stillwarden.describe.Unusable;
import stillwarden.show.PlanSheet;
import stillwarden.show.PlanView;

/** The numbers of a run before it starts. */
@Command(name = "plan", mixinStandardHelpOptions = true, versionProvider = Stillwarden.Version.class,
    description = "the numbers: boiling point here, water needed, times, condenser, coolant strategy")
final class PlanCommand implements Callable<Integer> {
  private final Desk desk;

  @Mixin private Common common;

  @Parameters(paramLabel = "RIG", description = "the rig file")
  private Path file;

  PlanCommand(Desk desk) {
    this.desk = desk;
  }

  @Override
  public Integer call() throws Unusable {
    Rig rig = desk.engine().rig(file);
    PlanSheet plan = desk.engine().plan(rig, common.policy(desk.engine()), common.at(desk.clock()));
    desk.answer(common.json() ? PlanView.json(plan) : PlanView.text(plan));
    return Exit.NOTHING_TO_DO.code();
  }
}
