package stillwarden.order;

import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.derive.Standing;
import stillwarden.describe.Knowledge;
import stillwarden.judge.Finding;
import stillwarden.judge.Statement;

/**
 * What to look at: first what could hide a DANGER or a stop-class WARNING, by how many of them one answer excludes;
 * then in walk-round order.
 */
final class Questions {
  private static final int MOST_IN_RUN = 3;

  private static final class Asked {
    final Set<String> unlocks = new TreeSet<>();
    final Set<String> grave = new TreeSet<>();
    boolean counted;
  }

  private final Situation situation;
  private final Map<String, Asked> asked = new LinkedHashMap<>();

  Questions(Situation situation) {
    this.situation = situation;
  }

  /** What a line that could not be read seems to have been about is looked at again. */
  Questions again(List<String> abouts) {
    abouts.stream().filter(a -> Knowledge.section("words").get("log").get("saw").has(a)).forEach(a -> asked.computeIfAbsent(a, k -> new Asked()));
    return this;
  }

  List<Advice.Question> of(List<Finding> findings, boolean all) {
    boolean setup = situation.time().stage().equals("setting-up");
    for (Finding f : findings) {
      if (!Hazards.of(f.hazard()).principle() && (setup || relevant(f))) {
        f.facts().stream().filter(s -> s.standing() != Standing.SEEN).forEach(s -> ask(s, f));
        f.statements().stream().filter(s -> s instanceof Statement.Ask && f.isActive()).forEach(s -> note(((Statement.Ask) s).about(), f));
      }
    }
    overdueLooks();
    partsBeforeTheirKeys();
    if (setup && situation.rig().method().isEmpty()) {
      asked.computeIfAbsent("method", k -> new Asked()).grave.add("method");
    }
    List<Map.Entry<String, Asked>> sorted = new ArrayList<>(asked.entrySet());
    sorted.sort(Comparator.<Map.Entry<String, Asked>>comparingInt(e -> e.getValue().grave.isEmpty() ? 1 : 0)
        .thenComparingInt(e -> -e.getValue().grave.size())
        .thenComparingInt(e -> Walk.place(situation, e.getKey()))
        .thenComparing(Map.Entry::getKey));
    return sorted.stream().limit(all ? Long.MAX_VALUE : MOST_IN_RUN).map(e -> question(e.getKey(), e.getValue(), setup)).toList();
  }

  /** In a run a NOTICE asks for nothing. */
  private static boolean relevant(Finding f) {
    return Hazards.signal(f) != Signal.NOTICE;
  }

  private void ask(Sign s, Finding f) {
    s.looks().forEach(l -> note(l, f));
  }

  private void note(String about, Finding f) {
    Asked a = asked.computeIfAbsent(about, k -> new Asked());
    a.unlocks.add(f.hazard());
    if (Hazards.stopClass(f) || setupGrave(f)) {
      a.grave.add(f.hazard());
    }
    a.counted |= f.isActive();
  }

  private static boolean setupGrave(Finding f) {
    return Hazards.signal(f) == Signal.DANGER;
  }

  /** Whether there is a part at all is asked before anything about it. */
  private void partsBeforeTheirKeys() {
    for (String about : List.copyOf(asked.keySet())) {
      int dot = about.indexOf('.');
      String part = dot < 0 ? "" : about.substring(0, dot);
      Asked kind = asked.get(part + ".kind");
      if (kind != null && !about.endsWith(".kind")) {
        kind.grave.addAll(asked.get(about).grave);
        kind.unlocks.addAll(asked.get(about).unlocks);
      }
    }
  }

  private void overdueLooks() {
    if (situation.time().live()) {
      for (Sign s : situation.signs()) {
        if (s.standing() == Standing.COUNTED && Knowledge.section("words").get("log").get("saw").has(first(s.looks()))) {
          asked.computeIfAbsent(first(s.looks()), k -> new Asked()).counted = true;
        }
      }
    }
  }

  private static String first(List<String> looks) {
    return looks.isEmpty() ? "" : looks.get(0);
  }

  private Advice.Question question(String about, Asked a, boolean setup) {
    Optional<Duration> within = setup ? Optional.empty() : Optional.of(a.grave.isEmpty() ? Duration.ofMinutes(5) : Duration.ofMinutes(2));
    String key = Walk.byRole(situation, about);
    return new Advice.Question(about, Walk.say(situation, about, key), within, List.copyOf(a.unlocks), Wording.english().station(key));
  }
}
