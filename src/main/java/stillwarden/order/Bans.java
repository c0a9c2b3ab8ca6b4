package stillwarden.order;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import stillwarden.judge.Finding;
import stillwarden.judge.Statement;

/** What must not be done, or not before something; merged over all findings. */
final class Bans {
  /**
   * One deed that is banned.
   *
   * @param untils everything it waits for; empty: never
   * @param named a rule named it: it is told; what only a group brought is not
   */
  record Bar(String deed, Set<String> untils, boolean named, List<Finding> reasons) {
    /** A plain ban is stronger than one that waits, and of several waits each counts. */
    Bar with(Bar other) {
      Set<String> both = new TreeSet<>(untils);
      both.addAll(other.untils);
      List<Finding> all = new ArrayList<>(reasons);
      all.addAll(other.reasons);
      return new Bar(deed, plain() || other.plain() ? Set.of() : both, named || other.named, List.copyOf(all));
    }

    boolean plain() {
      return untils.isEmpty();
    }

    /** The wait that is told. */
    String until() {
      return untils.stream().findFirst().orElse("");
    }

    Signal signal() {
      return reasons.stream().map(Hazards::signal).reduce(Signal.NOTICE, Signal::worse);
    }
  }

  private final Map<String, Bar> bars = new TreeMap<>();

  static Bans of(List<Finding> active) {
    Bans out = new Bans();
    for (Finding f : active) {
      for (Statement s : f.statements()) {
        if (s instanceof Statement.Forbid ban) {
          Set<String> until = ban.until().isEmpty() ? Set.of() : Set.of(ban.until());
          Deeds.group(ban.deed()).forEach(deed -> out.bars.merge(deed, new Bar(deed, until, ban.deed().equals(deed), List.of(f)), Bar::with));
        }
      }
    }
    return out;
  }

  Collection<Bar> all() {
    return bars.values();
  }

  /** Banned until something else is done or seen. */
  boolean waits(String deed) {
    return bars.containsKey(deed) && !bars.get(deed).plain();
  }

  /** By the gravest signal word behind a ban, then by what the deed itself can do ({@code @deadliest} in rules/groups.yaml). */
  List<Bar> deadliestFirst() {
    List<String> deadliest = Deeds.group("@deadliest");
    List<Bar> out = new ArrayList<>(bars.values());
    out.sort(Comparator.comparing(Bar::signal).reversed()
        .thenComparingInt(b -> deadliest.contains(b.deed()) ? deadliest.indexOf(b.deed()) : deadliest.size())
        .thenComparing(Bar::deed));
    return out;
  }

  /** A wait for a deed that a stronger one has replaced is a wait for the stronger. */
  void replaced(Map<String, String> weakToStrong) {
    bars.replaceAll((deed, bar) -> {
      Set<String> untils = new TreeSet<>();
      bar.untils().forEach(u -> untils.add(weakToStrong.getOrDefault(u, u)));
      return new Bar(deed, untils, bar.named(), bar.reasons());
    });
  }

  /**
   * A ban that waits for a deed which cannot be done here waits for what stands in for that deed; so the deed behind it is
   * not lost: a refill behind a heater that cannot move waits until it is quiet, and a sash waits for nothing.
   */
  void waitForWhatIsPossible(Collection<Step> steps) {
    for (Bar bar : List.copyOf(bars.values())) {
      if (bar.plain()) {
        continue;
      }
      Set<String> untils = new TreeSet<>();
      bar.untils().forEach(u -> wait(bar.deed(), u, steps).ifPresent(untils::add));
      if (untils.isEmpty()) {
        bars.remove(bar.deed());
      } else {
        bars.put(bar.deed(), new Bar(bar.deed(), untils, bar.named(), bar.reasons()));
      }
    }
  }

  private Optional<String> wait(String deed, String until, Collection<Step> steps) {
    if (!Deeds.ids().contains(until) || possible(until, steps)) {
      return Optional.of(until);
    }
    if (Deeds.ids().contains(deed) && Deeds.of(deed).neverLost()) {
      return Optional.empty();
    }
    return Optional.of(Deeds.of(until).orElse().stream().filter(d -> possible(d, steps)).findFirst().orElse(until));
  }

  private boolean possible(String deed, Collection<Step> steps) {
    boolean never = bars.containsKey(deed) && bars.get(deed).plain();
    return !never && steps.stream().anyMatch(s -> s.id().equals(deed));
  }

  /** Until nothing more falls: a deed that waits for a barred one is barred too. */
  void removeFrom(Map<String, Step> steps) {
    int before;
    do {
      before = steps.size();
      List<Step> now = List.copyOf(steps.values());
      steps.values().removeIf(s -> barred(s, now));
    } while (steps.size() < before);
  }

  private boolean barred(Step s, Collection<Step> all) {
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
}
