package stillwarden.cli;

import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
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
import stillwarden.order.Explanation;
import stillwarden.show.HazardCard;
import stillwarden.show.RulesView;

/** The rule base: what triggers a hazard, what it asks for, its source; with {@code --for} why it spoke or kept quiet. */
@Command(name = "rules", mixinStandardHelpOptions = true, versionProvider = Stillwarden.Version.class,
    description = "the rule base: all hazards, one hazard, or (--for) why it spoke or kept quiet about a rig")
final class RulesCommand implements Callable<Integer> {
  private final Desk desk;

  @Spec private CommandSpec spec;
  @Mixin private Common common;

  @Parameters(paramLabel = "HAZARD", arity = "0..1", description = "a hazard's id; without it all are listed")
  private String hazard;

  @Option(names = "--for", arity = "1..2", paramLabel = "RIG [LOG]", hideParamSyntax = true,
      description = "RIG [LOG]: why the rules spoke or kept quiet about this rig (and run)")
  private List<String> files;

  RulesCommand(Desk desk) {
    this.desk = desk;
  }

  @Override
  public Integer call() throws Unusable {
    List<HazardCard> cards = hazard == null ? HazardCard.all() : List.of(known());
    desk.answer(files == null ? cards(cards) : why(cards));
    return Exit.NOTHING_TO_DO.code();
  }

  private HazardCard known() {
    return HazardCard.of(hazard).orElseThrow(() -> {
      String hint = Plain.nearest(hazard, HazardCard.all().stream().map(HazardCard::id).toList())
          .map(n -> "; the nearest is `" + n + "`").orElse("");
      return new ParameterException(spec.commandLine(), "unknown hazard `" + hazard + "`" + hint);
    });
  }

  private String cards(List<HazardCard> cards) {
    if (hazard == null) {
      return common.json() ? RulesView.json(cards) : RulesView.text(cards);
    }
    return common.json() ? RulesView.json(cards.get(0)) : RulesView.text(cards.get(0));
  }

  private String why(List<HazardCard> cards) throws Unusable {
    Engine engine = desk.engine();
    Optional<OffsetDateTime> at = common.at(desk.clock());
    Rig rig = engine.rig(Path.of(files.get(0)));
    Policy policy = common.policy(engine);
    Optional<RunLog> log = log();
    List<Explanation> out = new ArrayList<>();
    for (HazardCard card : cards) {
      out.add(engine.explain(card.id(), rig, policy, log, at));
    }
    List<Explanation> shown = hazard == null ? out.stream().filter(RulesCommand::speaks).toList() : out;
    return common.json() ? RulesView.whyJson(rig.name(), shown) : RulesView.why(rig.name(), shown);
  }

  private Optional<RunLog> log() throws Unusable {
    if (files.size() < 2) {
      return Optional.empty();
    }
    String log = files.get(1);
    return Optional.of(log.equals("-") ? desk.engine().log(desk.in(), "-") : desk.engine().log(Path.of(log)));
  }

  /** Over the whole rule base only what speaks or could is worth reading. */
  private static boolean speaks(Explanation e) {
    return e.rules().stream().anyMatch(r -> !r.outcome().equals("quiet"));
  }
}
