package stillwarden.derive;

import java.time.Instant;
import java.util.Comparator;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import stillwarden.describe.Entry;

/** Stage, heat, power, what a person at the switch has to reckon with, and how the flask boils. */
final class HeatSigns {
  private final Scene scene;
  private final SignSet out;

  HeatSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    Timeline t = scene.time();
    Instant on = t.heatOn().orElse(null);
    out.seen("stage", "", t.stage(), "stage " + t.stage(), null, "boiling");
    out.seen("live", "", t.live() ? "yes" : "no", t.live() ? "heat on since " + scene.clock(on) + t.cut().map(c -> ", energy cut " + scene.clock(c) + ", boiling not seen to have stopped").orElse("") : "no heat in", on, "boiling");
    boolean vapour = t.vapour(scene.at());
    out.seenIf(vapour, "vapour", vapour ? "vapour since " + scene.clock(t.boilStart().get()) : "no vapour yet");
    heat(t);
    stored(t);
    glassHot(t);
    power(t);
    out.seen("stopped-uncleared", "", t.uncleared() ? "yes" : "no", t.uncleared() ? "energy cut and the restart gate is not complete" : "no stop stands uncleared", t.cut().orElse(null), "cause-removed");
    switchPlace();
    boiling(t);
    wet();
  }

  private void heat(Timeline t) {
    if (t.heatOn().isEmpty()) {
      out.seen("heat", "off", "no heat logged");
      return;
    }
    if (t.cut().isPresent() && (t.endRun().isEmpty() || deedCut(t)) && !backUnisolated()) {
      out.seen("heat", "", "off", "energy cut " + scene.clock(t.cut().get()), t.cut().get(), "heater-power");
    } else if (backUnisolated()) {
      out.counted("heat", "on", "power is back and nobody has isolated the heater: counts as on", "heater-power");
    } else {
      out.seen("heat", "", "on", "heat on since " + scene.clock(t.heatOn().get()), t.heatOn().get(), "heater-power");
    }
  }

  private boolean deedCut(Timeline t) {
    return scene.run().didSince(t.heatOn().get(), "cut-power", "isolate-remote", "isolate-auto", "close-gas", "keep-heat-off")
        || scene.run().sawValue("power", "lost");
  }

  private boolean backUnisolated() {
    Optional<Entry> power = scene.run().lastSaw("power");
    return power.filter(e -> e.text().equals("back")).isPresent()
        && !scene.run().didSince(scene.time().heatOn().orElse(power.get().at()), "cut-power", "isolate-remote", "isolate-auto", "keep-heat-off");
  }

  private void stored(Timeline t) {
    boolean lowered = t.heatOn().isPresent() && scene.run().lastDid("lower-heat").filter(e -> !e.at().isBefore(t.heatOn().get())).isPresent()
        && scene.run().lastDid("lower-heat", "raise-heater").filter(e -> e.id().equals("lower-heat")).isPresent();
    boolean warm = t.live() || t.stage().equals("cooling");
    out.seenIf(warm && !lowered, "stored-heat", lowered ? "the heater is wound down" : warm ? "the heater still stands against the flask" : "the heater is cold");
  }

  private void glassHot(Timeline t) {
    boolean hot = t.live() || t.stage().equals("cooling");
    if (hot) {
      out.seen("glass-hot", "", "yes", "stage " + t.stage() + ": the glass is above hand-warm", t.heatOn().orElse(null), "part-feels");
    } else {
      out.seen("glass-hot", "no", "stage " + t.stage());
    }
  }

  private void power(Timeline t) {
    Optional<Entry> last = scene.looks().worstOfLast("power");
    boolean gate = last.isPresent() && !t.uncleared();
    if (last.isEmpty() || gate && last.get().text().equals("back")) {
      out.seen("power", "present", "no power failure logged");
    } else if (last.get().text().equals(Looks.NOT_SURE)) {
      out.counted("power", "lost", scene.told(last.get()) + ", counts as lost", "power");
    } else {
      out.seen("power", "", last.get().text(), scene.told(last.get()), last.get().at(), "power");
    }
  }

  /** In reach unless somebody said it stands wet or in vapour, or the rig file says that it cannot be reached. */
  private void switchPlace() {
    Optional<Entry> bad = Stream.of("switch-in-vapour", "tingle-or-sparks").flatMap(id -> scene.run().lastSaw(id).stream())
        .filter(e -> !e.text().equals("no")).max(Comparator.comparing(Entry::at));
    Optional<Entry> water = scene.run().lastSaw("water-on").filter(e -> Set.of("electrics", "heater").contains(e.text()));
    Optional<Entry> any = bad.or(() -> water);
    if (any.isPresent()) {
      out.seen("switch", "", "wet-or-in-vapour", scene.told(any.get()), any.get().at(), "switch-in-vapour");
    } else if (scene.says("emergency.power-off-within-reach", "no")) {
      out.seen("switch", "", "out-of-reach", "the switch is out of reach, by the rig file", null, "emergency.power-off-within-reach");
    } else {
      out.seen("switch", "", "in-reach", "the switch is in reach and nobody has seen it wet or in vapour", null, "switch-in-vapour");
    }
  }

  private void boiling(Timeline t) {
    if (t.heatOn().isEmpty()) {
      return;
    }
    Looks.Look look = scene.looks().at("boiling", Shelves.of(scene.policy(), "boiling"), null, null);
    Optional<String> word = look.word();
    boolean alarming = word.filter(w -> w.equals("violent") || w.equals("none")).isPresent();
    if (word.isPresent() && (alarming || look.fresh())) {
      out.seen("boiling", "", word.get(), scene.told(look.entry().get()), look.entry().get().at(), "boiling");
    } else if (t.vapour(scene.at())) {
      out.possible("boiling", "", java.util.List.of("gentle", "steady", "none", "violent"), "boiling not seen lately", java.util.List.of("boiling"));
    }
    quenched(t);
  }

  private void quenched(Timeline t) {
    Optional<Entry> last = scene.run().lastSaw("boiling");
    boolean before = t.boilStart().isPresent() && last.filter(e -> e.at().isAfter(t.boilStart().get())).isPresent()
        && (t.firstDrop().isPresent() || scene.run().saw("boiling").stream().anyMatch(e -> Set.of("gentle", "steady", "violent").contains(e.text())));
    boolean none = last.filter(e -> e.text().equals("none")).isPresent();
    boolean heat = t.cut().isEmpty() || backUnisolated();
    if (none && before && heat) {
      out.seen("boil-quenched", "", "yes", scene.told(last.get()) + ", boiling before", last.get().at(), "boiling");
    } else if (heat && before && scene.run().age(last.get()).compareTo(Shelves.of(scene.policy(), "boiling")) > 0) {
      out.possible("boil-quenched", scene.told(last.get()) + ", past its time", "boiling");
    } else {
      out.seen("boil-quenched", "no", "boiling has not stopped under heat");
    }
  }

  private void wet() {
    Optional<Entry> seen = Stream.concat(scene.run().lastSaw("heater-wet").stream(), scene.run().lastSaw("water-on").filter(e -> e.text().equals("heater")).stream())
        .filter(e -> !e.text().equals("no")).max(Comparator.comparing(Entry::at));
    boolean dead = scene.run().lastSaw("heater-power").filter(e -> e.measured().filter(q -> q.si() == 0).isPresent()).isPresent()
        && scene.run().didSince(scene.time().heatOn().orElse(Instant.MIN), "cut-power", "isolate-remote", "isolate-auto");
    out.seen("heater-proven-dead", "", dead ? "yes" : "no", dead ? "isolated and its power read as zero" : "nobody has proven the heater dead", null, "heater-power");
    boolean bath = scene.roles().one(Role.HEATER).filter(h -> h.kind().endsWith("-bath")).isPresent();
    boolean stated = !bath && scene.word(Role.HEATER, "liquid-inside").filter(w -> !w.equals("no")).isPresent();
    boolean wet = seen.isPresent() || stated;
    if (wet && !dead) {
      out.seen("heater-live-wet", "", "yes", seen.map(scene::told).orElse("liquid in the heater, by the rig file"), seen.map(Entry::at).orElse(null), seen.isPresent() ? "heater-wet" : scene.name(Role.HEATER) + ".liquid-inside");
    } else if (!bath && seen.isEmpty() && !scene.time().live() && scene.key(Role.HEATER, "liquid-inside").isEmpty() && !scene.roles().absent().contains(Role.HEATER)) {
      out.possible("heater-live-wet", "nobody has looked into the heater", scene.name(Role.HEATER) + ".liquid-inside");
    } else {
      out.seen("heater-live-wet", "", "no", wet ? "the heater is wet and proven dead" : "nobody has seen the heater wet", null, "heater-wet");
    }
  }
}
