package stillwarden.cli;

import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.show.PlanSheet;

/** The one place that knows how the physics hands over a plan. */ // replaced at merge: numbers of the plan itself, curves, strategy
final class PlanAdapter {
  private PlanAdapter() {}

  static PlanSheet sheet(Rig rig, Policy policy, Optional<OffsetDateTime> at) {
    Advice a = Advisor.inspect(rig, policy, at);
    return new PlanSheet(
        rig.name(), a.at(), a.numbers(), List.of(), List.of(), a.notes(), a.waivers(), a.defersTo());
  }
}
