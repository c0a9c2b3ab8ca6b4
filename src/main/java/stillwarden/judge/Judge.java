package stillwarden.judge;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.kie.api.runtime.rule.Match;
import stillwarden.derive.Sign;

/**
 * Judges signs by the rules. A judge may be kept for a live run: it then hands the engine only the signs that came or
 * went, and none at all when the rules can see no difference (see {@link Recall}). Kept or fresh, the same signs give
 * the same judgement. Not for several threads at once.
 */
public final class Judge implements AutoCloseable {
  // far above what any state fires; a loop among rules would stop here and be reported
  private static final int MOST_FIRINGS = 20_000;
  // a live run is judged in two passes, the second with the set-up faults that the first found
  private static final int PASSES = 2;

  private final RuleBase rules;
  private final boolean recalls;
  private final Deque<Recall> recalled = new ArrayDeque<>();
  private final Set<String> broken = new HashSet<>();
  private Facts inside;

  Judge(RuleBase rules, boolean recalls) {
    this.rules = rules;
    this.recalls = recalls;
  }

  public static Judge forInspection() {
    return new Judge(RuleBase.inspect(), true);
  }

  public static Judge forRuns() {
    return new Judge(RuleBase.all(), true);
  }

  /** Asks the engine every time: to check the short cut against. */
  public static Judge withoutShortCut() {
    return new Judge(RuleBase.all(), false);
  }

  /** Number of compiled rules: a build that compiled none must be noticed. */
  public static int ruleCount() {
    return RuleBase.all().ruleCount();
  }

  public static Judgement once(Judge judge, Collection<Sign> signs) {
    try (judge) {
      return judge.judge(signs);
    }
  }

  public Judgement judge(Collection<Sign> signs) {
    List<Sign> asked = List.copyOf(signs);
    for (Recall r : recalled) {
      if (r.covers(asked)) {
        return r.judgement(asked);
      }
    }
    Said said = ask(asked);
    Recall now = new Recall(asked, said.findings(), said.places());
    // what could not be judged is tried again the next time
    if (recalls && said.notJudged().isEmpty()) {
      keep(now);
    }
    return new Judgement(now.last().findings(), said.notJudged());
  }

  private void keep(Recall now) {
    recalled.addFirst(now);
    if (recalled.size() > PASSES) {
      recalled.removeLast();
    }
  }

  /**
   * @param findings in terms of what the rules see of the signs
   * @param places of each finding's facts among the signs
   */
  private record Said(List<Finding> findings, int[][] places, List<String> notJudged) {}

  private Said ask(List<Sign> signs) {
    broken.clear();
    try {
      update(signs);
      return fire();
    } catch (RuntimeException first) {
      // the failed match is lost for good: throw the session away and judge anew from the facts
      return rebuilt(signs, first);
    }
  }

  private Said rebuilt(List<Sign> signs, RuntimeException first) {
    RuntimeException last = first;
    for (int i = 0; i < 8; i++) {
      String name = ruleOf(last);
      drop();
      if (!broken.add(name)) {
        break;
      }
      try {
        update(signs);
        return fire();
      } catch (RuntimeException next) {
        last = next;
      }
    }
    drop();
    broken.add(ruleOf(last));
    return new Said(List.of(), new int[0][], List.copyOf(broken));
  }

  private void update(List<Sign> signs) {
    if (inside == null) {
      inside = new Facts(rules.newSession());
    }
    inside.update(signs);
  }

  private Said fire() {
    int fired = inside.fire(this::mayFire, MOST_FIRINGS);
    List<String> notJudged = new ArrayList<>(broken);
    if (fired >= MOST_FIRINGS) {
      notJudged.add("rules that set each other off without end");
    }
    List<Finding> findings = inside.findings();
    return new Said(findings, findings.stream().map(inside::places).toArray(int[][]::new), notJudged);
  }

  private boolean mayFire(Match match) {
    return broken.isEmpty() || !broken.contains(match.getRule().getName());
  }

  private static String ruleOf(RuntimeException e) {
    for (Throwable t = e; t != null; t = t.getCause()) {
      if (t instanceof org.kie.api.runtime.rule.ConsequenceException c && c.getMatch() != null) {
        return c.getMatch().getRule().getName();
      }
    }
    return "a condition of the rules";
  }

  @Override
  public void close() {
    recalled.clear();
    drop();
  }

  private void drop() {
    if (inside != null) {
      inside.dispose();
      inside = null;
    }
  }
}
