package stillwarden.proof;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeMap;
import java.util.TreeSet;
import stillwarden.rulebook.Rulebook;
import stillwarden.rulebook.Rulebook.Condition;
import stillwarden.rulebook.Rulebook.Rule;

/**
 * The states that the rules can tell apart: every word that a condition names, with every value it can have. What
 * physics and the sign makers tie together (no vapour without heat-up, no flow without vapour) is drawn together.
 */
final class StateSpace {
  /** Drawn first and together; where a rule asks for one of them, states are drawn until it holds. */
  private static final Set<String> CORE = Set.of(
      "stage", "live", "heat", "vapour", "glass-hot", "power", "stopped-uncleared", "end-decided", "path", "pressure-evident", "pressure-gone",
      "last-opening", "reservoir-is-relief", "receiver-in-vapour", "vapour-out", "vapour-seen-out", "level-and-path", "flask-level", "heater-live-wet", "heater-wet",
      "heater-proven-dead", "flow", "drip-overdue", "crystals", "coolant-watch", "toxic-release", "charge-toxic", "refill-in-time", "attendance",
      "setup-fault", "permits.fixed-heater", "heater-lowers", "heater-kind");

  /** Told when they happen, and silent otherwise. */
  private final Set<String> events = new TreeSet<>();
  /** What the makers always know. */
  private static final Set<String> ALWAYS_KNOWN = Set.of(
      "switch", "reservoir-is-relief", "last-opening", "feed-slug", "feed-expected-dip", "leak-suspected", "boil-quenched", "warm-up-overdue", "end-overdue",
      "readings-disagree", "head-fell", "head-high", "superheated", "receiver-closes-vent", "exposed", "feeding", "handover", "target-reached", "period-over",
      "oil-stopped-rising", "distillate-clear", "over-check", "joint-leaks", "glass-failing", "sealed-warm", "taken-apart-hot", "heater-ignores-dial",
      "probe-lost", "coolant-outlet-hot", "distillate-hot", "injury-reach", "hood-needed", "permits.unattended", "permits.smothering",
      "permits.plant-as-boiling-aid", "permits.held-off-coolant", "barometer-conflict", "pressure-known");

  final Map<String, List<String>> domains = new TreeMap<>();
  final List<Rule> rules;

  StateSpace(Rulebook book) {
    rules = book.rules();
    Map<String, List<String>> all = Rulebook.domains();
    rules.forEach(r -> r.conditions().stream().filter(c -> !c.finding()).forEach(c -> domains.put(c.about(), all.get(c.about()))));
    Map<?, ?> saw = (Map<?, ?>) Rulebook.yaml("rules/words/log.yaml").get("saw");
    Set<String> derived = Rulebook.yaml("rules/words/signs.yaml").keySet();
    domains.keySet().stream().filter(a -> !derived.contains(a) && saw.get(a) instanceof Map<?, ?> m && "event".equals(m.get("kind"))).forEach(events::add);
  }

  /** A full state near the last one: two in three keep most of their words, which costs the engine less. */
  State step(State last, SplittableRandom r) {
    if (last == null || r.nextInt(40) == 0) {
      return draw(r);
    }
    Rule rule = rules.get(r.nextInt(rules.size()));
    Map<String, String> wanted = r.nextInt(3) > 0 ? wanted(rule, r) : Map.of();
    double odd = new double[] {0.05, 0.15, 0.4}[r.nextInt(3)];
    State s = last.copy();
    if (r.nextInt(6) == 0 || !holds(s, wanted)) {
      State c = suiting(r, odd, wanted);
      CORE.forEach(s::absent);
      s.known.putAll(c.known);
    }
    List<String> words = List.copyOf(domains.keySet());
    for (int i = 0; i < 8; i++) {
      String about = words.get(r.nextInt(words.size()));
      if (!CORE.contains(about)) {
        s.absent(about);
        free(s, about, r, odd);
      }
    }
    force(s, wanted, r);
    tie(s);
    return s;
  }

  private State suiting(SplittableRandom r, double odd, Map<String, String> wanted) {
    State s = core(r, odd, wanted);
    for (int i = 0; i < 300 && !holds(s, wanted); i++) {
      s = core(r, i > 20 ? 0.4 : odd, wanted);
    }
    return s;
  }

  State draw(SplittableRandom r) {
    Map<String, String> wanted = r.nextInt(3) > 0 ? wanted(rules.get(r.nextInt(rules.size())), r) : Map.of();
    double odd = new double[] {0.01, 0.05, 0.15, 0.4}[r.nextInt(4)];
    State s = suiting(r, odd, wanted);
    boolean goodSetUp = r.nextBoolean();
    for (String about : domains.keySet()) {
      if (!CORE.contains(about)) {
        free(s, about, r, goodSetUp && about.contains(".") ? 0 : odd);
      }
    }
    force(s, wanted, r);
    tie(s);
    return s;
  }

  private static void force(State s, Map<String, String> wanted, SplittableRandom r) {
    for (Map.Entry<String, String> w : wanted.entrySet()) {
      if (!CORE.contains(w.getKey())) {
        if (r.nextInt(5) == 0) {
          s.counted(w.getKey(), w.getValue());
        } else {
          s.seen(w.getKey(), w.getValue());
        }
      }
    }
  }

  private static Map<String, String> wanted(Rule rule, SplittableRandom r) {
    Map<String, String> out = new HashMap<>();
    for (Condition c : rule.conditions()) {
      if (!c.finding()) {
        out.put(c.about(), c.values().get(r.nextInt(c.values().size())));
      }
    }
    return out;
  }

  private static boolean holds(State s, Map<String, String> wanted) {
    return wanted.entrySet().stream().allMatch(w -> !CORE.contains(w.getKey()) || s.is(w.getKey(), w.getValue()));
  }

  private void free(State s, String about, SplittableRandom r, double odd) {
    List<String> domain = domains.get(about);
    if (events.contains(about)) {
      if (r.nextDouble() < odd) {
        eventful(s, about, domain, r);
      }
    } else if (r.nextDouble() >= odd) {
      s.seen(about, domain.get(0));
    } else {
      int how = r.nextInt(ALWAYS_KNOWN.contains(about) ? 3 : 5);
      if (how < 3) {
        s.seen(about, domain.get(r.nextInt(domain.size())));
      } else if (how == 3) {
        s.counted(about, domain.get(r.nextInt(domain.size())));
      } else {
        s.possible(about);
      }
    }
  }

  private static void eventful(State s, String about, List<String> domain, SplittableRandom r) {
    if (r.nextInt(6) == 0) {
      s.counted(about, domain.get(domain.size() - 1));
    } else {
      s.seen(about, domain.get(r.nextInt(domain.size())));
    }
  }

  private State core(SplittableRandom r, double odd, Map<String, String> wanted) {
    State s = new State(domains);
    run(s, r, odd);
    boolean live = s.live();
    way(s, r, Math.max(odd, 0.05), live);
    water(s, r, odd);
    heater(s, r, odd, live);
    String toxic = s.is("glass-hot", "yes") && r.nextDouble() < odd / 2 ? "yes" : "no";
    s.seen("toxic-release", toxic);
    s.seen("charge-toxic", toxic.equals("yes") || r.nextDouble() < odd / 2 ? "yes" : "no");
    s.seen("attendance", live && r.nextDouble() < odd ? pick(r, "overdue", "nobody") : "present");
    s.seen("setup-fault", live && r.nextDouble() < odd ? pick(r, "mild", "grave") : "none");
    s.seen("permits.fixed-heater", pick(r, "no", "yes"));
    return s;
  }

  private static void run(State s, SplittableRandom r, double odd) {
    int d = r.nextInt(100);
    String stage = d < 6 ? "setting-up" : d < 26 ? "heating" : d < 72 ? "running" : d < 86 ? "stopping" : d < 94 ? "cooling" : d < 97 ? "work-up" : "closed";
    boolean live = Set.of("heating", "running", "stopping").contains(stage);
    boolean cut = Set.of("stopping", "cooling", "work-up").contains(stage);
    String power = cut && r.nextDouble() < 0.3 ? pick(r, "lost", "back") : "present";
    s.seen("stage", stage);
    s.seen("live", live ? "yes" : "no");
    s.seen("power", power);
    if (live && cut && power.equals("back") && r.nextBoolean()) {
      s.counted("heat", "on");
    } else {
      s.seen("heat", live && !cut ? "on" : "off");
    }
    s.seen("vapour", stage.equals("running") || live && r.nextInt(3) > 0 ? "yes" : "no");
    s.seen("glass-hot", live || stage.equals("cooling") ? "yes" : "no");
    s.seen("stopped-uncleared", cut && (!power.equals("present") || r.nextBoolean()) ? "yes" : "no");
    s.seen("end-decided", cut && r.nextInt(3) == 0 ? "yes" : "no");
  }

  private static void way(State s, SplittableRandom r, double odd, boolean live) {
    double d = r.nextDouble();
    if (d >= 2 * odd && d >= 0.3) {
      s.seen("path", "open");
    } else {
      int how = r.nextInt(live ? 7 : 5);
      if (how < 3) {
        s.seen("path", "closed");
      } else if (how == 3) {
        s.possible("path");
      } else if (how == 4) {
        s.seen("path", "open");
      } else {
        s.counted("path", how == 5 ? "closed" : "not-proven");
      }
    }
    boolean open = s.is("path", "open");
    s.seen("pressure-evident", s.is("glass-hot", "yes") && r.nextDouble() < (open ? odd / 4 : 0.3) ? "yes" : "no");
    s.seen("pressure-gone", s.is("heat", "off") && s.is("pressure-evident", "no") && r.nextBoolean() ? "yes" : "no");
    s.seen("last-opening", !open && r.nextBoolean() ? "yes" : "no");
    s.seen("reservoir-is-relief", !open && r.nextInt(3) == 0 ? "yes" : "no");
    boolean vapour = s.is("vapour", "yes");
    out(s, r, odd, vapour);
    flow(s, r, odd, vapour);
  }

  private static void out(State s, SplittableRandom r, double odd, boolean vapour) {
    if (!vapour || r.nextDouble() >= odd) {
      s.seen("vapour-out", "none");
    } else {
      int how = r.nextInt(5);
      if (how < 3) {
        s.seen("vapour-out", pick(r, "wisps", "plume"));
      } else if (how == 3) {
        s.counted("vapour-out", "wisps");
      } else {
        s.possible("vapour-out");
      }
    }
    s.seen("vapour-seen-out", s.seenAs("vapour-out", "wisps", "plume") ? "yes" : "no");
    boolean there = s.is("vapour-out", "wisps", "plume") || vapour && r.nextDouble() < odd / 6;
    s.seen("receiver-in-vapour", there ? "yes" : "no");
  }

  private static void flow(State s, SplittableRandom r, double odd, boolean vapour) {
    if (vapour) {
      if (s.is("path", "closed")) {
        s.seen("flow", pick(r, "none", "none", "slowing", "drops"));
      } else if (r.nextDouble() < odd) {
        s.seen("flow", pick(r, "stream", "slugs", "slowing", "none"));
      } else {
        s.seen("flow", "drops");
      }
    }
    s.seen("drip-overdue", vapour && s.is("flow", "none") && r.nextBoolean() ? "yes" : "no");
    if (vapour && r.nextDouble() < odd) {
      s.seen("crystals", s.is("path", "open") ? pick(r, "film", "growing") : pick(r, "film", "growing", "blocking"));
    } else if (vapour && r.nextDouble() < odd / 2) {
      s.possible("crystals");
    } else {
      s.seen("crystals", "none");
    }
    boolean solid = s.is("crystals", "film", "growing");
    s.seen("coolant-watch", solid ? pick(r, "normal", "normal", "melting", "failed") : s.is("crystals", "none") && vapour && r.nextDouble() < odd ? "melted" : "normal");
  }

  private static void water(State s, SplittableRandom r, double odd) {
    if (r.nextDouble() >= odd) {
      s.seen("flask-level", pick(r, "ok", "ok", "full"));
    } else {
      int how = r.nextInt(6);
      if (how < 4) {
        s.seen("flask-level", pick(r, "low", "nearly-dry", "dry"));
      } else if (how == 4) {
        s.counted("flask-level", pick(r, "low", "dry"));
      } else {
        s.possible("flask-level");
      }
    }
    boolean good = s.seenAs("flask-level", "full", "ok") && s.seenAs("path", "open");
    s.seen("level-and-path", good ? "good" : "in-doubt");
    s.seen("refill-in-time", s.seenAs("flask-level", "full", "ok", "low") && r.nextBoolean() ? "yes" : "no");
  }

  private static void heater(State s, SplittableRandom r, double odd, boolean live) {
    s.seen("heater-kind", r.nextDouble() < Math.max(odd, 0.06) ? pick(r, "bath", "burner") : "electric");
    if (r.nextDouble() >= odd) {
      s.seen("heater-lowers", pick(r, "one-motion", "winding"));
    } else if (live && r.nextBoolean()) {
      s.counted("heater-lowers", "no");
    } else {
      s.seen("heater-lowers", "no");
    }
    if (s.is("heater-kind", "burner")) {
      s.seen("heater-lowers", "no");
    }
    if (r.nextDouble() < odd / 2) {
      s.seen("heater-wet", pick(r, "no", "water", "oil", "solvent"));
    }
    s.seen("heater-proven-dead", s.is("heat", "off") && r.nextInt(3) == 0 ? "yes" : "no");
    boolean wet = s.is("heater-wet", "water", "oil", "solvent") && !s.is("heater-kind", "burner");
    s.seen("heater-live-wet", wet && s.is("heater-proven-dead", "no") ? "yes" : "no");
  }

  /** What the makers work out from other words. */
  private static void tie(State s) {
    if (s.is("coolant", "running", "low") && s.is("jacket", "empty-hot", "empty-cool")) {
      s.seen("jacket", "full-cool");
    }
    boolean plug = s.is("vapour", "yes") && s.is("flow", "none") && s.is("crystals", "film", "growing", "blocking");
    if (plug || s.is("receiver-closes-vent", "yes")) {
      s.seen("path", "closed");
      s.seen("level-and-path", "in-doubt");
    }
    if (s.is("joint-apart", "yes") && s.is("path", "closed")) {
      s.absent("joint-apart");
    }
    if (s.is("path", "open") && s.known.containsKey("last-opening")) {
      s.seen("last-opening", "no");
    }
    if (!s.live()) {
      s.seen("over-check", "no");
    }
    if (s.known.containsKey("tip") && s.live() && s.value("tip").isEmpty()) {
      s.counted("tip", "under-liquid");
    }
    if (s.known.containsKey("tip-can-be-cleared") && s.live() && s.value("tip-can-be-cleared").isEmpty()) {
      s.counted("tip-can-be-cleared", "no");
    }
    if (s.known.containsKey("flame-near") && s.is("vapour-out", "wisps", "plume") && s.value("flame-near").isEmpty()) {
      s.counted("flame-near", "yes");
    }
  }

  private static String pick(SplittableRandom r, String... words) {
    return words[r.nextInt(words.length)];
  }
}
