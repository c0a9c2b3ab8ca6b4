package stillwarden.derive;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Datum;
import stillwarden.describe.Joint;
import stillwarden.describe.Key;
import stillwarden.describe.Part;
import stillwarden.describe.Port;
import stillwarden.describe.Vocabulary;

/** More set-up signs: what feeds and carries the heater, what the charge is known for, people's protection, the thermometer's port. */
final class SetupExtras {
  private static final Map<String, String> PROTECTION =
      inOrder("people.goggles", "goggles", "people.heat-gloves", "heat gloves", "people.lab-coat", "lab coat", "people.closed-shoes", "closed shoes");
  private static final Map<String, String> EMERGENCY = inOrder(
      "emergency.exit-clear", "exit", "emergency.eyewash-within-10-s", "eyewash", "emergency.extinguisher-within-reach", "extinguisher",
      "emergency.spill-kit", "spill kit", "emergency.power-off-within-reach", "cut-off");

  private final Scene scene;
  private final SignSet out;

  SetupExtras(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  /** {@code Map.of} has an order of its own in every process, and the same input must give the same bytes. */
  private static Map<String, String> inOrder(String... keysAndWords) {
    Map<String, String> out = new LinkedHashMap<>();
    for (int i = 0; i < keysAndWords.length; i += 2) {
      out.put(keysAndWords[i], keysAndWords[i + 1]);
    }
    return out;
  }

  void make() {
    dropTried();
    controlled();
    charge();
    splashGuard();
    thermometerPort();
    EMERGENCY.forEach((key, place) -> lacking("emergency-gap", key, place));
    if (scene.rig().datum("emergency.cut-off-clear").isPresent()) {
      lacking("emergency-gap", "emergency.cut-off-clear", "cut-off");
    }
    PROTECTION.forEach((key, piece) -> lacking("protection-missing", key, piece));
    scene.rig().joints().forEach(this::jointKeys);
    scene.rig().parts().values().forEach(p -> p.word("strained").ifPresent(
        w -> out.seen("glass-strained", p.name(), w, scene.stated(p.keys().get("strained")), null, p.name() + ".strained")));
    hoodStated();
    reach();
  }

  private void dropTried() {
    Optional<Part> jack = scene.word(Role.HEATER, "stands-on").map(n -> scene.rig().parts().get(n)).filter(p -> p.kind().equals("lab-jack"));
    if (jack.isPresent()) {
      Part j = jack.get();
      say("heater-drop-tried", j.name(), Optional.ofNullable(j.keys().get("tried")), j.name() + ".tried");
    }
  }

  private void say(String about, String part, Optional<Datum> d, String look) {
    if (d.isPresent()) {
      out.seen(about, part, d.get().text(), scene.stated(d.get()), null, look);
    } else {
      out.possible(about, part, SignSet.domain(about), look + " is not stated", List.of(look));
    }
  }

  private void controlled() {
    Optional<Part> heater = scene.roles().one(Role.HEATER);
    if (heater.isPresent() && !SetupSigns.electric(heater.get().kind())) {
      return;
    }
    String name = scene.name(Role.HEATER);
    String look = name + ".fed-from";
    Optional<String> from = heater.flatMap(h -> h.word("fed-from"));
    boolean fed = scene.rig().parts().values().stream().anyMatch(p -> p.word("feeds").or(() -> p.word("controls")).filter(name::equals).isPresent());
    boolean regulator = from.filter(f -> f.equals("regulator") || f.equals("own-thermostat") || scene.rig().parts().containsKey(f)).isPresent();
    if (from.filter("wall-socket"::equals).isPresent()) {
      out.seen("heater-controlled", name, "no", name + " is fed from the wall socket, by the rig file", null, look);
    } else if (fed || regulator) {
      out.seen("heater-controlled", name, "yes", name + " is fed through a regulator, by the rig file", null, look);
    } else {
      out.possible("heater-controlled", name, SignSet.domain("heater-controlled"), "what feeds " + name + " is not stated", List.of(regulatorLook(look)));
    }
  }

  /** Whether there is a regulator, then what it feeds, then what the heater is fed from. */
  private String regulatorLook(String fedFrom) {
    boolean none = scene.roles().all(Role.REGULATOR).isEmpty();
    boolean open = none && !scene.roles().absent().contains(Role.REGULATOR) && !scene.rig().nothingElse();
    return open ? RigSigns.usualName(Role.REGULATOR) + ".kind" : none ? fedFrom : scene.roles().all(Role.REGULATOR).get(0).name() + ".feeds";
  }

  private void charge() {
    boolean approved = scene.rig().datum("charge.approval.by").isPresent() && scene.rig().datum("charge.approval.on").isPresent();
    if (approved) {
      out.seen("charge-approved", "", "yes", "approved by " + scene.rig().word("charge.approval.by").orElse(""), null, "charge.approval.by");
    } else {
      out.seen("charge-approved", "", "no", "no written approval is stated", null, "charge.approval.by");
    }
    reacts();
    listed("foam-class", "charge.foams", "foams");
  }

  private void reacts() {
    Optional<Double> peroxide = scene.rig().si("charge.peroxide-test.result");
    if (peroxide.filter(p -> p > scene.limit("peroxide-max")).isPresent()) {
      out.seen("charge-reacts", "", "yes", "peroxide test over the limit, by the rig file", null, "charge.peroxide-test.result");
    } else {
      listed("charge-reacts", "charge.reacts-with-water", "reacts-with-water");
    }
  }

  private void listed(String about, String path, String plantKey) {
    Optional<String> word = scene.rig().word(path).or(() -> scene.plant().text(plantKey));
    if (word.isPresent()) {
      out.seen(about, "", word.get(), path + " " + word.get() + (scene.rig().word(path).isPresent() ? ", by the rig file" : ", by the plant list"), null, path);
    } else {
      out.possible(about, path + " is not known: the charge is on no list", path);
    }
  }

  private void splashGuard() {
    boolean guard = !scene.roles().all(Role.CLAISEN).isEmpty() || scene.roles().one(Role.HEAD).filter(h -> h.kind().equals("splash-head")).isPresent();
    boolean none = scene.roles().absent().contains(Role.CLAISEN) || scene.rig().nothingElse();
    if (guard || none) {
      out.seen("splash-guard", "", guard ? "yes" : "no", guard ? "a Claisen adapter or splash head stands before the condenser" : "no Claisen adapter or splash head, by the rig file", null, "claisen.kind");
    } else {
      out.possible("splash-guard", "no Claisen adapter or splash head is described", "claisen.kind");
    }
  }

  /** The port over the vapour that would hold the thermometer, where nothing else fills it. */
  private void thermometerPort() {
    Optional<Part> head = scene.roles().one(Role.HEAD);
    if (head.isEmpty()) {
      return;
    }
    Port top = new Port(head.get().name(), "top");
    boolean joined = scene.rig().joints().stream().anyMatch(j -> j.a().equals(top) || j.b().equals(top));
    String look = "openings." + top;
    Datum d = scene.rig().openings().get(top);
    if (joined || d != null && !d.text().equals("open")) {
      out.seen("thermometer-port", top.toString(), "joined", top + (joined ? " is joined" : " is closed"), null, look);
    } else if (d != null || scene.rig().nothingElse()) {
      out.seen("thermometer-port", top.toString(), "open", top + " is open", null, look);
    } else {
      out.possible("thermometer-port", top.toString(), SignSet.domain("thermometer-port"), top + " is in no joint and not stated", List.of(look));
    }
  }

  private void lacking(String about, String key, String piece) {
    Optional<Datum> d = scene.rig().datum(key);
    if (d.isPresent()) {
      out.seen(about, piece, d.get().text().equals("yes") ? "no" : "yes", scene.stated(d.get()), null, key);
    } else {
      out.possible(about, piece, SignSet.domain(about), key + " is not stated", List.of(key));
    }
  }

  /** Joint keys that no derived sign covers, only where stated: nobody is asked about grease. */
  private void jointKeys(Joint j) {
    for (Key k : Vocabulary.get().jointKeys().values()) {
      Datum d = j.keys().get(k.path());
      if (k.closed() && d != null) {
        out.seen("joint." + k.path(), j.toString(), d.text(), j + " " + k.path() + " " + d.text() + ", by the rig file", null, j.path() + "." + k.path());
      }
    }
  }

  private void hoodStated() {
    scene.rig().datum("place.hood.slots-clear").ifPresent(
        d -> out.seen("hood-slots", "", d.text().equals("yes") ? "clear" : "blocked", scene.stated(d), null, "place.hood.slots-clear"));
    Optional<Double> velocity = scene.run().lastSaw("face-velocity").flatMap(e -> e.measured()).map(q -> q.si()).or(() -> scene.rig().si("place.hood.face-velocity"));
    if (velocity.isPresent()) {
      boolean weak = velocity.get() < scene.limit("face-velocity-min");
      out.seen("hood-draught", "", weak ? "weak" : "enough", "face velocity " + velocity.get() + " m/s against " + scene.limit("face-velocity-min") + " m/s", null, "place.hood.face-velocity");
    } else {
      out.possible("hood-draught", "face velocity not stated", "place.hood.face-velocity");
    }
  }

  private void reach() {
    Optional<Datum> d = scene.key(Role.HEATER, "lowered-with-sash");
    if (d.isPresent()) {
      out.seen("heater-reach", "", d.get().text().equals("up") ? "sash-up" : "under-sash", scene.stated(d.get()), null, d.get().path());
    } else {
      out.seen("heater-reach", "under-sash", "not stated: taken to be reached under the sash");
    }
  }
}
