package stillwarden.proof;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import stillwarden.derive.Sign;
import stillwarden.derive.Standing;
import stillwarden.describe.Knowledge;
import stillwarden.judge.Finding;
import stillwarden.judge.Statement;
import stillwarden.order.Arranged;
import stillwarden.order.Arranged.Bar;
import stillwarden.order.Arranged.Plan;
import stillwarden.order.Arranged.Row;

/** What the arranging promises of any set of findings, sensible or not. {@code -Dproof.seed=S} draws others. */
class OrderPropertyTest {
  private static final long SEED = Long.getLong("proof.seed", 20260512L);
  private static final int ROUNDS = Integer.getInteger("proof.findings", 4000);
  private static final List<String> ACTIONS = List.copyOf(new TreeSet<>(Knowledge.section("actions").fields().keySet()));
  private static final List<String> HAZARDS = List.copyOf(new TreeSet<>(Knowledge.section("hazards").fields().keySet()));

  /** Sets of findings; {@code untils} at most one wait for a deed, since two are a matter of their own. */
  private interface Check {
    void on(List<Finding> findings, Plan plan, SplittableRandom r);
  }

  private static void each(boolean manyUntils, Check check) {
    System.out.println("seed " + SEED);
    SplittableRandom r = new SplittableRandom(SEED);
    for (int i = 0; i < ROUNDS; i++) {
      List<Finding> findings = findings(r, manyUntils);
      check.on(findings, Arranged.of(findings, true), r);
    }
  }

  private static List<Finding> findings(SplittableRandom r, boolean manyUntils) {
    // every `before` goes forward in one hidden order, so that no set contradicts itself
    List<String> hidden = shuffled(ACTIONS, r);
    Set<String> waiting = new HashSet<>();
    List<Finding> out = new ArrayList<>();
    for (int n = 1 + r.nextInt(8); n > 0; n--) {
      Finding f = Finding.of("rule " + n, HAZARDS.get(r.nextInt(HAZARDS.size())), new Sign("live", "", "yes", Standing.SEEN, "fact " + n, null, List.of()));
      for (int k = r.nextInt(6); k > 0; k--) {
        f = f.propose(pick(r));
      }
      for (int k = r.nextInt(3); k > 0; k--) {
        f = f.forbid(pick(r));
      }
      for (int k = r.nextInt(3); k > 0; k--) {
        int a = r.nextInt(hidden.size() - 1);
        int b = a + 1 + r.nextInt(hidden.size() - a - 1);
        boolean until = r.nextBoolean() && (manyUntils || waiting.add(hidden.get(b)));
        f = until ? f.forbidUntil(hidden.get(b), hidden.get(a)) : f.before(hidden.get(a), hidden.get(b));
      }
      out.add(f);
    }
    return out;
  }

  private static String pick(SplittableRandom r) {
    return ACTIONS.get(r.nextInt(ACTIONS.size()));
  }

  private static <T> List<T> shuffled(List<T> from, SplittableRandom r) {
    List<T> out = new ArrayList<>(from);
    for (int i = out.size() - 1; i > 0; i--) {
      java.util.Collections.swap(out, i, r.nextInt(i + 1));
    }
    return out;
  }

  @Test
  void aBanBeatsAProposal() {
    each(true, (findings, plan, r) -> {
      for (Finding f : findings) {
        for (Statement s : f.statements()) {
          if (s instanceof Statement.Forbid ban && ban.until().isEmpty()) {
            assertThat(plan.ids()).doesNotContain(ban.deed());
          }
        }
      }
    });
  }

  @Test
  void whatComesBeforeStandsBefore() {
    each(false, (findings, plan, r) -> {
      // the leisurely order of a planned end gives way to an alarm
      boolean alarm = findings.stream().anyMatch(Arranged::alarm);
      for (Finding f : findings) {
        if (!(alarm && Arranged.end(f))) {
          f.statements().stream().filter(s -> s instanceof Statement.Before).map(s -> (Statement.Before) s)
              .filter(b -> plan.ids().contains(b.first()) && plan.ids().contains(b.then()))
              .forEach(b -> assertThat(plan.ids().lastIndexOf(b.first())).as("%s before %s in %s", b.first(), b.then(), plan.ids()).isLessThan(plan.ids().indexOf(b.then())));
        }
      }
      assertThat(plan.cycle()).isEmpty();
    });
  }

  @Test
  void aDeedThatWaitsStandsBehindWhatItWaitsFor() {
    each(true, (findings, plan, r) -> {
      for (Finding f : findings) {
        for (Statement s : f.statements()) {
          if (s instanceof Statement.Forbid ban && !ban.until().isEmpty() && plan.ids().contains(ban.deed())) {
            assertThat(plan.ids()).as("%s until %s", ban.deed(), ban.until()).contains(ban.until());
            assertThat(plan.ids().indexOf(ban.until())).as("%s until %s in %s", ban.deed(), ban.until(), plan.ids()).isLessThan(plan.ids().indexOf(ban.deed()));
          }
        }
      }
    });
  }

  @Test
  void theOrderOfTheFindingsSaysNothing() {
    each(true, (findings, plan, r) -> {
      Plan other = Arranged.of(shuffled(findings, r), true);
      assertThat(other.ids()).isEqualTo(plan.ids());
      assertThat(other.steps().stream().map(OrderPropertyTest::told).toList()).isEqualTo(plan.steps().stream().map(OrderPropertyTest::told).toList());
      assertThat(other.bars().stream().map(b -> b.deed() + "|" + b.until()).sorted().toList()).isEqualTo(plan.bars().stream().map(b -> b.deed() + "|" + b.until()).sorted().toList());
    });
  }

  private static String told(Row row) {
    return row.id() + "|" + row.signal() + "|" + new TreeSet<>(row.reasons().stream().map(Finding::rule).toList());
  }

  @Test
  void mergingKeepsEveryReason() {
    each(true, (findings, plan, r) -> {
      for (Finding f : findings) {
        for (Row row : plan.steps()) {
          if (f.proposes(row.id())) {
            assertThat(row.reasons()).as(row.id()).contains(f);
            assertThat(Arranged.rank(row.signal())).isGreaterThanOrEqualTo(Arranged.rank(Arranged.signal(f)));
          }
        }
      }
    });
  }

  @Test
  void aProposalIsDoneBannedOrOutdone() {
    each(true, (findings, plan, r) -> {
      Set<String> barred = new HashSet<>();
      plan.bars().forEach(b -> barred.add(b.deed()));
      Set<String> proposed = new HashSet<>();
      findings.forEach(f -> ACTIONS.stream().filter(f::proposes).forEach(proposed::add));
      for (String a : proposed) {
        boolean outdone = proposed.stream().anyMatch(strong -> Arranged.replaces(strong).contains(a));
        assertThat(plan.ids().contains(a) || barred.contains(a) || outdone).as(a + " of " + plan.ids()).isTrue();
      }
    });
  }

  /** A weaker deed must not fall for a stronger one that is itself banned: then nothing of the two would be left. */
  @Test
  void whatIsOutdoneFallsOnlyForWhatStays() {
    each(true, (findings, plan, r) -> {
      Set<String> barred = new HashSet<>();
      plan.bars().forEach(b -> barred.add(b.deed()));
      Set<String> proposed = new HashSet<>();
      findings.forEach(f -> ACTIONS.stream().filter(f::proposes).forEach(proposed::add));
      for (String weak : proposed) {
        boolean missing = !plan.ids().contains(weak) && !barred.contains(weak);
        assertThat(!missing || stands(weak, proposed, plan)).as(weak + " is gone and nothing stronger is in " + plan.ids()).isTrue();
      }
    });
  }

  private static boolean stands(String weak, Set<String> proposed, Plan plan) {
    return proposed.stream().filter(strong -> Arranged.replaces(strong).contains(weak)).anyMatch(strong -> plan.ids().contains(strong) || stands(strong, proposed, plan));
  }

  @Test
  void peopleNeverPartTheFirstTwoEquipmentSteps() {
    each(true, (findings, plan, r) -> {
      List<Integer> equipment = new ArrayList<>();
      for (int i = 0; i < plan.steps().size(); i++) {
        if (Arranged.equipment(plan.steps().get(i).id())) {
          equipment.add(i);
        }
      }
      if (equipment.size() > 1 && Arranged.cut(plan.steps().get(equipment.get(0)).id())) {
        Set<String> bound = bound(findings, plan.bars());
        for (Row row : plan.steps().subList(equipment.get(0) + 1, equipment.get(1))) {
          boolean forced = bound.contains(row.id()) || row.reasons().stream().anyMatch(Arranged::warnFirst);
          assertThat(Arranged.personal(row.id()) && Arranged.ladder(row.id()) >= 1 && Arranged.ladder(row.id()) < 2 && !forced).as(row.id() + " in " + plan.ids()).isFalse();
        }
      }
    });
  }

  /** Deeds whose place a rule has fixed. */
  private static Set<String> bound(List<Finding> findings, List<Bar> bars) {
    Set<String> out = new HashSet<>();
    for (Finding f : findings) {
      f.statements().forEach(s -> {
        if (s instanceof Statement.Before b) {
          out.add(b.first());
          out.add(b.then());
        }
      });
    }
    bars.forEach(b -> {
      out.add(b.deed());
      out.add(b.until());
    });
    return out;
  }
}
