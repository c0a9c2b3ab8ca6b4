package stillwarden.proof;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import stillwarden.judge.Finding;
import stillwarden.judge.Judge;
import stillwarden.judge.Statement;
import stillwarden.order.Arranged;
import stillwarden.order.Arranged.Plan;
import stillwarden.order.Arranged.Row;
import stillwarden.rulebook.Rulebook;

/** Two states against each other: a second thing goes wrong beside the first; NOTICE comes or goes. */
class StateRelationTest {
  private static final long SEED = Long.getLong("proof.seed", 20260512L);
  private static final int STATES = Integer.getInteger("proof.pairs", 12_000);
  private static final Set<String> CUTS = Set.of("cut-power", "isolate-remote", "isolate-auto", "close-gas");
  private static final Set<String> PRINCIPLES = Rulebook.read().pages().stream().filter(Rulebook.Page::principle).map(Rulebook.Page::id).collect(java.util.stream.Collectors.toSet());
  private static final StateSpace SPACE = new StateSpace(Rulebook.read());

  /** Alarms that come beside others and change nothing about what was seen so far. */
  private static final String[][] SECOND = {
      {"smoke", "yes"}, {"bumping", "yes"}, {"clamp-slipping", "yes"}, {"coolant-leak", "yes"}, {"inner-leak", "yes"}, {"plant-in-head", "yes"}, {"joint-leaks", "yes"},
      {"glass-failing", "yes"}, {"thermometer-broken", "yes"}, {"bath-spitting", "yes"}, {"fire", "small"}, {"fire", "spreading"}, {"injury", "burn"}, {"injury", "eye"},
      {"noise", "crackling"}, {"scorching", "browning"}, {"drain", "blocked"}, {"vent-bubbling", "yes"}, {"foam", "at-head"}, {"hood", "stopped"}, {"exposed", "yes"},
      {"water-on", "electrics"}, {"tingle-or-sparks", "yes"}, {"breaker-tripped", "yes"}, {"reading-lost", "yes"}, {"clip-soft", "yes"}, {"joint-stuck", "yes"},
      {"receiver-missing", "yes"}, {"head-high", "yes"}, {"distillate-hot", "yes"}, {"toxic-release", "yes"}, {"symptoms", "yes"}, {"handover", "missing"}};

  private final Map<String, List<String>> problems = new LinkedHashMap<>();

  private void problem(String kind, String what) {
    problems.computeIfAbsent(kind, k -> new ArrayList<>()).add(what);
  }

  private void none() {
    List<String> told = new ArrayList<>();
    problems.forEach((k, all) -> told.add(all.size() + " x " + k + "\n    " + all.stream().min(java.util.Comparator.comparingInt(String::length)).orElseThrow()));
    assertThat(told).as("seed %s", SEED).isEmpty();
  }

  /** INV-25: an independent second deviation never takes away or delays the energy cut, nor lowers the signal word. */
  @Test
  void aSecondAlarmNeverHidesTheFirst() {
    SplittableRandom r = new SplittableRandom(SEED);
    try (Judge judge = Judge.forRuns()) {
      State s = null;
      for (int i = 0; i < STATES; i++) {
        s = SPACE.step(s, r);
        String[] second = SECOND[r.nextInt(SECOND.length)];
        if (s.live() && (!s.known.containsKey(second[0]) || s.is(second[0], SPACE.domains.get(second[0]).get(0)))) {
          List<Finding> before = active(judge, s);
          State both = s.copy();
          both.seen(second[0], second[1]);
          List<Finding> after = active(judge, both);
          compare(second[0] + "=" + second[1], s, before, after);
        }
      }
    }
    none();
  }

  private static List<Finding> active(Judge judge, State s) {
    return judge.judge(s.signs()).findings().stream().filter(Finding::isActive).toList();
  }

  private void compare(String what, State s, List<Finding> before, List<Finding> after) {
    Plan one = Arranged.of(before, false);
    Plan two = Arranged.of(after, false);
    if (gravest(two) < gravest(one)) {
      problem("a lower signal word with " + what, s.odd() + " " + one.ids() + " becomes " + two.ids());
    }
    int cutOne = cut(one);
    int cutTwo = cut(two);
    if (cutOne >= 0 && cutTwo < 0) {
      problem("no cut any more with " + what, s.odd() + " " + one.ids() + " becomes " + two.ids());
    } else if (cutOne == 0 && cutTwo > 0 && !mayPrecede(two, cutTwo)) {
      problem("the cut comes later with " + what, s.odd() + " " + one.ids() + " becomes " + two.ids());
    }
  }

  /** Flames where flammable vapour is out, a load before a walk, the tip once the mains are gone anyway, heat left off. */
  private static boolean mayPrecede(Plan plan, int cut) {
    return plan.ids().stream().filter(Arranged::equipment).limit(cut).allMatch(Set.of("flame-out", "support-load", "lower-receiver", "keep-heat-off")::contains);
  }

  /** How many equipment steps stand ahead of the energy cut; -1 without one. */
  private static int cut(Plan plan) {
    int n = 0;
    for (Row row : plan.steps()) {
      if (CUTS.contains(row.id()) && row.iff().isEmpty()) {
        return n;
      }
      n += Arranged.equipment(row.id()) ? 1 : 0;
    }
    return -1;
  }

  private static int gravest(Plan plan) {
    return plan.steps().stream().mapToInt(x -> Arranged.rank(x.signal())).max().orElse(-1);
  }

  /** M2. */
  @Test
  void aNoticeChangesNoGraverStep() {
    SplittableRandom r = new SplittableRandom(SEED + 1);
    try (Judge judge = Judge.forRuns()) {
      State s = null;
      for (int i = 0; i < STATES; i++) {
        s = SPACE.step(s, r);
        List<Finding> all = active(judge, s);
        // a principle speaks of another's advice and has no weight of its own
        List<Finding> grave = all.stream().filter(f -> !Arranged.signal(f).equals("NOTICE") || PRINCIPLES.contains(f.hazard())).toList();
        Plan with = Arranged.of(all, false);
        Plan without = Arranged.of(grave, false);
        List<String> a = graver(with);
        List<String> b = graver(without);
        if (!a.equals(b)) {
          List<String> notices = all.stream().filter(f -> !grave.contains(f)).map(f -> f.hazard() + "/" + f.rule()).toList();
          problem("a notice moves a graver step", s.odd() + " " + b + " becomes " + a + " with " + notices + " " + without.ids() + " to " + with.ids());
        }
      }
    }
    none();
  }

  private static List<String> graver(Plan plan) {
    return plan.steps().stream().filter(x -> Arranged.rank(x.signal()) >= 2).map(x -> x.id() + "/" + x.signal()).toList();
  }

  /** No DANGER is left with nothing to do about it. */
  @Test
  void everyDangerKeepsADeed() {
    SplittableRandom r = new SplittableRandom(SEED + 2);
    try (Judge judge = Judge.forRuns()) {
      State s = null;
      for (int i = 0; i < STATES; i++) {
        s = SPACE.step(s, r);
        boolean setup = s.is("stage", "setting-up");
        List<Finding> all = active(judge, s);
        Plan plan = Arranged.of(all, setup);
        for (Finding f : all) {
          // a principle that modifies another's advice leaves the deeds to it
          boolean proposes = f.under().isEmpty() && f.statements().stream().anyMatch(x -> x instanceof Statement.Propose);
          // where everyone has to leave, leaving is the deed for all of them
          boolean leave = plan.ids().contains("evacuate");
          if (!leave && Arranged.signal(f).equals("DANGER") && proposes && (setup || !Arranged.gate(f)) && plan.steps().stream().noneMatch(x -> x.reasons().contains(f))) {
            problem("nothing left for " + f.hazard() + ": " + f.rule(), s.odd() + " " + plan.ids());
          }
        }
      }
    }
    none();
  }
}
