package stillwarden.cli;

import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import stillwarden.derive.physics.JointFit;
import stillwarden.derive.physics.Plan;
import stillwarden.describe.Joint;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.show.PlanSheet;

/** The one place that knows how the physics hands over a plan. */
final class PlanAdapter {
  private static final Map<String, String> ENDS = Map.of(
      "target", "the target is reached", "oil-over", "the oil is over", "reservoir", "the reservoir is empty, if it is not refilled",
      "minimum-level", "the flask is at its minimum level, if nothing is refilled", "full-receiver", "the receiver is full");

  private PlanAdapter() {}

  /** The waivers and whom the plan defers to are those of the inspection. */
  static PlanSheet sheet(Rig rig, Policy policy, Optional<OffsetDateTime> at) {
    Plan plan = Plan.of(rig, policy);
    Advice inspected = Advisor.inspect(rig, policy, at);
    List<String> lines = new ArrayList<>();
    plan.ends().forEach(e -> lines.add(minutes(e.minutes()) + " after heat on: " + ENDS.getOrDefault(e.what(), e.what().replace('-', ' '))));
    refill(plan).ifPresent(lines::add);
    lines.addAll(joints(rig));
    List<PlanSheet.Curve> curves = plan.curves().stream().map(PlanAdapter::curve).toList();
    return new PlanSheet(rig.name(), inspected.at(), plan.numbers().list(), curves, lines, List.of(), inspected.waivers(), inspected.defersTo());
  }

  /** When to refill: before the reservoir ends, and again each time that a full one lasts, up to the target. */
  private static Optional<String> refill(Plan plan) {
    Optional<Double> ends = end(plan, "reservoir");
    Optional<Double> wanted = end(plan, "target").or(() -> end(plan, "oil-over"));
    double boils = plan.numbers().get("heat-up-time").nominal();
    if (ends.isEmpty() || wanted.isEmpty() || wanted.get() <= ends.get()) {
      return Optional.empty();
    }
    double lasts = ends.get() - boils;
    long times = (long) Math.ceil((wanted.get() - ends.get()) / lasts);
    return Optional.of("refill the reservoir before " + minutes(ends.get()) + " after heat on"
        + (times > 1 ? ", then every " + minutes(lasts) + ", " + times + " times in all" : ""));
  }

  private static Optional<Double> end(Plan plan, String what) {
    return plan.ends().stream().filter(e -> e.what().equals(what)).map(Plan.End::minutes).findFirst();
  }

  /** Each joint that does not seat fully, and how many could not be told. */
  private static List<String> joints(Rig rig) {
    List<String> lines = new ArrayList<>();
    long sized = 0;
    for (Joint joint : rig.joints()) {
      Optional<JointFit.Verdict> fit = joint.word("size").flatMap(JointFit::ofText);
      sized += fit.isPresent() ? 1 : 0;
      fit.filter(v -> v.seat() != JointFit.Seat.SEATS)
          .ifPresent(v -> lines.add("joint " + joint + ": " + v.seat().name().toLowerCase(Locale.ROOT) + ", " + v.why()));
    }
    lines.add("joint sizes stated: " + sized + " of " + rig.joints().size() + (lines.isEmpty() && sized > 0 ? ", all of them seat" : ""));
    return lines;
  }

  private static String minutes(double minutes) {
    return String.format(Locale.ROOT, "%.0f min", minutes);
  }

  private static PlanSheet.Curve curve(Plan.Curve c) {
    return new PlanSheet.Curve(c.name(), c.unit(), list(c.minutes()), list(c.low()), list(c.value()), list(c.high()));
  }

  private static List<Double> list(double[] values) {
    return Arrays.stream(values).boxed().toList();
  }
}
