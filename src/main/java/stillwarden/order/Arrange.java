package stillwarden.order;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.function.ToDoubleFunction;
import java.util.function.ToIntFunction;
import stillwarden.judge.Finding;
import stillwarden.judge.Judgement;
import stillwarden.judge.Statement;

/**
 * Statements in, ordered steps out: bans, merging, {@code Before}, the ladder. No clock, no texts, no rule engine.
 *
 * <p>INVARIANT: a ban beats a proposal. INVARIANT: the order is a function of the set of findings, not of their order.
 */
final class Arrange {
  /**
   * @param steps in order
   * @param bans deed to its ban, deadliest first
   * @param cycle deeds whose relations contradict each other: a defect of the rulebook, reported and broken by the ladder
   */
  record Plan(List<Step> steps, List<Bans.Bar> bans, List<String> cycle) {}

  private final ToDoubleFunction<Step> timeToHarm;
  private final ToIntFunction<Step> walkRound;

  private final boolean walking;

  /** @param walking an inspection: in walk-round order, for nothing is hot yet */
  Arrange(ToDoubleFunction<Step> timeToHarm, ToIntFunction<Step> walkRound, boolean walking) {
    this.timeToHarm = timeToHarm;
    this.walkRound = walkRound;
    this.walking = walking;
  }

  Plan arrange(List<Finding> given) {
    List<Finding> active = given.stream().sorted(Judgement.STABLE).toList();
    Map<String, Step> steps = merged(active);
    Bans bans = Bans.of(active);
    // first the bans: a barred deed must not take a weaker one with it; then again, for what waited for the weaker one
    bans.waitForWhatIsPossible(steps.values());
    bans.removeFrom(steps);
    bans.replaced(replaceWeaker(steps));
    bans.waitForWhatIsPossible(steps.values());
    bans.removeFrom(steps);
    Set<Edge> edges = edges(active, bans, steps.values());
    List<String> cycle = new ArrayList<>();
    List<Step> sorted = sort(steps.values(), edges, cycle);
    return new Plan(placePeople(sorted, edges), bans.deadliestFirst(), cycle);
  }

  private static Map<String, Step> merged(List<Finding> active) {
    Map<String, Step> out = new TreeMap<>();
    for (Finding f : active) {
      for (Statement s : f.statements()) {
        if (s instanceof Statement.Propose p) {
          // repairs of different things are different deeds, even under one id
          String what = Deeds.of(p.action()).cold() ? p.say() : "";
          Step step = out.computeIfAbsent(p.action() + "|" + p.part() + "|" + what, k -> new Step(Deeds.of(p.action()), p.part()));
          step.reasons.add(f);
          if (!p.say().isEmpty()) {
            step.variants.add(p.say());
          }
        }
      }
    }
    return out;
  }

  /** @return each deed that fell, with the one it fell to */
  private static Map<String, String> replaceWeaker(Map<String, Step> steps) {
    Map<String, String> fell = new HashMap<>();
    for (Step strong : List.copyOf(steps.values())) {
      for (String weak : strong.deed.replaces()) {
        // what is itself replaced by something stronger still does its own replacing: the relation is transitive
        steps.values().removeIf(s -> {
          boolean falls = s.id().equals(weak) && s != strong;
          if (falls) {
            strong.reasons.addAll(s.reasons);
            fell.put(weak, strong.id());
          }
          return falls;
        });
      }
    }
    return fell;
  }

  private record Edge(Step first, Step then) {}

  private static Set<Edge> edges(List<Finding> active, Bans bans, Collection<Step> steps) {
    Set<Edge> out = new HashSet<>();
    boolean alarm = active.stream().anyMatch(f -> !Hazards.speaking(f).end() && !Hazards.of(f.hazard()).end() && cuts(f));
    for (Finding f : active) {
      // the leisurely order of a planned end gives way once a hazard asks for an energy cut
      boolean givesWay = alarm && Hazards.of(f.hazard()).end();
      for (Statement s : f.statements()) {
        if (s instanceof Statement.Before b && !givesWay && !holdsUp(b, bans)) {
          link(steps, b.first(), b.then(), out);
        }
      }
    }
    bans.all().forEach(bar -> bar.untils().forEach(until -> link(steps, until, bar.deed(), out)));
    return out;
  }

  /** What itself has to wait never holds back an energy cut. */
  private static boolean holdsUp(Statement.Before b, Bans bans) {
    return Deeds.ids().contains(b.then()) && Deeds.of(b.then()).cut() && bans.waits(b.first());
  }

  private static boolean cuts(Finding f) {
    return f.statements().stream().anyMatch(s -> s instanceof Statement.Propose p && Deeds.of(p.action()).cut());
  }

  private static void link(Collection<Step> steps, String first, String then, Set<Edge> out) {
    for (Step a : steps) {
      for (Step b : steps) {
        if (a != b && a.id().equals(first) && b.id().equals(then)) {
          out.add(new Edge(a, b));
        }
      }
    }
  }

  private Comparator<Step> byLadder() {
    if (walking) {
      return Comparator.<Step>comparingInt(s -> s.id().equals("do-not-start") ? 0 : 1)
          .thenComparingInt(walkRound)
          .thenComparingDouble(s -> s.deed.ladder())
          .thenComparing(Step::id)
          .thenComparing(s -> s.part)
          .thenComparing(s -> s.variants.toString());
    }
    return Comparator.<Step>comparingDouble(s -> s.iff.isEmpty() ? s.deed.ladder() : 8.5 + s.deed.ladder() / 100)
        .thenComparingDouble(timeToHarm)
        .thenComparingInt(walkRound)
        .thenComparing(Step::id)
        .thenComparing(s -> s.part)
        .thenComparing(s -> s.variants.toString());
  }

  /** Kahn's algorithm, always taking the first by the ladder among those that nothing must precede. */
  private List<Step> sort(Collection<Step> steps, Set<Edge> edges, List<String> cycle) {
    Map<Step, Integer> waiting = new HashMap<>();
    Map<Step, List<Step>> followers = new HashMap<>();
    for (Edge e : edges) {
      waiting.merge(e.then(), 1, Integer::sum);
      followers.computeIfAbsent(e.first(), k -> new ArrayList<>()).add(e.then());
    }
    List<Step> left = new ArrayList<>(steps);
    left.sort(byLadder());
    List<Step> out = new ArrayList<>();
    while (!left.isEmpty()) {
      Step next = left.stream().filter(s -> waiting.getOrDefault(s, 0) == 0).findFirst().orElse(null);
      if (next == null) {
        next = left.get(0);
        cycle.add(next.toString());
      }
      left.remove(next);
      out.add(next);
      followers.getOrDefault(next, List.of()).forEach(s -> waiting.merge(s, -1, Integer::sum));
    }
    return out;
  }

  /**
   * A warning or a step back takes no time but must not part the first two equipment steps, nor push the sash out of
   * the first three. First aid stays in front; so does the warning in fire, shock, hammer and spill.
   */
  private static List<Step> placePeople(List<Step> sorted, Set<Edge> edges) {
    List<Step> aside = new ArrayList<>();
    for (Step s : sorted) {
      boolean first = s.deed.ladder() < 1 || s.reasons.stream().anyMatch(f -> Hazards.speaking(f).warnFirst());
      boolean bound = edges.stream().anyMatch(e -> e.first() == s || e.then() == s);
      if (s.deed.personal() && s.deed.ladder() < 2 && !first && !bound) {
        aside.add(s);
      }
    }
    List<Step> rest = new ArrayList<>(sorted);
    rest.removeAll(aside);
    List<Step> equipment = rest.stream().filter(s -> s.deed.equipment()).toList();
    if (aside.isEmpty() || equipment.isEmpty() || !(firstMove(equipment.get(0)) || equipment.get(0).reasons.stream().anyMatch(Hazards::stopClass))) {
      return sorted;
    }
    int keep = equipment.size() > 2 && equipment.get(2).id().equals("sash-down") ? 3 : Math.min(2, equipment.size());
    int place = rest.indexOf(equipment.get(keep - 1)) + 1;
    rest.addAll(place, aside);
    return rest;
  }

  /** An energy cut, or flames put out before it. */
  private static boolean firstMove(Step s) {
    return s.deed.cut() || s.id().equals("flame-out");
  }
}
