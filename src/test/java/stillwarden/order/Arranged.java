package stillwarden.order;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import stillwarden.judge.Finding;
import stillwarden.judge.Statement;

/** A window into the arranging for tests of other packages: findings in, the whole order out, as plain records. */
public final class Arranged {
  /** One step; {@code iff} as in the answer. */
  public record Row(String id, String part, String iff, String signal, List<Finding> reasons) {}

  /** One ban; a deed that waits for two things has two. */
  public record Bar(String deed, String until, List<Finding> reasons) {}

  public record Plan(List<Row> steps, List<Bar> bars, List<String> cycle) {
    public List<String> ids() {
      return steps.stream().map(Row::id).toList();
    }
  }

  private Arranged() {}

  /** Exactly what the answer arranges: active findings, and of what only holds a start nothing but its bans once heat is on. */
  public static Plan of(Collection<Finding> findings, boolean setup) {
    List<Finding> acted = findings.stream().filter(Finding::isActive).map(f -> setup || !Verdicts.gate(f) ? f : f.bansOnly()).toList();
    Arrange.Plan plan = new Arrange(s -> Double.MAX_VALUE, s -> 0, false).arrange(acted);
    List<Row> rows = new ArrayList<>();
    plan.steps().forEach(s -> rows.add(new Row(s.id(), s.part, s.iff, s.signal().name(), List.copyOf(s.reasons))));
    List<Bar> bars = plan.bans().stream().flatMap(b -> (b.plain() ? java.util.stream.Stream.of("") : b.untils().stream()).map(u -> new Bar(b.deed(), u, b.reasons()))).toList();
    return new Plan(rows, bars, plan.cycle());
  }

  public static String signal(Finding f) {
    return Hazards.signal(f).name();
  }

  public static int rank(String signal) {
    return Signal.of(signal).ordinal();
  }

  public static boolean gate(Finding f) {
    return Verdicts.gate(f);
  }

  public static boolean warnFirst(Finding f) {
    return Hazards.speaking(f).warnFirst();
  }

  public static boolean end(Finding f) {
    return Hazards.of(f.hazard()).end();
  }

  public static boolean alarm(Finding f) {
    return !Hazards.speaking(f).end() && !end(f) && f.statements().stream().anyMatch(s -> s instanceof Statement.Propose p && Deeds.of(p.action()).cut());
  }

  public static List<String> group(String deed) {
    return Deeds.group(deed);
  }

  public static List<String> replaces(String action) {
    return Deeds.of(action).replaces();
  }

  public static boolean personal(String action) {
    return Deeds.of(action).personal();
  }

  public static boolean equipment(String action) {
    return Deeds.of(action).equipment();
  }

  public static boolean cut(String action) {
    return Deeds.of(action).cut();
  }

  public static double ladder(String action) {
    return Deeds.of(action).ladder();
  }
}
