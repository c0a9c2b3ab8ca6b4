package stillwarden.derive;

import java.util.List;
import java.util.Optional;
import java.util.Set;
import stillwarden.describe.Datum;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Port;
import stillwarden.describe.Vocabulary;

/** Set-up signs that take more than one key: glass, joints, devices, heater, charge. */
final class SetupSigns {
  /** Pairs of roles whose joint is held by its own weight (contract of the rig file: these need no clip). */
  private static final Set<Set<Role>> BY_WEIGHT =
      Set.of(Set.of(Role.FLASK, Role.CLAISEN), Set.of(Role.CLAISEN, Role.RESERVOIR), Set.of(Role.HEAD, Role.THERMOMETER));
  private static final Set<String> ELECTRIC = Set.of("heating-mantle", "oil-bath", "water-bath", "hot-plate");

  private final Scene scene;
  private final SignSet out;

  SetupSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    scene.rig().parts().values().stream().filter(p -> Vocabulary.get().glass(p.kind())).forEach(this::glass);
    if (!scene.rig().nothingElse()) {
      scene.roles().missing().stream().filter(r -> r != Role.HEATER).forEach(this::glassToCome);
    }
    scene.rig().joints().forEach(this::joint);
    if (scene.rig().joints().isEmpty()) {
      for (String about : List.of("joint-retained", "joint-seated", "joint-seat")) {
        out.possible(about, "no joint is described", "joints");
      }
    }
    devices();
    heater();
    charge();
    people();
    vent();
  }

  private void glass(Part p) {
    Optional<String> cracks = p.word("cracks");
    String look = p.name() + ".cracks";
    if (cracks.isPresent()) {
      out.seen("glass-cracked", p.name(), cracks.get(), scene.stated(p.keys().get("cracks")), null, look);
    } else {
      out.possible("glass-cracked", p.name(), SignSet.domain("glass-cracked"), p.name() + " has not been looked over", List.of(look));
    }
  }

  private void glassToCome(Role role) {
    String name = RigSigns.usualName(role);
    out.possible("glass-cracked", name, SignSet.domain("glass-cracked"), name + " is not described", List.of(name + ".cracks"));
  }

  private void joint(Joint j) {
    retained(j);
    simple("joint-seated", j, "seated", "yes");
    j.word("chipped").filter("yes"::equals).ifPresent(
        w -> out.seen("glass-cracked", j.toString(), "yes", j + " is chipped, by the rig file", null, j.path() + ".chipped"));
    String seat = scene.numbers().seat(j);
    if (seat.isEmpty()) {
      out.possible("joint-seat", j.toString(), SignSet.domain("joint-seat"), j + ": no size stated", List.of(j.path() + ".size"));
    } else {
      out.seen("joint-seat", j.toString(), seat, j + " " + j.word("size").orElse("") + ": " + seat, null, j.path() + ".size");
    }
  }

  private void simple(String about, Joint j, String key, String calm) {
    Optional<String> w = j.word(key);
    if (w.isPresent()) {
      out.seen(about, j.toString(), w.get(), j + " " + key + " " + w.get() + ", by the rig file", null, j.path() + "." + key);
    } else {
      out.possible(about, j.toString(), SignSet.domain(about), j + ": " + key + " is not stated", List.of(j.path() + "." + key));
    }
  }

  private void retained(Joint j) {
    String look = j.path() + ".clipped";
    Optional<Role> a = scene.roles().of(j.a().part());
    Optional<Role> b = scene.roles().of(j.b().part());
    boolean weight = a.isPresent() && b.isPresent() && BY_WEIGHT.contains(Set.of(a.get(), b.get()));
    boolean held = weight || j.word("clipped").filter("yes"::equals).isPresent() || j.word("held-by").filter(w -> w.equals("clip") || w.equals("clamp")).isPresent();
    if (held) {
      out.seen("joint-retained", j.toString(), "yes", j + (weight ? " is held by its own weight" : " is held"), null, look);
    } else if (j.word("clipped").isPresent() || j.word("held-by").isPresent()) {
      out.seen("joint-retained", j.toString(), "no", j + " is not held, by the rig file", null, look);
    } else {
      out.possible("joint-retained", j.toString(), SignSet.domain("joint-retained"), j + ": clip not stated", List.of(look));
    }
  }

  private void devices() {
    for (Part p : scene.rig().parts().values()) {
      if (Vocabulary.get().keys(p.kind()).containsKey("cord-sound")) {
        cord(p);
        protection(p);
      }
    }
    if (scene.roles().missing().contains(Role.HEATER) && !scene.rig().nothingElse()) {
      String name = RigSigns.usualName(Role.HEATER);
      out.possible("cord-bad", name, SignSet.domain("cord-bad"), name + " is not described", List.of(name + ".cord-sound"));
      out.possible("residual-current-protected", name, SignSet.domain("residual-current-protected"), name + " is not described",
          List.of(name + ".residual-current-protected"));
    }
  }

  private void cord(Part p) {
    Optional<String> bad = Optional.of(p).filter(x -> x.word("cord-sound").filter("no"::equals).isPresent() || x.word("earthed").filter("no"::equals).isPresent())
        .map(x -> "yes").or(() -> p.word("cord-sound").map(w -> "no"));
    String look = p.name() + ".cord-sound";
    if (bad.isPresent()) {
      out.seen("cord-bad", p.name(), bad.get(), p.name() + (bad.get().equals("yes") ? ": lead, plug or earth not sound" : ": lead and plug sound") + ", by the rig file", null, look);
    } else {
      out.possible("cord-bad", p.name(), SignSet.domain("cord-bad"), look + " is not stated", List.of(look));
    }
  }

  /** A heater behind a protected regulator is protected with it. */
  private void protection(Part p) {
    Optional<Part> feeder = scene.roles().all(Role.REGULATOR).stream().filter(r -> r.word("feeds").filter(p.name()::equals).isPresent()).findFirst();
    Optional<String> own = p.word("residual-current-protected");
    Optional<String> word = own.filter("yes"::equals).or(() -> feeder.flatMap(f -> f.word("residual-current-protected"))).or(() -> own);
    String look = feeder.map(Part::name).orElse(p.name()) + ".residual-current-protected";
    if (scene.says("place.outlets-near-water", "no")) {
      out.seen("residual-current-protected", p.name(), "yes", "no outlet near water, by the rig file", null, look);
      return;
    }
    if (word.filter("no"::equals).isPresent() && !scene.says("place.outlets-near-water", "yes")) {
      out.possible("residual-current-protected", p.name(), List.of("no"), p.name() + " is not protected, and nobody said whether water is near", List.of("place.outlets-near-water"));
      return;
    }
    if (word.isPresent()) {
      out.seen("residual-current-protected", p.name(), word.get(), p.name() + " residual current protected " + word.get() + ", by the rig file", null, look);
    } else {
      out.possible("residual-current-protected", p.name(), SignSet.domain("residual-current-protected"), look + " is not stated", List.of(look));
    }
  }

  private void heater() {
    Optional<Part> heater = scene.roles().one(Role.HEATER);
    if (heater.isEmpty()) {
      out.possible("heater-kind", "no heater is described", "mantle.kind");
      out.unknown("heater-lowers", "no", "no heater is described", "mantle.stands-on");
      out.possible("heater-carries-flask", "the flask's support is not stated", scene.name(Role.FLASK) + ".carried-by");
      return;
    }
    Part h = heater.get();
    String kind = h.kind().equals("gas-burner") ? "burner" : h.kind().endsWith("-bath") ? "bath" : "electric";
    out.seen("heater-kind", h.name(), kind, h.name() + " is a " + h.kind(), null, h.name() + ".kind");
    carries();
    lowers(h);
  }

  private void carries() {
    Optional<Datum> by = scene.key(Role.FLASK, "carried-by");
    String look = scene.name(Role.FLASK) + ".carried-by";
    if (by.isPresent()) {
      out.seen("heater-carries-flask", scene.name(Role.HEATER), by.get().text().equals("heater") ? "yes" : "no", scene.stated(by.get()), null, look);
    } else if (scene.is(Role.FLASK, "clamped", "yes")) {
      out.seen("heater-carries-flask", scene.name(Role.HEATER), "no", "the flask is clamped, by the rig file", null, look);
    } else {
      out.possible("heater-carries-flask", scene.name(Role.HEATER), SignSet.domain("heater-carries-flask"), look + " is not stated", List.of(look));
    }
  }

  /** Lowerable only when every part of it is known: what stands under it, that it has room to drop, and how it drops. */
  private void lowers(Part h) {
    Optional<String> on = h.word("stands-on");
    if (on.isEmpty()) {
      out.unknown("heater-lowers", h.name(), "no", h.name() + ".stands-on is not stated", List.of(h.name() + ".stands-on"));
      return;
    }
    Part jack = scene.rig().parts().get(on.get());
    if (jack == null && !on.get().equals("ring") && !on.get().equals("bench")) {
      out.unknown("heater-lowers", h.name(), "no", h.name() + " stands on the " + on.get() + ", which is not described", List.of(on.get() + ".kind"));
      return;
    }
    if (jack == null || !jack.kind().equals("lab-jack")) {
      boolean ring = on.get().equals("ring");
      out.seen("heater-lowers", h.name(), ring ? "winding" : "no", h.name() + " stands on the " + on.get() + ", by the rig file", null, h.name() + ".stands-on");
      return;
    }
    for (String key : List.of("raised", "clear-to-lower")) {
      if (jack.word(key).filter("no"::equals).isPresent()) {
        out.seen("heater-lowers", h.name(), "no", jack.name() + " " + key + " no, by the rig file", null, jack.name() + "." + key);
        return;
      }
    }
    List<String> missing = List.of("raised", "clear-to-lower").stream().filter(k -> jack.word(k).isEmpty()).map(k -> jack.name() + "." + k).toList();
    if (missing.isEmpty()) {
      // a drop that nobody has described is taken for the slower one
      out.seen("heater-lowers", h.name(), jack.word("drop").orElse("winding"), h.name() + " on " + jack.name() + ", raised and clear to lower", null, jack.name() + ".drop");
    } else {
      out.unknown("heater-lowers", h.name(), "no", String.join(", ", missing) + " not stated", missing);
    }
  }

  private void charge() {
    boolean listed = scene.plant().has("name");
    if (listed || scene.says("charge.identified", "yes")) {
      out.seen("charge-identified", "yes", listed ? "the plant list knows it: " + scene.plant().text("name").orElse("") : "charge identified, by the rig file");
    } else if (scene.says("charge.identified", "no")) {
      out.seen("charge-identified", "", "no", "charge not identified, by the rig file", null, "charge.plant", "charge.identified");
    } else {
      out.possible("charge-identified", "charge not identified", "charge.plant");
    }
    toxic();
    burns();
    yesNo("oil-toxic", "charge.oil.toxic", "toxic", "yes");
  }

  private void toxic() {
    boolean yes = List.of("charge.gives-toxic-gas", "charge.oil.toxic").stream().anyMatch(p -> scene.says(p, "yes"))
        || List.of("gives-toxic-gas", "toxic").stream().anyMatch(k -> scene.plant().text(k).filter("yes"::equals).isPresent());
    boolean no = scene.plant().has("name") || scene.says("charge.gives-toxic-gas", "no") && scene.says("charge.oil.toxic", "no") || scene.says("charge.identified", "yes");
    if (yes || no) {
      out.seen("charge-toxic", "", yes ? "yes" : "no", "charge toxic " + (yes ? "yes" : "no") + ", by the rig file and the plant list", null, "charge.gives-toxic-gas");
    } else {
      out.possible("charge-toxic", "nobody has said whether the charge gives a poison", "charge.plant");
    }
  }

  private void burns() {
    if (scene.rig().datum("charge.oil.burns").isEmpty() && scene.rig().datum("charge.oil.flash-point").isPresent()) {
      out.seen("oil-burns", "", "yes", "the oil has a flash point, by the rig file", null, "charge.oil.burns");
    } else {
      yesNo("oil-burns", "charge.oil.burns", "burns", "yes");
    }
  }

  private void yesNo(String about, String path, String plantKey, String worst) {
    Optional<String> word = scene.rig().word(path).or(() -> scene.plant().text(plantKey));
    if (word.isPresent()) {
      out.seen(about, "", word.get(), path + " " + word.get(), null, path);
    } else {
      out.unknown(about, worst, path + " is not stated", path);
    }
  }

  private void people() {
    boolean yes = scene.says("people.second-person-in-call", "yes") || scene.says("people.timed-check-in", "yes")
        || scene.rig().si("people.people-at-rig").filter(n -> n >= 2).isPresent();
    boolean no = scene.says("people.second-person-in-call", "no");
    if (yes || no) {
      out.seen("help", "", yes ? "second-person" : "alone", yes ? "a second person or a timed check-in, by the rig file" : "nobody in call, by the rig file", null, "people.second-person-in-call");
    } else {
      out.possible("help", "nobody has said who is in call", "people.second-person-in-call");
    }
    boolean permitted = scene.policy().permits("open-bench-water-only") && scene.says("charge.oil.burns", "no") && scene.says("charge.oil.toxic", "no");
    out.seen("hood-needed", permitted ? "no" : "yes", permitted ? "the site permits water alone on an open bench" : "a hood is needed");
  }

  private void vent() {
    Optional<Datum> to = scene.roles().one(Role.VENT_HOSE).flatMap(p -> Optional.ofNullable(p.keys().get("vents-to"))).or(() -> scene.key(Role.TAKE_OFF, "vents-to"));
    String look = scene.name(Role.TAKE_OFF) + ".vents-to";
    if (to.isPresent()) {
      out.seen("vent-place", "", to.get().text(), scene.stated(to.get()), null, to.get().path());
    } else {
      out.possible("vent-place", "where the vent points is not stated", look);
    }
  }

  /** One sign a port of the rig: joined, or as the file says, or unknown. */
  void ports() {
    for (Port p : scene.rig().openings().keySet()) {
      Datum d = scene.rig().openings().get(p);
      out.seen("port-state", p.toString(), d.text(), scene.stated(d), null, "openings." + p);
    }
  }

  static boolean electric(String kind) {
    return ELECTRIC.contains(kind);
  }
}
