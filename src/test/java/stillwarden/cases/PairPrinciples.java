package stillwarden.cases;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import stillwarden.derive.Situation;
import stillwarden.order.Advice;

/** What must hold whatever two faults come together. */
final class PairPrinciples {
  // before the energy cut: flames where vapour is out, a falling flask, a dipping tip when the power is already gone
  private static final Set<String> MAY_LEAD = Set.of("flame-out", "support-load");
  private static final Set<String> INTO_THE_FLASK = Set.of("feed-slow", "refill-reservoir", "unstopper-reservoir", "swap-receiver", "reseat-cold", "take-apart-cold", "draw-off-cold");
  private static final Set<String> WAITS = Set.of("wait-quiet", "let-cool");
  private static final List<String[]> AGAINST = List.of(
      new String[] {"close-feed", "feed-slow"}, new String[] {"coolant-keep", "coolant-leave-off"}, new String[] {"coolant-raise", "coolant-stop"},
      new String[] {"leave-feed", "close-feed"}, new String[] {"hold-heat", "cut-power"}, new String[] {"refill-reservoir", "leave-feed"},
      new String[] {"coolant-keep", "coolant-stop"}, new String[] {"coolant-start-slow", "coolant-leave-off"}, new String[] {"coolant-keep", "close-water"},
      new String[] {"continue", "cut-power"}, new String[] {"coolant-raise", "coolant-leave-off"}, new String[] {"coolant-raise", "close-water"}, new String[] {"coolant-start-slow", "close-water"});

  private PairPrinciples() {}

  static List<String> broken(PairsTest.Judged a, PairsTest.Judged b, PairsTest.Judged both) {
    List<String> out = new ArrayList<>();
    calmer(a.advice(), b.advice(), both.advice(), out);
    cutFirst(a.advice(), b.advice(), both, out);
    bans(both.advice(), out);
    tip(both, out);
    closed(both, out);
    away(both, out);
    contradictions(both.advice(), out);
    if (both.advice().actions().stream().filter(x -> x.state().equals("due")).count() > 7) {
      out.add("cap: more than seven due");
    }
    return out;
  }

  private static void calmer(Advice a, Advice b, Advice both, List<String> out) {
    if (Told.loudness(both) < Math.max(Told.loudness(a), Told.loudness(b))) {
      out.add("signal: " + Told.signal(a) + " and " + Told.signal(b) + " give " + Told.signal(both));
    }
    if (Told.gravity(both) < Math.max(Told.gravity(a), Told.gravity(b))) {
      out.add("verdict: " + a.verdict() + " and " + b.verdict() + " give " + both.verdict());
    }
  }

  private static void cutFirst(Advice a, Advice b, PairsTest.Judged both, List<String> out) {
    boolean wanted = cuts(a, both.facts()) || cuts(b, both.facts());
    if (wanted && !cuts(both.advice(), both.facts())) {
      out.add("cut first: was " + Told.deeds(both.advice()));
    }
  }

  /** The first equipment step is an energy cut, due or done. */
  private static boolean cuts(Advice a, Situation s) {
    return Told.deeds(a).stream().filter(Told::equipment).filter(d -> !MAY_LEAD.contains(d) && !(d.equals("lower-receiver") && s.is("power", "lost")))
        .findFirst().filter(Told::cut).isPresent();
  }

  private static void bans(Advice a, List<String> out) {
    a.doNot().stream().filter(x -> x.until().isEmpty() && Told.deeds(a).contains(x.act())).forEach(x -> out.add("banned: " + x.act()));
    a.doNot().stream().filter(x -> !x.until().isEmpty() && Told.deeds(a).contains(x.act()) && !Told.behind(a, x.act(), x.until())).forEach(x -> out.add("not behind: " + x.act() + " until " + x.until()));
  }

  private static void tip(PairsTest.Judged j, List<String> out) {
    List<String> deeds = Told.deeds(j.advice());
    Situation s = j.facts();
    boolean dips = s.is("tip", "under-liquid") && s.is("path", "open") && s.is("tip-can-be-cleared", "yes") && s.is("receiver-in-vapour", "no");
    int heater = deeds.indexOf("lower-heat");
    int receiver = deeds.indexOf("lower-receiver");
    if (dips && heater >= 0 && (receiver < 0 || receiver > heater)) {
      out.add("tip: " + deeds);
    }
  }

  private static void closed(PairsTest.Judged j, List<String> out) {
    if (!j.facts().is("path", "closed") || !j.facts().is("live", "yes")) {
      return;
    }
    List<String> deeds = Told.deeds(j.advice());
    for (int i = 0; i < deeds.size(); i++) {
      if (INTO_THE_FLASK.contains(deeds.get(i)) && deeds.subList(0, i).stream().noneMatch(WAITS::contains)) {
        out.add("closed: " + deeds.get(i) + " in " + deeds);
      }
    }
    List<String> three = deeds.stream().filter(d -> Told.equipment(d) && !MAY_LEAD.contains(d)).limit(3).toList();
    if (!three.contains("sash-down") && !j.facts().is("attendance", "nobody") && !leaves(j.facts())) {
      out.add("sash: " + deeds);
    }
  }

  private static boolean leaves(Situation s) {
    return s.is("fire", "spreading") || s.is("fire", "clothing") || s.is("toxic-release", "yes") || hurt(s);
  }

  private static boolean hurt(Situation s) {
    return s.signs().stream().anyMatch(x -> x.about().equals("injury") && x.isActive() && !x.value().equals("no"));
  }

  /** Fire, poison out, somebody hurt: nothing for hands at the rig. */
  private static void away(PairsTest.Judged j, List<String> out) {
    Situation s = j.facts();
    boolean fire = List.of("small", "spreading", "clothing").stream().anyMatch(v -> s.is("fire", v));
    boolean hot = s.is("glass-hot", "yes");
    if (fire || hot && (s.is("toxic-release", "yes") || hurt(s))) {
      Told.deeds(j.advice()).stream().filter(GROUPS.get("@rig-side")::contains).filter(d -> !(fire && d.equals("smother"))).forEach(d -> out.add("away: " + d + " in " + Told.deeds(j.advice())));
    }
  }

  private static void contradictions(Advice a, List<String> out) {
    for (String[] two : AGAINST) {
      int first = due(a, two[0]);
      int then = due(a, two[1]);
      boolean apart = first < 0 || then < 0 || Told.deeds(a).subList(Math.min(first, then), Math.max(first, then)).stream().anyMatch(d -> WAITS.contains(d) || d.equals("refill-reservoir"));
      if (!apart) {
        out.add("against: " + two[0] + " and " + two[1] + " in " + Told.deeds(a));
      }
    }
  }

  private static int due(Advice a, String deed) {
    int i = Told.deeds(a).indexOf(deed);
    return i >= 0 && a.actions().get(i).iff().isEmpty() ? i : -1;
  }

  private static final Map<String, List<String>> GROUPS = groups();

  @SuppressWarnings("unchecked")
  private static Map<String, List<String>> groups() {
    try {
      return CaseFile.YAML.readValue(Files.readString(Path.of("rules", "groups.yaml")), Map.class);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
