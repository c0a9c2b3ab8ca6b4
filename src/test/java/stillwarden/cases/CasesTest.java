package stillwarden.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.order.Explanation;

/** Every case beside a rule, through the real readers, the compiled rules and the order. */
class CasesTest {
  @TempDir
  Path folder;

  @TestFactory
  Stream<DynamicTest> cases() {
    return CaseFile.all().stream().map(c -> DynamicTest.dynamicTest(c.title(), () -> check(c)));
  }

  @Test
  void aboutHalfOfTheCasesMustStayQuiet() {
    List<CaseFile.Case> all = CaseFile.all();
    long quiet = all.stream().filter(c -> c.word("fires").equals("no")).count();
    assertThat((double) quiet / all.size()).isBetween(0.3, 0.7);
  }

  private void check(CaseFile.Case c) throws Exception {
    Rig rig = Bench.rig(c.map("rig"), folder);
    Policy policy = Bench.policy(c.map("policy"), folder);
    Optional<RunLog> log = Bench.log(c.list("log"), c.list("silent"));
    if (log.isPresent()) {
      assertThat(log.get().leftOut()).as("lines left out").isEmpty();
    }
    Advice a = log.isPresent() ? Advisor.whole(rig, policy, log.get(), Optional.empty()) : Advisor.inspect(rig, policy, Optional.empty());
    Explanation why = Advisor.explain(c.hazard(), rig, policy, log, Optional.empty());
    List<String> wrong = new ArrayList<>();
    if (c.has("fires") && !outcome(why).equals(c.word("fires"))) {
      wrong.add("fires: wanted " + c.word("fires") + ", was " + outcome(why));
    }
    if (c.has("verdict") && !a.verdict().equals(c.word("verdict"))) {
      wrong.add("verdict: wanted " + c.word("verdict") + ", was " + a.verdict());
    }
    actions(c, a, wrong);
    assertThat(wrong).as(() -> told(a, why)).isEmpty();
  }

  private static void actions(CaseFile.Case c, Advice a, List<String> wrong) {
    List<String> done = a.actions().stream().map(Advice.Action::act).toList();
    List<String> left = new ArrayList<>(c.list("actions"));
    for (String d : done) {
      if (!left.isEmpty() && left.get(0).equals(d)) {
        left.remove(0);
      }
    }
    if (!left.isEmpty()) {
      wrong.add("actions: wanted " + c.list("actions") + " in this order, was " + done);
    }
    c.list("never").stream().filter(done::contains).forEach(n -> wrong.add("never: " + n + " was proposed in " + done));
    List<String> bans = a.doNot().stream().map(Advice.Ban::act).toList();
    c.list("ban").stream().filter(b -> !bans.contains(b)).forEach(b -> wrong.add("ban: wanted " + b + ", was " + bans));
    List<String> asked = a.ask().stream().map(Advice.Question::about).toList();
    c.list("ask").stream().filter(q -> !asked.contains(q)).forEach(q -> wrong.add("ask: wanted " + q + ", was " + asked));
  }

  private static String outcome(Explanation why) {
    List<String> outcomes = why.rules().stream().map(Explanation.RuleView::outcome).toList();
    return outcomes.contains("fires") ? "yes" : outcomes.contains("could") ? "could" : "no";
  }

  private static String told(Advice a, Explanation why) {
    StringBuilder b = new StringBuilder(a.verdict() + " " + a.stage());
    why.rules().forEach(r -> {
      b.append("\n  ").append(r.outcome()).append(": ").append(r.rule());
      r.signs().forEach(s -> b.append("\n      ").append(s.sign()).append(" wanted ").append(s.wanted()).append(" is ").append(s.is()).append(" [").append(s.holds()).append("] ").append(s.evidence()));
    });
    a.actions().forEach(x -> b.append("\n  do ").append(x.act()).append(' ').append(x.signal()).append(' ').append(x.because().stream().map(Advice.Because::hazard).distinct().toList()));
    return b.toString();
  }
}
