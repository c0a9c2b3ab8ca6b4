package stillwarden.proof;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;
import stillwarden.derive.Standing;
import stillwarden.judge.Finding;
import stillwarden.judge.Judge;
import stillwarden.judge.Judgement;
import stillwarden.order.Arranged;
import stillwarden.rulebook.Rulebook;

/**
 * Random full states over every word that any rule names: the order is free of cycles, every invariant holds, every
 * rule has its hour. {@code -Dproof.states=N} draws more, {@code -Dproof.seed=S} others.
 */
class StateEnumerationTest {
  private static final int STATES = Integer.getInteger("proof.states", 200_000);
  private static final long SEED = Long.getLong("proof.seed", 20260512L);
  private static final StateSpace SPACE = new StateSpace(Rulebook.read());

  /** What one worker has found. */
  private static final class Found {
    final Map<String, Integer> counts = new TreeMap<>();
    final Map<String, List<State>> examples = new TreeMap<>();
    final Set<String> fired = new HashSet<>();
    final Set<List<String>> lists = new HashSet<>();
    final Set<Integer> states = new HashSet<>();
    int cycles;
    String cycle = "";
  }

  /** One test an invariant, so that a broken one hides no other. */
  @TestFactory
  Stream<DynamicTest> everyInvariantHoldsInEveryStateDrawn() {
    long start = System.nanoTime();
    List<Found> found = IntStream.range(0, 2).parallel().mapToObj(w -> work(SEED + w, STATES / 2)).toList();
    Set<String> fired = new TreeSet<>();
    Set<Integer> different = new HashSet<>();
    Map<String, Integer> counts = new TreeMap<>();
    Set<List<String>> lists = new HashSet<>();
    for (Found f : found) {
      fired.addAll(f.fired);
      different.addAll(f.states);
      f.counts.forEach((k, n) -> counts.merge(k, n, Integer::sum));
      lists.addAll(f.lists);
    }
    Set<String> never = new TreeSet<>();
    SPACE.rules.stream().filter(r -> !fired.contains(r.name())).forEach(r -> never.add(r.toString()));
    System.out.printf("states %d (%d different), seed %d, words %d, rules fired %d of %d, different lists of steps %d, %.0f s%n",
        STATES, different.size(), SEED, SPACE.domains.size(), fired.size(), SPACE.rules.size(), lists.size(), (System.nanoTime() - start) / 1e9);
    Stream<DynamicTest> whole = Stream.of(
        DynamicTest.dynamicTest("no two rules disagree about the order", () -> assertThat(found.stream().filter(f -> f.cycles > 0).map(f -> f.cycles + ": " + f.cycle)).isEmpty()),
        DynamicTest.dynamicTest("every rule has its hour", () -> assertThat(never).isEmpty()),
        DynamicTest.dynamicTest("enough states, and enough answers", () -> {
          assertThat(different.size()).isGreaterThan(STATES * 9 / 10);
          assertThat(lists.size()).isGreaterThan(STATES / 20);
        }));
    return Stream.concat(whole, Oracle.NAMES.stream().map(name -> DynamicTest.dynamicTest(name, () -> {
      List<String> report = new ArrayList<>();
      counts.forEach((k, n) -> {
        if (k.startsWith(name)) {
          report.add(n + " x " + k + "\n" + examples(found, k));
        }
      });
      assertThat(report).isEmpty();
    })));
  }

  private static Found work(long seed, int states) {
    SplittableRandom r = new SplittableRandom(seed);
    Found out = new Found();
    try (Judge judge = Judge.forRuns()) {
      State last = null;
      for (int i = 0; i < states; i++) {
        State s = SPACE.step(last, r);
        last = s;
        out.states.add(s.known.hashCode());
        Judgement j = judge.judge(s.signs());
        j.findings().stream().filter(Finding::isActive).forEach(f -> out.fired.add(f.rule()));
        Arranged.Plan plan = Arranged.of(j.findings(), s.is("stage", "setting-up"));
        out.lists.add(plan.ids());
        if (!plan.cycle().isEmpty() && out.cycles++ == 0) {
          out.cycle = plan.cycle() + " in " + s.odd();
        }
        for (String what : Oracle.judge(s, plan)) {
          String kind = kind(what);
          out.counts.merge(kind, 1, Integer::sum);
          List<State> e = out.examples.computeIfAbsent(kind, k -> new ArrayList<>());
          if (e.size() < 4) {
            e.add(s);
          }
        }
      }
    }
    return out;
  }

  /** A message without the list that it ends in. */
  private static String kind(String what) {
    int list = what.indexOf(": [");
    return list < 0 ? what : what.substring(0, list);
  }

  private static String examples(List<Found> found, String kind) {
    Set<String> out = new TreeSet<>();
    try (Judge judge = Judge.forRuns()) {
      found.forEach(f -> f.examples.getOrDefault(kind, List.of()).forEach(s -> out.add(smallest(judge, s, kind))));
    }
    return String.join("\n", out);
  }

  /** Words are made calm or silent one after the other as long as the same thing stays broken. */
  private static String smallest(Judge judge, State from, String kind) {
    State s = from.copy();
    for (String about : List.copyOf(s.known.keySet())) {
      State calmer = s.copy();
      calmer.absent(about);
      if (broken(judge, calmer, kind)) {
        s = calmer;
        continue;
      }
      State.Known k = s.known.get(about);
      State calm = s.copy();
      calm.seen(about, SPACE.domains.get(about).get(0));
      if (!SPACE.domains.get(about).get(0).equals(k.value()) && broken(judge, calm, kind)) {
        s = calm;
      } else if (k.standing() == Standing.COUNTED) {
        State seen = s.copy();
        seen.seen(about, k.value());
        s = broken(judge, seen, kind) ? seen : s;
      }
    }
    Judgement j = judge.judge(s.signs());
    Arranged.Plan plan = Arranged.of(j.findings(), s.is("stage", "setting-up"));
    List<String> rules = j.findings().stream().filter(Finding::isActive).map(f -> f.hazard() + "/" + f.rule()).toList();
    return "    " + s.known.entrySet().stream().map(e -> e.getKey() + "=" + (e.getValue().value() == null ? "?" : e.getValue().value())).toList() + "\n      steps " + plan.ids() + "\n      rules " + rules;
  }

  private static boolean broken(Judge judge, State s, String kind) {
    Arranged.Plan plan = Arranged.of(judge.judge(s.signs()).findings(), s.is("stage", "setting-up"));
    return Oracle.judge(s, plan).stream().anyMatch(w -> kind(w).equals(kind));
  }
}
