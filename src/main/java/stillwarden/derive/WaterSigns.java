package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import stillwarden.describe.Entry;

/** Levels, feed, and the times computed from them. */
final class WaterSigns {
  private final Scene scene;
  private final SignSet out;

  WaterSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    flaskLevel();
    reservoirLevel();
    receiverLevel();
    times();
    foam();
    feed();
    leak();
  }

  private void flaskLevel() {
    Optional<Entry> bare = scene.run().lastSaw("solids").filter(e -> e.text().equals("bare"));
    Duration shelf = scene.low("time-to-minimum-level").map(t -> Shelves.quarter(scene.policy(), "flask-level", t.compareTo(Duration.ofMinutes(2)) < 0 ? Duration.ofMinutes(2) : t))
        .orElse(Shelves.of(scene.policy(), "flask-level"));
    Looks.Look l = scene.looks().at("flask-level", shelf, statedAtHeatOn("charge.water"), scene.time().boilStart().orElse(scene.at()));
    Optional<String> word = l.entry().flatMap(e -> levelWord(Role.FLASK, e));
    if (bare.isPresent() && l.entry().filter(e -> e.at().isAfter(bare.get().at())).isEmpty()) {
      out.seen("flask-level", "", "dry", scene.told(bare.get()), bare.get().at(), "flask-level");
    } else if (word.filter(w -> w.equals("ok") || w.equals("full")).isPresent() && l.fresh() && shortOfTime()) {
      out.seen("flask-level", "", "low", scene.told(l.entry().get()) + ", and less than " + scene.limitTime("time-to-minimum-min").toMinutes() + " min to the minimum level, computed", l.entry().get().at(), "flask-level");
    } else if (word.isPresent() && (l.fresh() || Set.of("low", "nearly-dry", "dry").contains(word.get()) && !(l.age() == Looks.Age.OVERDUE && !longAway()))) {
      out.seen("flask-level", "", word.get(), scene.told(l.entry().get()), since("flask-level", Role.FLASK, word.get()), "flask-level");
    } else if (l.fresh() && l.entry().isEmpty()) {
      out.seen("flask-level", "", "ok", "water as charged, by the rig file, and not boiling long", null, "flask-level");
    } else if (scene.time().heatOn().isPresent()) {
      unseen(l);
    }
  }

  /** Heat is on and the minimum level is near by time, whatever the word for the level. */
  private boolean shortOfTime() {
    return scene.time().vapour(scene.at()) && scene.time().cut().isEmpty()
        && scene.low("time-to-minimum-level").filter(t -> t.compareTo(scene.limitTime("time-to-minimum-min")) < 0).isPresent();
  }

  private Instant statedAtHeatOn(String path) {
    return scene.rig().datum(path).isPresent() ? scene.time().heatOn().orElse(null) : null;
  }

  /** Low while the computed time to the minimum is not over, then dry. */
  private void unseen(Looks.Look l) {
    String old = l.entry().map(scene::told).orElse("nobody has looked at the level since heat came on");
    if (!scene.time().vapour(scene.at()) || l.age() == Looks.Age.STALE && l.entry().isPresent() && longAway()) {
      out.possible("flask-level", "", List.of("ok", "low"), old + ", past its time", List.of("flask-level"));
      return;
    }
    if (l.age() == Looks.Age.STALE || longAway()) {
      out.counted("flask-level", "low", old + ", too old: counts as low while the computed time to the minimum exceeds the check interval", "flask-level");
    } else {
      out.counted("flask-level", "dry", old + ", too old, and the computed time to the minimum is over or unknown: counts as dry", "flask-level");
    }
  }

  private boolean longAway() {
    return scene.low("time-to-minimum-level").filter(t -> !t.isZero() && !t.isNegative()).isPresent();
  }

  private Instant since(String id, Role role, String word) {
    Instant since = null;
    List<Entry> all = scene.run().saw(id);
    for (int i = all.size() - 1; i >= 0 && levelWord(role, all.get(i)).filter(word::equals).isPresent(); i--) {
      since = all.get(i).at();
    }
    return since;
  }

  /** A quantity in words, by the levels of the contract; a word stays as it is. */
  private Optional<String> levelWord(Role role, Entry e) {
    if (e.text().equals(Looks.NOT_SURE)) {
      return Optional.empty();
    }
    return e.measured().isPresent() ? scene.numbers().levelWord(role.word(), e.measured().get().si()) : Optional.of(e.text());
  }

  private void reservoirLevel() {
    Duration shelf = scene.low("time-to-reservoir-end").map(t -> Shelves.quarter(scene.policy(), "reservoir-level", t.compareTo(Duration.ofMinutes(2)) < 0 ? Duration.ofMinutes(2) : t))
        .orElse(Shelves.of(scene.policy(), "reservoir-level"));
    Optional<Entry> refill = scene.run().lastDid("refill-reservoir");
    Optional<Entry> seen = scene.run().lastSaw("reservoir-level");
    if (refill.isPresent() && seen.filter(e -> !e.at().isBefore(refill.get().at())).isEmpty()) {
      out.possible("reservoir-level", "", List.of("full", "ok"), scene.told(refill.get()) + ", not seen since", List.of("reservoir-level"));
      return;
    }
    Looks.Look l = scene.looks().at("reservoir-level", shelf, statedAtHeatOn(scene.name(Role.RESERVOIR) + ".water"), scene.time().boilStart().orElse(scene.at()));
    Optional<String> word = l.entry().flatMap(e -> levelWord(Role.RESERVOIR, e));
    boolean low = word.filter(w -> Set.of("low", "nearly-dry", "dry", "empty").contains(w)).isPresent();
    if (word.isPresent() && (l.fresh() || low)) {
      out.seen("reservoir-level", "", word.get(), scene.told(l.entry().get()), since("reservoir-level", Role.RESERVOIR, word.get()), "reservoir-level");
    } else if (l.entry().isEmpty() && l.fresh()) {
      fromRig();
    } else if (scene.time().heatOn().isPresent()) {
      unseenReservoir(l);
    }
  }

  private void fromRig() {
    double water = scene.si(Role.RESERVOIR, "water").orElse(0.0);
    String word = water <= 0 ? "empty" : scene.numbers().levelWord("reservoir", water).orElse("ok");
    out.seen("reservoir-level", "", word, "reservoir filled as stated, by the rig file", null, "reservoir-level");
  }

  private void unseenReservoir(Looks.Look l) {
    String old = l.entry().map(scene::told).orElse("nobody has looked at the reservoir");
    if (l.age() == Looks.Age.OVERDUE) {
      out.counted("reservoir-level", "empty", old + ", too old: counts as empty for planning", "reservoir-level");
    } else {
      out.possible("reservoir-level", old + ", past its time", "reservoir-level");
    }
  }

  private void receiverLevel() {
    Duration shelf = scene.low("time-to-full-receiver").map(t -> Shelves.quarter(scene.policy(), "receiver-level", t.compareTo(Duration.ofMinutes(2)) < 0 ? Duration.ofMinutes(2) : t))
        .orElse(Shelves.of(scene.policy(), "receiver-level"));
    Optional<Entry> swap = scene.run().lastDid("swap-receiver");
    Looks.Look l = scene.looks().at("receiver-level", shelf, scene.time().firstDrop().orElse(null), scene.time().firstDrop().orElse(scene.at()));
    Optional<Entry> seen = l.entry().filter(e -> swap.filter(s -> s.at().isAfter(e.at())).isEmpty());
    Optional<String> word = seen.flatMap(e -> levelWord(Role.RECEIVER, e));
    if (word.isPresent() && (l.fresh() || word.get().equals("full"))) {
      out.seen("receiver-level", "", word.get(), scene.told(seen.get()), since("receiver-level", Role.RECEIVER, word.get()), "receiver-level");
    } else if (scene.time().firstDrop().isEmpty() || swap.isPresent() && seen.isEmpty() && scene.run().age(swap.get()).compareTo(shelf) <= 0) {
      out.seen("receiver-level", "empty", swap.map(scene::told).orElse("nothing has come over yet"));
    } else {
      out.possible("receiver-level", "", List.of("ok", "full"), "the receiver has not been looked at lately", List.of("receiver-level"));
    }
  }

  private void times() {
    Optional<Duration> t = scene.low("time-to-minimum-level");
    double least = scene.limit("time-to-minimum-min");
    if (t.isEmpty()) {
      if (scene.time().heatOn().isPresent()) {
        out.counted("time-to-minimum", "short", "the time to the minimum level cannot be computed: counts as short", "flask-level");
        out.counted("refill-in-time", "no", "the time to the minimum level cannot be computed", "flask-level");
      }
      return;
    }
    double s = t.get().toMillis() / 1000.0;
    String low = "time to the minimum level at least " + Math.round(s / 6) / 10.0 + " min, computed";
    out.seen("time-to-minimum", s <= 0 ? "passed" : s < least ? "short" : "ample", low);
    refill(s, least, low);
  }

  private void refill(double s, double least, String low) {
    String name = scene.name(Role.RESERVOIR);
    Optional<String> hand = scene.word(Role.RESERVOIR, "refill-at-hand");
    Optional<Double> takes = scene.si(Role.RESERVOIR, "refill-takes");
    boolean wanted = !scene.numbers().targetReached();
    if (hand.filter("yes"::equals).isPresent() && takes.isPresent()) {
      boolean ok = wanted && s >= least && takes.get() < s;
      out.seen("refill-in-time", ok ? "yes" : "no", low + ", a refill takes " + Math.round(takes.get() / 60) + " min");
    } else if (hand.filter("no"::equals).isPresent()) {
      out.seen("refill-in-time", "no", "no water at hand, by the rig file");
    } else {
      out.counted("refill-in-time", "no", "nobody has said whether water is at hand and how long a refill takes: counts as no", name + ".refill-at-hand", name + ".refill-takes");
    }
  }

  /** No foam to look for in a charge that does not foam, nor before the water is half way to boiling. */
  private void foam() {
    Optional<String> foams = scene.rig().word("charge.foams").or(() -> scene.plant().text("foams"));
    boolean warming = scene.time().firstDrop().isEmpty();
    Duration shelf = warming ? stillwarden.describe.Vocabulary.get().shelfIn("heat-up", "foam").orElse(Duration.ofMinutes(1)) : Shelves.of(scene.policy(), "foam");
    Instant half = scene.time().heatOn().map(on -> on.plus(scene.low("heat-up-time").orElse(Duration.ZERO).dividedBy(2))).orElse(null);
    Looks.Look l = scene.looks().at("foam", shelf, half, half);
    Optional<String> word = l.word();
    boolean alarming = word.filter(w -> !Set.of("none", "low-and-steady").contains(w)).isPresent();
    if (word.isPresent() && (alarming || l.fresh())) {
      out.seen("foam", "", word.get(), scene.told(l.entry().get()), l.entry().get().at(), "foam");
    } else if (foams.filter("no"::equals).isPresent() && l.entry().filter(e -> e.text().equals(Looks.NOT_SURE)).isEmpty()) {
      out.seen("foam", "none", "the charge does not foam");
    } else if (scene.time().heatOn().isEmpty() || scene.time().cut().isPresent() || half != null && half.isAfter(scene.at()) || l.fresh()) {
      out.seen("foam", "none", "no foam to be expected yet");
    } else {
      String old = l.entry().map(scene::told).orElse("nobody has looked for foam");
      if (l.age() == Looks.Age.OVERDUE) {
        out.counted("foam", "past-half", old + ", too old: counts as past half the free space", "foam");
      } else {
        out.possible("foam", "", List.of("none", "low-and-steady", "rising", "past-half"), old + ", past its time", List.of("foam"));
      }
    }
  }

  private void feed() {
    Optional<Entry> seen = scene.run().lastSaw("feed").filter(e -> !e.text().equals(Looks.NOT_SURE));
    if (scene.run().lastSaw("feed").filter(e -> e.text().equals(Looks.NOT_SURE)).isPresent()) {
      out.possible("feeding", scene.told(scene.run().lastSaw("feed").get()), "feed");
    }
    boolean running = seen.filter(e -> e.text().equals("drops") || e.text().equals("stream")).isPresent();
    out.seen("feeding", "", running ? seen.get().text() : "no", seen.map(scene::told).orElse("no feed seen"), null, "feed");
    Optional<Entry> fed = scene.run().lastDid("feed");
    boolean lately = fed.isPresent() && fed.get().measured().isPresent();
    Duration recovery = lately ? scene.numbers().reboilTime(fed.get().measured().get().si()).orElse(Duration.ofMinutes(2)) : Duration.ZERO;
    Duration explained = recovery.multipliedBy(2).compareTo(Duration.ofMinutes(2)) > 0 ? recovery.multipliedBy(2) : Duration.ofMinutes(2);
    boolean within = lately && scene.run().age(fed.get()).compareTo(explained) <= 0;
    boolean slug = lately && fed.get().measured().get().si() >= scene.limit("feed-slug-min");
    boolean now = lately && scene.run().age(fed.get()).compareTo(Duration.ofMinutes(2).plus(recovery)) <= 0;
    if (slug && now || seen.filter(e -> e.text().equals("stream")).isPresent()) {
      out.seen("feed-slug", "", "yes", slug ? scene.told(fed.get()) : scene.told(seen.get()), slug ? fed.get().at() : seen.get().at(), "feed");
    } else {
      out.seen("feed-slug", "no", "no slug of cold water fed");
    }
    out.seenIf(within && !slug, "feed-expected-dip", within ? scene.told(fed.get()) + ": boiling is back within " + recovery.toSeconds() + " s, computed" : "no feed explains a dip");
  }

  private void leak() {
    boolean leak = scene.numbers().leakSuspected();
    out.seenIf(leak, "leak-suspected", leak ? "more water is gone than the power could have boiled: a leak, a wrong entry or a wrong rig file" : "the water balance closes");
  }
}
