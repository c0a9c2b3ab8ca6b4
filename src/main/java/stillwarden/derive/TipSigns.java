package stillwarden.derive;

import java.time.Instant;
import java.util.Optional;
import stillwarden.describe.Entry;

/** The delivery tip and the receiver. */
final class TipSigns {
  private static final double WITHIN_M3 = 10e-6;

  private final Scene scene;
  private final SignSet out;

  TipSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    tip();
    canBeCleared();
    inVapour();
    closesVent();
  }

  private void tip() {
    String look = "tip";
    if (scene.is(Role.RECEIVER, "tip-above-rim", "yes")) {
      out.seen("tip", "", "clear", "the tip is fixed above the rim, by the rig file", null, look);
      return;
    }
    Optional<Entry> seen = scene.looks().worstOfLast("tip");
    Optional<Entry> touched = scene.run().lastDid("swap-receiver", "raise-receiver");
    boolean since = seen.isPresent() && touched.filter(t -> t.at().isAfter(seen.get().at())).isEmpty();
    if (since && seen.get().text().equals("under-liquid")) {
      out.seen("tip", "", "under-liquid", scene.told(seen.get()), seen.get().at(), look);
    } else if (since && seen.get().text().equals("clear") && !risen(seen.get().at())) {
      out.seen("tip", "", "clear", scene.told(seen.get()), seen.get().at(), look);
    } else if (seen.isEmpty() && touched.isEmpty() && fromRig(look)) {
      return;
    } else {
      out.unknown("tip", "under-liquid", seen.map(scene::told).orElse("the tip has not been looked at") + touched.map(t -> ", the receiver was touched " + scene.clock(t.at())).orElse(""), look);
    }
  }

  /** The rig file's word, as looked at when heat came on, while the receiver cannot have risen to it. */
  private boolean fromRig(String look) {
    Optional<String> below = scene.word(Role.RECEIVER, "tip-below-liquid");
    if (below.filter("yes"::equals).isPresent()) {
      out.seen("tip", "", "under-liquid", "the tip dips, by the rig file", null, look);
      return true;
    }
    if (below.filter("no"::equals).isPresent() && !risen(Instant.MIN)) {
      out.seen("tip", "", "clear", "the tip is clear, by the rig file", null, look);
      return true;
    }
    return false;
  }

  /** The liquid is known, or not known not, to stand within 10 mL of the tip. */
  private boolean risen(Instant since) {
    Optional<Double> at = scene.si(Role.RECEIVER, "tip-at");
    Optional<Entry> level = scene.run().lastSaw("receiver-level").filter(e -> !e.at().isBefore(since));
    if (at.isPresent() && level.isPresent() && level.get().measured().isPresent()) {
      return level.get().measured().get().si() >= at.get() - WITHIN_M3;
    }
    return level.filter(e -> e.text().equals("full")).isPresent();
  }

  private void canBeCleared() {
    Optional<String> held = scene.word(Role.RECEIVER, "held");
    Optional<String> can = scene.word(Role.RECEIVER, "can-be-lowered");
    String name = scene.name(Role.RECEIVER);
    if (held.filter("jointed"::equals).isPresent() || can.filter("no"::equals).isPresent()) {
      out.seen("tip-can-be-cleared", name, "no", held.filter("jointed"::equals).isPresent() ? name + " hangs on a joint, by the rig file" : name + " cannot be lowered, by the rig file", null, name + ".can-be-lowered");
    } else if (can.filter("yes"::equals).isPresent() || held.filter("free"::equals).isPresent()) {
      out.seen("tip-can-be-cleared", name, "yes", name + " can be lowered, by the rig file", null, name + ".can-be-lowered");
    } else {
      out.unknown("tip-can-be-cleared", name, "no", "nobody has said whether " + name + " can be lowered", java.util.List.of(name + ".can-be-lowered"));
    }
  }

  private void inVapour() {
    Optional<Entry> vapour = scene.run().lastSaw("vapour-past-condenser").filter(e -> !e.text().equals("none"));
    Optional<Entry> hot = scene.run().lastSaw("distillate-temperature").filter(e -> e.measured().filter(q -> q.si() > 333.15).isPresent());
    Optional<Entry> why = vapour.or(() -> hot);
    if (why.isPresent()) {
      out.seen("receiver-in-vapour", "", "yes", scene.told(why.get()), why.get().at(), "vapour-past-condenser");
      return;
    }
    Optional<Sign> unseen = out.all().stream().filter(x -> x.about().equals("vapour-out") && x.isActive() && !x.value().equals("none")).findFirst();
    if (unseen.isPresent()) {
      out.counted("receiver-in-vapour", "yes", unseen.get().evidence(), "vapour-past-condenser");
    } else {
      out.seen("receiver-in-vapour", "no", "nobody has seen vapour or hot liquid at the receiver");
    }
  }

  private void closesVent() {
    Optional<Double> ventAt = scene.si(Role.RECEIVER, "vent-at");
    boolean tight = scene.is(Role.RECEIVER, "gas-tight", "yes");
    Optional<Entry> level = scene.run().lastSaw("receiver-level");
    boolean covered = level.isPresent() && (ventAt.isPresent() && level.get().measured().filter(q -> q.si() >= ventAt.get()).isPresent()
        || level.get().text().equals("full"));
    boolean unsure = tight && level.filter(e -> e.text().equals(Looks.NOT_SURE)).isPresent();
    if (unsure) {
      out.possible("receiver-closes-vent", scene.told(level.get()), "receiver-level");
    } else if (tight && covered) {
      out.seen("receiver-closes-vent", "", "yes", scene.told(level.get()) + ", gas-tight receiver", level.get().at(), "receiver-level");
    } else {
      out.seen("receiver-closes-vent", "no", tight ? "the receiver's own vent is not covered" : "the receiver is not gas-tight");
    }
  }
}
