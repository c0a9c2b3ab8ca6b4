package stillwarden.order;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.function.ToDoubleFunction;
import java.util.function.ToIntFunction;
import stillwarden.judge.Finding;
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
  record Plan(List<Step> steps, List<Bar> bans, List<String> cycle) {}

  /**
   * A deed that must not be done, or not before something.
   *
   * @param untils everything it waits for; empty: never
   */
  record Bar(String deed, Set<String> untils, boolean named, List<Finding> reasons) {
    boolean plain() {
      return untils.isEmpty();
    }

    /** The one that is told. */
    String until() {
      return untils.stream().findFirst().orElse("");
    }

    Bar waitingFor(Set<String> others) {
      return new Bar(deed, others, named, reasons);
    }

    Signal signal() {
      return reasons.stream().map(Hazards::signal).reduce(Signal.NOTICE, Signal::worse);
    }

    /** A plain ban is stronger than one that waits, and of several waits each counts; what a rule named is told, what only a group brought is not. */
    Bar with(Bar other) {
      Set<String> both = new TreeSet<>(untils);
      both.addAll(other.untils);
      return new Bar(deed, plain() || other.plain() ? Set.of() : both, named || other.named, joined(reasons, other.reasons));
    }
  }

  private final ToDoubleFunction<Step> timeToHarm;
  private final ToIntFunction<Step> walkRound;

  private final boolean walking;

  /** @param walking an inspection: in walk-round order, for nothing is hot yet */
  Arrange(ToDoubleFunction<Step> timeToHarm, ToIntFunction<Step> walkRound, boolean walking) {
    this.timeToHarm = timeToHarm;
    this.walkRound = walkRound;
    this.walking = walking;
  }

  Plan arrange(List<Finding> active) {
    Map<String, Step> steps = merged(active);
    Map<String, Bar> bars = bars(active);
    // first the bans: a barred deed must not take a weaker one with it; then again, for what waited for the weaker one
    barWaitingForTheImpossible(bars, steps.values());
    bar(steps, bars);
    replaceWeaker(steps);
    barWaitingForTheImpossible(bars, steps.values());
    bar(steps, bars);
    Set<Edge> edges = edges(active, bars, steps.values());
    List<String> cycle = new ArrayList<>();
    List<Step> sorted = sort(steps.values(), edges, cycle);
    return new Plan(placePeople(sorted, edges), deadliestFirst(bars.values()), cycle);
  }

  private static Map<String, Bar> bars(List<Finding> active) {
    Map<String, Bar> out = new TreeMap<>();
    for (Finding f : active) {
      for (Statement s : f.statements()) {
        if (s instanceof Statement.Forbid ban) {
          Deeds.group(ban.deed()).forEach(deed -> out.merge(deed, new Bar(deed, ban.until().isEmpty() ? Set.of() : Set.of(ban.until()), ban.deed().equals(deed), List.of(f)), Bar::with));
        }
      }
    }
    return out;
  }

  /** By the gravest signal word behind a ban, then by what the deed itself can do ({@code @deadliest} in rules/groups.yaml). */
  private static List<Bar> deadliestFirst(Collection<Bar> bars) {
    List<String> deadliest = Deeds.group("@deadliest");
    List<Bar> out = new ArrayList<>(bars);
    out.sort(Comparator.comparing(Bar::signal).reversed()
        .thenComparingInt(b -> deadliest.contains(b.deed()) ? deadliest.indexOf(b.deed()) : deadliest.size())
        .thenComparing(Bar::deed));
    return out;
  }

  /**
   * A ban that waits for a deed which cannot be done here waits for what stands in for that deed; so the deed behind it is
   * not lost: a refill behind a heater that cannot move waits until it is quiet, and a sash waits for nothing.
   */
  private static void barWaitingForTheImpossible(Map<String, Bar> bars, Collection<Step> steps) {
    bars.values().removeIf(b -> neverLost(b) && !b.plain() && b.untils().stream().allMatch(u -> inVain(u, bars, steps)));
    bars.replaceAll((deed, bar) -> bar.plain() ? bar : bar.waitingFor(waits(bar, bars, steps)));
  }

  private static boolean neverLost(Bar bar) {
    return Deeds.ids().contains(bar.deed()) && Deeds.of(bar.deed()).neverLost();
  }

  private static boolean inVain(String until, Map<String, Bar> bars, Collection<Step> steps) {
    return Deeds.ids().contains(until) && !possible(until, bars, steps);
  }

  private static Set<String> waits(Bar bar, Map<String, Bar> bars, Collection<Step> steps) {
    Set<String> out = new TreeSet<>();
    for (String until : bar.untils()) {
      if (!inVain(until, bars, steps)) {
        out.add(until);
      } else if (!neverLost(bar)) {
        out.add(Deeds.of(until).orElse().stream().filter(d -> possible(d, bars, steps)).findFirst().orElse(until));
      }
    }
    return out;
  }

  private static boolean possible(String deed, Map<String, Bar> bars, Collection<Step> steps) {
    boolean never = bars.containsKey(deed) && bars.get(deed).plain();
    return !never && steps.stream().anyMatch(s -> s.id().equals(deed));
  }

  /** Until nothing more falls: a deed that waits for a barred one is barred too. */
  private static void bar(Map<String, Step> steps, Map<String, Bar> bars) {
    int before;
    do {
      before = steps.size();
      List<Step> now = List.copyOf(steps.values());
      steps.values().removeIf(s -> barred(s, bars, now));
    } while (steps.size() < before);
  }

  private static List<Finding> joined(List<Finding> a, List<Finding> b) {
    List<Finding> out = new ArrayList<>(a);
    out.addAll(b);
    return List.copyOf(out);
  }

  private static Map<String, Step> merged(List<Finding> active) {
    Map<String, Step> out = new LinkedHashMap<>();
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

  /** Weaker deeds fall away; why they were wanted counts for whatever outdoes them, however long the chain. */
  private static void replaceWeaker(Map<String, Step> steps) {
    Map<Step, List<Finding>> own = new HashMap<>();
    steps.values().forEach(s -> own.put(s, List.copyOf(s.reasons)));
    Set<Step> fallen = new HashSet<>();
    for (Step strong : steps.values()) {
      Set<Step> weaker = new LinkedHashSet<>();
      outdone(strong, steps.values(), weaker);
      weaker.remove(strong);
      weaker.forEach(w -> strong.reasons.addAll(own.get(w)));
      fallen.addAll(weaker);
    }
    steps.values().removeAll(fallen);
  }

  private static void outdone(Step strong, Collection<Step> all, Set<Step> out) {
    for (Step s : all) {
      if (strong.deed.replaces().contains(s.id()) && out.add(s)) {
        outdone(s, all, out);
      }
    }
  }

  private static boolean barred(Step s, Map<String, Bar> bars, Collection<Step> all) {
    Bar bar = bars.get(s.id());
    if (bar == null) {
      return false;
    }
    if (bar.plain()) {
      return true;
    }
    for (String until : bar.untils()) {
      if (!Deeds.ids().contains(until)) {
        s.iff = until;
      } else if (all.stream().noneMatch(o -> o.id().equals(until))) {
        return true;
      }
    }
    return false;
  }

  private record Edge(Step first, Step then) {}

  private static Set<Edge> edges(List<Finding> active, Map<String, Bar> bars, Collection<Step> steps) {
    Set<Edge> out = new HashSet<>();
    boolean alarm = active.stream().anyMatch(f -> !Hazards.speaking(f).end() && !Hazards.of(f.hazard()).end() && cuts(f));
    for (Finding f : active) {
      // the leisurely order of a planned end gives way once a hazard asks for an energy cut
      boolean givesWay = alarm && Hazards.of(f.hazard()).end();
      for (Statement s : f.statements()) {
        if (s instanceof Statement.Before b && !givesWay) {
          link(steps, b.first(), b.then(), out);
        }
      }
    }
    for (Bar bar : bars.values()) {
      bar.untils().forEach(until -> link(steps, until, bar.deed(), out));
    }
    return out;
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
    if (aside.isEmpty() || equipment.isEmpty() || !firstMove(equipment.get(0))) {
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
