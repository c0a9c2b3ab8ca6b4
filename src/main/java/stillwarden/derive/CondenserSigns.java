package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import stillwarden.describe.Entry;
import stillwarden.describe.Vocabulary;

/** Coolant, jacket, crystals and vapour at the outlet. */
final class CondenserSigns {
  private final Scene scene;
  private final SignSet out;

  CondenserSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  /** @param live run signs too, or the declared plan only */
  void make(boolean live) {
    plan();
    freezing();
    if (live) {
      boolean vapourUnseen = vapourOut();
      crystals();
      String coolant = coolant(vapourUnseen);
      jacket(coolant);
      watch();
    }
  }

  private void plan() {
    Optional<String> plan = scene.word(Role.CONDENSER, "coolant.plan");
    String look = scene.name(Role.CONDENSER) + ".coolant.plan";
    if (plan.isPresent()) {
      out.seen("coolant-plan", "", plan.get(), look + " " + plan.get() + ", by the rig file", null, look);
    } else {
      out.unknown("coolant-plan", "before-heat", look + " is not stated", look);
    }
  }

  private void freezing() {
    String freezes = scene.numbers().oilFreezes();
    if (freezes.isEmpty()) {
      out.unknown("oil-freezes", "yes", "what freezes, and at what coolant temperature, is not known", scene.rig().datum(scene.name(Role.CONDENSER) + ".coolant.supply").isEmpty() ? scene.name(Role.CONDENSER) + ".coolant.supply"
          : scene.rig().datum("charge.plant").isEmpty() ? "charge.plant" : "charge.oil.melting-point");
    } else {
      out.seen("oil-freezes", "", freezes, scene.numbers().oilFreezesWhy(), null, "condenser-solids");
    }
    String takeOff = scene.numbers().freezesInTakeOff();
    if (takeOff.isEmpty()) {
      // only what is missing is asked for
      String oil = scene.rig().datum("charge.plant").isEmpty() ? "charge.plant" : "charge.oil.melting-point";
      boolean room = scene.rig().datum("place.room").isPresent() || scene.run().lastSaw("room-temperature").isPresent();
      out.possible("oil-freezes-in-take-off", room ? "what the oil freezes at is not known" : "room temperature not known", room ? oil : "place.room");
    } else {
      out.seen("oil-freezes-in-take-off", "", takeOff, scene.numbers().takeOffWhy(), null, "place.room");
    }
  }

  private Looks.Look look(String id, Instant first) {
    return scene.looks().at(id, Shelves.of(scene.policy(), id), first, scene.time().boilStart().orElse(scene.at()));
  }

  /** @return true when nobody knows whether vapour leaves */
  private boolean vapourOut() {
    Looks.Look l = look("vapour-past-condenser", scene.time().boilStart().orElse(scene.time().heatOn().orElse(null)));
    Optional<String> word = l.word();
    if (word.filter(w -> !w.equals("none")).isPresent() || word.isPresent() && l.fresh()) {
      out.seen("vapour-out", "", word.get(), scene.told(l.entry().get()), l.entry().get().at(), "vapour-past-condenser");
      // a look that is only too old puts nobody to the flames before the switch
      out.seenIf(!word.get().equals("none") && !word.get().equals(Looks.NOT_SURE), "vapour-seen-out", scene.told(l.entry().get()));
      return false;
    }
    if (!scene.time().vapour(scene.at())) {
      out.seen("vapour-out", "none", "no vapour is being made yet");
      return false;
    }
    String old = l.entry().map(scene::told).orElse("nobody has looked at the tip for vapour");
    if (l.fresh()) {
      out.possible("vapour-out", old, "vapour-past-condenser");
      return false;
    }
    if (l.age() == Looks.Age.OVERDUE && scene.time().cut().isEmpty()) {
      out.counted("vapour-out", "wisps", old + ", too old: counts as wisps", "vapour-past-condenser");
      return true;
    }
    out.possible("vapour-out", old + ", past its time", "vapour-past-condenser");
    return true;
  }

  /** Two minutes where anything can freeze, ten otherwise. */
  private void crystals() {
    boolean canFreeze = !scene.numbers().oilFreezes().equals("no");
    Duration shelf = canFreeze ? Vocabulary.get().shelfIn("freezing", "condenser-solids").orElse(Duration.ofMinutes(2)) : Shelves.of(scene.policy(), "condenser-solids");
    Looks.Look l = scene.looks().at("condenser-solids", shelf, scene.time().firstDrop().orElse(null), scene.time().firstDrop().orElse(scene.at()));
    Optional<String> word = l.word();
    if (word.filter(w -> !w.equals("none")).isPresent() || word.isPresent() && l.fresh()) {
      out.seen("crystals", "", word.get(), scene.told(l.entry().get()), since("condenser-solids", l.entry().get()), "condenser-solids");
    } else if (scene.time().firstDrop().isEmpty() || l.fresh() && l.entry().isEmpty()) {
      out.seen("crystals", "none", "nothing has come over long enough to freeze");
    } else {
      out.possible("crystals", l.entry().map(scene::told).orElse("nobody has looked into the condenser"), "condenser-solids");
    }
  }

  private Instant since(String id, Entry last) {
    Instant since = last.at();
    List<Entry> all = scene.run().saw(id);
    for (int i = all.size() - 1; i >= 0 && all.get(i).text().equals(last.text()); i--) {
      since = all.get(i).at();
    }
    return since;
  }

  private String coolant(boolean vapourUnseen) {
    Optional<Entry> last = Stream.concat(
            Stream.of("coolant-running", "coolant-flow").flatMap(id -> scene.run().lastSaw(id).stream()).filter(e -> !e.text().equals(Looks.NOT_SURE)),
            scene.run().lastDid("coolant-on", "set-coolant", "coolant-start-slow", "coolant-stop", "coolant-raise").stream())
        .max(RunState.ORDER);
    boolean proven = scene.is(Role.CONDENSER, "coolant.flow-proven", "yes");
    boolean heldOff = scene.is(Role.CONDENSER, "coolant.plan", "held-off");
    if (last.isEmpty() && heldOff) {
      return coolantSeen("off", "the coolant is held off by plan", null);
    }
    Optional<String> word = last.map(this::coolantWord);
    if (word.filter("off"::equals).isPresent() || word.filter("low"::equals).isPresent()) {
      return coolantSeen(word.get(), scene.told(last.get()), offSince(last.get()));
    }
    Instant from = last.map(Entry::at).orElse(proven ? scene.time().heatOn().orElse(null) : null);
    Instant clock = scene.time().boilStart().orElse(scene.at());
    Instant start = from == null ? null : clock.isAfter(from) ? clock : from;
    Duration shelf = Shelves.of(scene.policy(), "coolant-running");
    boolean fresh = start != null && Duration.between(start, scene.at()).compareTo(shelf) <= 0;
    if (fresh) {
      return coolantSeen("running", last.map(scene::told).orElse("flow proven, by the rig file"), null);
    }
    String old = last.map(scene::told).orElse(proven ? "flow proven when heat came on" : "nobody has proven the flow");
    boolean overdue = start == null || Duration.between(start, scene.at()).compareTo(shelf.multipliedBy(2)) > 0;
    if (overdue && vapourUnseen && scene.time().vapour(scene.at()) && scene.time().cut().isEmpty()) {
      out.counted("coolant", "off", old + ", too old, and vapour unseen: counts as off", "coolant-running");
      return "off";
    }
    out.possible("coolant", old + ", past its time", "coolant-running");
    return "unknown";
  }

  private String coolantSeen(String value, String evidence, Instant since) {
    out.seen("coolant", "", value, evidence, since, "coolant-running");
    return value;
  }

  private Instant offSince(Entry last) {
    return last.id().equals("coolant-running") ? since("coolant-running", last) : last.at();
  }

  private String coolantWord(Entry e) {
    return switch (e.id()) {
      case "coolant-running" -> e.text().equals("no") ? "off" : "running";
      case "coolant-stop" -> "off";
      case "coolant-flow", "set-coolant" -> flowWord(e);
      default -> "running";
    };
  }

  private String flowWord(Entry e) {
    double flow = e.measured().map(q -> q.si()).orElse(1.0);
    double least = scene.number("coolant-flow-least").map(x -> x.unit().equals("L/min") ? x.nominal() / 60e3 : x.nominal() / 60e6).orElse(0.0);
    return flow <= 0 ? "off" : flow < least ? "low" : "running";
  }

  /** Hot at the limit, or a jacket without coolant under vapour for over a minute. */
  private void jacket(String coolant) {
    Optional<Entry> fill = scene.run().lastSaw("jacket");
    Optional<Entry> feels = Stream.of("jacket-feels", "jacket-temperature").flatMap(id -> scene.run().lastSaw(id).stream()).max(Comparator.comparing(Entry::at));
    Optional<Boolean> hot = feels.map(e -> e.measured().map(q -> q.si() >= scene.limit("jacket-cold-start-max")).orElse(e.text().equals("hot")));
    if (coolant.equals("running") || coolant.equals("low")) {
      out.seen("jacket", "", "full-cool", "coolant runs through the jacket", null, "jacket");
      return;
    }
    if (fill.isEmpty()) {
      unseenJacket(coolant, hot, feels);
      return;
    }
    boolean full = fill.get().text().equals("full");
    boolean warm = hot.orElse(vapourWithoutCoolantOverAMinute());
    out.seen("jacket", "", (full ? "full" : "empty") + (warm ? "-hot" : "-cool"), scene.told(fill.get()) + feels.map(f -> ", " + scene.told(f)).orElse(""), fill.get().at(), "jacket");
  }

  /** A jacket that was shut off, not drained, is still full; one that lost its flow nobody knows how is not counted on. */
  private void unseenJacket(String coolant, Optional<Boolean> hot, Optional<Entry> feels) {
    Optional<Entry> shut = scene.run().lastDid("coolant-stop", "jacket-drain").filter(e -> e.id().equals("coolant-stop"));
    boolean ran = scene.is(Role.CONDENSER, "coolant.flow-proven", "yes") || scene.run().saw("coolant-running").stream().anyMatch(e -> e.text().equals("yes"));
    String how = feels.map(scene::told).orElse("nobody has looked at the jacket");
    if (shut.isPresent() && ran) {
      boolean warm = hot.orElse(vapourWithoutCoolantOverAMinute());
      out.seen("jacket", "", warm ? "full-hot" : "full-cool", scene.told(shut.get()) + ", not drained since", shut.get().at(), "jacket");
    } else if (hot.isPresent()) {
      out.seen("jacket", "", (ran ? "full" : "empty") + (hot.get() ? "-hot" : "-cool"), how, feels.get().at(), "jacket");
    } else if (!scene.time().vapour(scene.at()) || coolant.equals("unknown")) {
      out.possible("jacket", how, "jacket");
    } else {
      out.counted("jacket", "empty-hot", how + ": counts as empty and hot", "jacket");
    }
  }

  private boolean vapourWithoutCoolantOverAMinute() {
    Optional<Instant> off = out.all().stream().filter(s -> s.about().equals("coolant") && s.value().equals("off") && s.since() != null).map(Sign::since).findFirst();
    Instant boil = scene.time().boilStart().orElse(scene.at());
    Instant start = off.filter(o -> o.isAfter(boil)).orElse(boil);
    return Duration.between(start, scene.at()).compareTo(Duration.ofMinutes(1)) > 0;
  }

  /**
   * Melting crystals: the coolant was shut for solid that was seen, it drips, no vapour is out and the computed time is
   * not over. Melted when no solid is seen any more; failed when the drip slows, the time is over or vapour comes.
   */
  private void watch() {
    Optional<Entry> solids = scene.run().lastSaw("condenser-solids");
    boolean solid = solids.filter(e -> Set.of("film", "growing").contains(e.text())).isPresent();
    String flow = out.all().stream().filter(x -> x.about().equals("flow") && x.isActive()).map(Sign::value).findFirst().orElse("");
    Optional<Entry> stop = scene.run().lastDid("coolant-stop", "coolant-on", "coolant-start-slow", "set-coolant").filter(e -> e.id().equals("coolant-stop"));
    boolean shut = stop.isPresent() && scene.run().saw("condenser-solids").stream().anyMatch(
        e -> Set.of("film", "growing").contains(e.text()) && !e.at().isAfter(stop.get().at()) && e.at().isAfter(stop.get().at().minus(Duration.ofMinutes(10))));
    if (solid && flow.equals("slowing")) {
      out.seen("coolant-watch", "", "failed", scene.told(solids.get()) + ", and the drip slows", solids.get().at(), "condenser-solids");
    } else if (!shut || flow.equals("none")) {
      out.seen("coolant-watch", "normal", "no melting under way");
    } else {
      melting(stop.get(), solids.get());
    }
  }

  private void melting(Entry stop, Entry solids) {
    Duration time = scene.numbers().meltTime().orElse(scene.limitTime("melt-watch-max"));
    boolean over = stop.at().plus(time).isBefore(scene.at());
    boolean vapour = scene.run().lastSaw("vapour-past-condenser").filter(e -> !e.text().equals("none") && !e.at().isBefore(stop.at())).isPresent()
        || scene.run().lastSaw("vapour-front").filter(e -> e.text().equals("last-third") && !e.at().isBefore(stop.at())).isPresent();
    boolean gone = solids.text().equals("none") && !solids.at().isBefore(stop.at());
    String value = vapour || over ? "failed" : gone ? "melted" : "melting";
    out.seen("coolant-watch", "", value, "coolant shut " + scene.clock(stop.at()) + " to melt crystals, for " + time.toSeconds() + " s; " + scene.told(solids), stop.at(), "condenser-solids");
  }
}
