package stillwarden.judge;

import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.kie.api.runtime.KieSession;
import org.kie.api.runtime.rule.FactHandle;
import org.kie.api.runtime.rule.Match;
import stillwarden.derive.Sign;

/**
 * Judges signs by the rules. A judge may be kept for a live run: it then hands the engine only the signs that came or
 * went. Kept or fresh, the same signs give the same judgement. Not for several threads at once.
 */
public final class Judge implements AutoCloseable {
  // far above what any state fires; a loop among rules would stop here and be reported
  private static final int MOST_FIRINGS = 20_000;

  private final RuleBase rules;
  private final Map<Sign, FactHandle> inside = new HashMap<>();
  private final Set<String> broken = new HashSet<>();
  private KieSession session;

  private Judge(RuleBase rules) {
    this.rules = rules;
  }

  public static Judge forInspection() {
    return new Judge(RuleBase.inspect());
  }

  public static Judge forRuns() {
    return new Judge(RuleBase.all());
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
    broken.clear();
    try {
      update(signs);
      return fire();
    } catch (RuntimeException first) {
      // the failed match is lost for good: throw the session away and judge anew from the facts
      return rebuilt(signs, first);
    }
  }

  private Judgement rebuilt(Collection<Sign> signs, RuntimeException first) {
    RuntimeException last = first;
    for (int i = 0; i < 8; i++) {
      String name = ruleOf(last);
      close();
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
    close();
    broken.add(ruleOf(last));
    return new Judgement(List.of(), List.copyOf(broken));
  }

  private void update(Collection<Sign> signs) {
    if (session == null) {
      session = rules.newSession();
    }
    Set<Sign> wanted = new HashSet<>(signs);
    inside.entrySet().removeIf(e -> {
      if (wanted.contains(e.getKey())) {
        return false;
      }
      session.delete(e.getValue());
      return true;
    });
    for (Sign s : wanted) {
      inside.computeIfAbsent(s, session::insert);
    }
  }

  private Judgement fire() {
    int fired = session.fireAllRules(this::mayFire, MOST_FIRINGS);
    List<String> notJudged = new ArrayList<>(broken);
    if (fired >= MOST_FIRINGS) {
      notJudged.add("rules that set each other off without end");
    }
    List<Finding> findings = new ArrayList<>();
    for (Object o : session.getObjects(Finding.class::isInstance)) {
      findings.add((Finding) o);
    }
    return new Judgement(findings, notJudged);
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
    inside.clear();
    if (session != null) {
      session.dispose();
      session = null;
    }
  }
}
