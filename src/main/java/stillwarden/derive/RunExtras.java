package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import stillwarden.describe.Entry;

/** More signs of a run: what fails, what is sealed or opened too soon, what a look at two things together says. */
final class RunExtras {
  private static final Duration LOOK_TIME = Duration.ofSeconds(30);

  private final Scene scene;
  private final SignSet out;

  RunExtras(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    glassFailing();
    sealed("sealed-warm", "seal");
    sealed("taken-apart-hot", "take-apart");
    dripOverdue();
    ignoresDial();
    probe();
    superheated();
    hotDistillate();
    levelAndPath();
    headReading();
    tapAndStopper();
    backflow();
    jointLeaks();
    exposed();
    injuryReach();
    stirrer();
  }

  /** A stirrer that is the boiling aid and that nobody has looked at may stand still. */
  private void stirrer() {
    if (scene.is(Role.FLASK, "boiling-aid", "stirrer") && scene.run().saw("stirrer").isEmpty() && scene.live()) {
      out.possible("stirrer", "", List.of("turning", "stopped"), "nobody has looked at the stirrer", List.of("stirrer"));
    }
  }

  private boolean active(String about, String... values) {
    return out.all().stream().anyMatch(s -> s.about().equals(about) && s.isActive() && List.of(values).contains(s.value()));
  }

  private void glassFailing() {
    Map<String, Entry> last = new LinkedHashMap<>();
    for (Entry e : scene.run().entries()) {
      boolean tells = Set.of("crack", "leak-under").contains(e.id()) || e.id().equals("noise") && e.text().equals("ping");
      if (tells) {
        if (e.id().equals("crack")) {
          // whoever looks for the crack answers the ping
          last.values().removeIf(x -> x.id().equals("noise"));
        }
        last.put(e.part(), e);
      }
    }
    for (Entry e : last.values()) {
      if (e.id().equals("noise")) {
        out.counted("glass-failing", "yes", scene.told(e) + ": counts as a crack until the glass is looked at", "crack");
      } else if (!e.text().equals("no")) {
        out.seen("glass-failing", e.part(), "yes", scene.told(e), e.at(), "crack");
      }
    }
  }

  private void sealed(String about, String deed) {
    for (Entry e : scene.run().did(deed)) {
      boolean hot = hotAt(e);
      boolean ofReceiver = deed.equals("take-apart") && scene.roles().of(e.part()).filter(r -> r == Role.RECEIVER).isPresent();
      boolean opened = deed.equals("seal") && scene.run().didSince(e.at(), "open-vent", "take-apart", "take-apart-cold");
      boolean since = scene.time().heatOn().filter(on -> !e.at().isBefore(on)).isPresent();
      if (since && hot && !ofReceiver && !opened) {
        out.seen(about, e.part(), "yes", scene.told(e) + ", the flask can be hot", e.at(), "part-temperature");
      }
    }
  }

  /** A reading of the flask before the deed outranks the clock. */
  private boolean hotAt(Entry deed) {
    Optional<Entry> read = Stream.of("flask-temperature", "flask-wall-temperature").flatMap(id -> scene.run().saw(id).stream())
        .filter(e -> e.measured().isPresent() && !e.at().isAfter(deed.at())).max(Comparator.comparing(Entry::at));
    return read.map(e -> e.measured().get().si() > scene.limit("hand-warm-max")).orElse(active("glass-hot", "yes"));
  }

  /** Needs a look at the tip: boiling seen, and no drop for the look time since the last one that had one. */
  private void dripOverdue() {
    boolean boiling = active("boiling", "gentle", "steady", "violent");
    Optional<Entry> drip = scene.run().lastSaw("drip");
    boolean dry = drip.filter(e -> e.text().equals("none")).isPresent();
    if (boiling && drip.filter(e -> e.text().equals(Looks.NOT_SURE)).isPresent()) {
      out.possible("drip-overdue", scene.told(drip.get()), "drip");
      return;
    }
    if (!boiling || !dry || scene.time().cut().isPresent()) {
      out.seen("drip-overdue", "no", boiling ? "something comes over, or nobody has looked" : "boiling is not seen");
      return;
    }
    List<Entry> looks = scene.run().saw("drip");
    Instant dryFrom = drip.get().at();
    Instant lastDrop = scene.time().boilStart().orElse(dryFrom);
    for (Entry e : looks) {
      lastDrop = e.text().equals("none") ? lastDrop : e.at();
    }
    Duration allowed = scene.time().firstDrop().isPresent() ? LOOK_TIME : Duration.ofMinutes(5);
    boolean overdue = Duration.between(lastDrop, scene.at()).compareTo(allowed) >= 0;
    out.seen("drip-overdue", "", overdue ? "yes" : "no", scene.told(drip.get()) + ", boiling seen", dryFrom, "drip");
  }

  private void ignoresDial() {
    Optional<Entry> said = scene.run().lastSaw("dial-has-no-effect").filter(e -> !e.text().equals("no"));
    Optional<Entry> zero = scene.run().lastDid("set-heat", "heat-on").filter(e -> e.measured().filter(q -> q.si() == 0).isPresent());
    Optional<Entry> power = scene.run().lastSaw("heater-power").filter(e -> zero.isPresent() && e.at().isAfter(zero.get().at().plusSeconds(60)) && e.measured().filter(q -> q.si() > 5).isPresent());
    Optional<Entry> why = said.or(() -> power);
    if (why.isPresent()) {
      out.seen("heater-ignores-dial", "", "yes", scene.told(why.get()), why.get().at(), "heater-power");
    } else {
      out.seen("heater-ignores-dial", "no", "nobody has seen the dial without effect");
    }
  }

  private void probe() {
    if (scene.roles().all(Role.CONTROLLER).isEmpty()) {
      return;
    }
    Optional<Entry> said = scene.run().lastSaw("probe-out").filter(e -> !e.text().equals("no"));
    boolean stated = scene.roles().all(Role.PROBE).stream().anyMatch(p -> p.word("in-place").filter("no"::equals).isPresent());
    boolean flat = flat();
    boolean lost = said.isPresent() || stated || flat;
    out.seen("probe-lost", "", lost ? "yes" : "no", said.map(scene::told).orElse(stated ? "the probe is not in place, by the rig file" : flat ? "output high and the probe's reading flat" : "the probe follows"),
        said.map(Entry::at).orElse(null), "probe-out");
  }

  private boolean flat() {
    Optional<Duration> heatUp = scene.high("heat-up-time");
    List<Entry> high = scene.run().saw("controller-output").stream().filter(e -> e.measured().filter(q -> q.si() >= 0.8).isPresent()).toList();
    List<Entry> probe = scene.run().saw("probe-temperature").stream().filter(e -> e.measured().isPresent()).toList();
    if (heatUp.isEmpty() || high.isEmpty() || probe.size() < 2) {
      return false;
    }
    boolean stood = Duration.between(high.get(0).at(), scene.at()).compareTo(heatUp.get()) > 0;
    return stood && probe.get(probe.size() - 1).measured().get().si() - probe.get(0).measured().get().si() < 2;
  }

  private void superheated() {
    Optional<Entry> t = scene.run().lastSaw("flask-temperature").filter(e -> e.measured().isPresent());
    Optional<Estimate> bp = scene.number("water-boiling-point-here");
    if (t.isEmpty() || bp.isEmpty()) {
      return;
    }
    double error = scene.limit("thermometer-error");
    boolean over = t.get().measured().get().si() - 273.15 > bp.get().high() + 2 + 2 * error;
    out.seen("superheated", "", over ? "yes" : "no", scene.told(t.get()) + ", water boils here at " + Math.round(bp.get().nominal() * 10) / 10.0 + " °C", t.get().at(), "flask-temperature");
  }

  private void hotDistillate() {
    overLimit("distillate-hot", "distillate-temperature", scene.limit("distillate-hot-min"));
    overLimit("coolant-outlet-hot", "coolant-outlet-temperature", scene.limit("coolant-outlet-hot-min"));
  }

  private void overLimit(String about, String id, double kelvin) {
    Optional<Entry> t = scene.run().lastSaw(id).filter(e -> e.measured().isPresent());
    if (scene.run().lastSaw(id).filter(e -> e.text().equals(Looks.NOT_SURE)).isPresent()) {
      out.possible(about, scene.told(scene.run().lastSaw(id).get()), id);
    } else if (t.isPresent()) {
      boolean rise = id.equals("coolant-outlet-temperature") && scene.run().lastSaw("coolant-supply-temperature").flatMap(Entry::measured)
          .or(() -> scene.key(Role.CONDENSER, "coolant.supply").flatMap(d -> d.measured()))
          .filter(in -> t.get().measured().get().si() - in.si() > scene.limit("coolant-rise-max")).isPresent();
      boolean hot = t.get().measured().get().si() > kelvin || rise;
      out.seen(about, "", hot ? "yes" : "no", scene.told(t.get()), t.get().at(), id);
    } else {
      out.seen(about, "no", "no reading of the " + id.replace('-', ' '));
    }
  }

  private void levelAndPath() {
    boolean good = out.all().stream().anyMatch(s -> s.about().equals("flask-level") && s.isSeen() && Set.of("full", "ok").contains(s.value()))
        && out.all().stream().anyMatch(s -> s.about().equals("path") && s.isSeen() && s.value().equals("open"));
    out.seen("level-and-path", good ? "good" : "in-doubt", good ? "level ordinary and path open, both seen lately" : "level or path not both seen good lately");
  }

  private void headReading() {
    boolean heat = scene.time().vapour(scene.at()) && scene.time().cut().isEmpty() && scene.time().firstDrop().isPresent();
    if (!heat || scene.roles().all(Role.THERMOMETER).isEmpty()) {
      return;
    }
    Looks.Look l = scene.looks().at("head-temperature", Shelves.of(scene.policy(), "head-temperature"), scene.time().firstDrop().get(), scene.time().firstDrop().get());
    boolean stale = l.age() == Looks.Age.OVERDUE;
    out.seen("head-reading", "", stale ? "stale" : "fresh", l.entry().map(scene::told).orElse("no head temperature read"), l.from(), "head-temperature");
  }

  private void tapAndStopper() {
    laterOf("reservoir-tap", "stopcock", Map.of("feed", "open", "feed-slow", "open", "close-feed", "shut"));
    laterOf("reservoir-stopper", "stopper", Map.of("unstopper-reservoir", "off"));
  }

  private void laterOf(String about, String seen, Map<String, String> deeds) {
    Optional<Entry> look = scene.run().lastSaw(seen).filter(e -> !e.text().equals(Looks.NOT_SURE));
    if (scene.run().lastSaw(seen).filter(e -> e.text().equals(Looks.NOT_SURE)).isPresent()) {
      out.possible(about, scene.told(scene.run().lastSaw(seen).get()), seen);
      return;
    }
    Optional<Entry> deed = scene.run().lastDid(deeds.keySet().stream().sorted().toArray(String[]::new));
    Optional<Entry> last = Stream.of(look, deed).flatMap(Optional::stream).max(Comparator.comparing(Entry::at).thenComparing(Entry::line));
    if (last.isPresent()) {
      String value = deeds.getOrDefault(last.get().id(), last.get().text());
      out.seen(about, "", value, scene.told(last.get()), last.get().at(), seen);
      return;
    }
    Optional<stillwarden.describe.Datum> stated = scene.key(Role.RESERVOIR, seen);
    if (stated.isPresent()) {
      out.seen(about, "", stated.get().text(), scene.stated(stated.get()), null, seen);
    } else {
      out.possible(about, seen + " of the reservoir not known", seen);
    }
  }

  private void backflow() {
    Optional<Entry> e = scene.looks().worstOfLast("reservoir-backflow");
    if (e.isEmpty() || e.get().text().equals("none")) {
      out.seen("backflow", "none", e.map(scene::told).orElse("nobody has seen backflow"));
      return;
    }
    boolean low = active("reservoir-level", "low", "nearly-dry", "dry", "empty");
    boolean open = out.all().stream().anyMatch(s -> s.about().equals("path") && s.isSeen() && s.value().equals("open"));
    boolean flows = out.all().stream().anyMatch(s -> s.about().equals("flow") && s.isSeen() && Set.of("drops", "stream").contains(s.value()));
    boolean hiss = scene.run().lastSaw("hiss").filter(h -> h.text().equals("yes")).isPresent();
    boolean harmless = e.get().text().equals("bubbles") && low && open && flows && !hiss;
    out.seen("backflow", "", harmless ? "short-reservoir" : "pressed", scene.told(e.get()), e.get().at(), "reservoir-backflow");
  }

  private void jointLeaks() {
    Map<String, Entry> last = new LinkedHashMap<>();
    for (Entry e : scene.run().entries()) {
      if (Set.of("vapour-from-joint", "hiss").contains(e.id())) {
        last.put(e.part(), e);
      }
    }
    Optional<Entry> eased = scene.run().lastDid("reduce-heat", "set-heat", "cut-power", "isolate-remote", "close-gas");
    for (Entry e : last.values()) {
      if (!e.text().equals("no")) {
        boolean stays = eased.filter(d -> !e.at().isBefore(d.at().plus(Duration.ofMinutes(2))) && seenBefore(e, d)).isPresent();
        out.seen("joint-leaks", e.part(), stays ? "stays" : "yes", scene.told(e), e.at(), e.id());
      }
    }
  }

  private boolean seenBefore(Entry leak, Entry deed) {
    return Stream.of("vapour-from-joint", "hiss").flatMap(id -> scene.run().saw(id).stream())
        .anyMatch(x -> x.part().equals(leak.part()) && !x.at().isAfter(deed.at()) && !x.text().equals("no"));
  }

  private void exposed() {
    Optional<Entry> smell = scene.run().lastSaw("smell").filter(e -> !Set.of("no", "burnt").contains(e.text()));
    Optional<Entry> symptoms = scene.run().lastSaw("symptoms").filter(e -> !e.text().equals("no"));
    Optional<Entry> why = symptoms.or(() -> smell);
    if (why.isPresent() && why.get().text().equals(Looks.NOT_SURE)) {
      out.possible("exposed", scene.told(why.get()), "symptoms");
    } else if (why.isPresent()) {
      out.seen("exposed", "", "yes", scene.told(why.get()), why.get().at(), "symptoms");
    } else {
      out.seen("exposed", "no", "nobody reports a smell or feels unwell");
    }
  }

  private void injuryReach() {
    Optional<Entry> injury = scene.run().lastSaw("injury").filter(e -> !e.text().equals("no"));
    injury.ifPresent(e -> out.seen("injury-reach", "", e.reach().orElse("no"), "switch in reach: " + e.reach().orElse("not said, counts as no"), e.at(), "injury"));
  }
}
