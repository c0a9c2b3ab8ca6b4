package stillwarden.cli;

import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;
import stillwarden.describe.Policy;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.show.JsonView;
import stillwarden.show.TextView;

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
    List<JsonView.Item> items = new ArrayList<>();
    for (Path rig : rigs) {
      items.add(inspect(rig, policy, at));
    }
    show(items);
    return items.stream().map(InspectCommand::exit).reduce(Exit.NOTHING_TO_DO, Exit::worse).code();
  }

  private JsonView.Item inspect(Path file, Policy policy, Optional<OffsetDateTime> at) {
    try {
      Advice advice = desk.engine().inspect(desk.engine().rig(file), policy, at);
      return new JsonView.Item(file.toString(), Optional.of(advice), List.of());
    } catch (Unusable u) {
      desk.defects(u.defects());
      return new JsonView.Item(file.toString(), Optional.empty(), u.defects());
    }
  }

  private void show(List<JsonView.Item> items) {
    if (common.json() && items.size() > 1) {
      desk.answer(JsonView.of(items));
      return;
    }
    String between = "";
    for (JsonView.Item item : items) {
      if (item.advice().isPresent()) {
        Advice advice = item.advice().get();
        desk.answer(between + (common.json() ? JsonView.of(advice) : TextView.of(advice)));
        between = "\n" + "=".repeat(72) + "\n";
      }
    }
  }

  private static Exit exit(JsonView.Item item) {
    return item.advice().map(a -> Exit.of(a.exit())).orElse(Exit.UNUSABLE);
  }
}
