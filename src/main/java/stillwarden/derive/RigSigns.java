package stillwarden.derive;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Datum;
import stillwarden.describe.Entry;
import stillwarden.describe.Key;
import stillwarden.describe.Part;
import stillwarden.describe.Tree;
import stillwarden.describe.Vocabulary;

/**
 * Every closed key of the rig file as a sign by role: {@code flask.cracks}, {@code place.hood.running}. A key left out
 * is unknown; a part that this method needs and that is not in the file is unknown in all its keys.
 */
final class RigSigns {
  private static final Map<Role, String> USUAL = new EnumMap<>(Map.of(
      Role.HEATER, "mantle", Role.REGULATOR, "regulator", Role.FLASK, "flask", Role.CLAISEN, "claisen", Role.RESERVOIR, "reservoir",
      Role.HEAD, "head", Role.THERMOMETER, "thermometer", Role.CONDENSER, "condenser", Role.TAKE_OFF, "take-off", Role.RECEIVER, "receiver"));
  /** What the plant list says where the rig file is silent: rig key to plant key. */
  private static final Map<String, String> FROM_PLANT = Map.of(
      "charge.identified", "identified", "charge.gives-toxic-gas", "gives-toxic-gas", "charge.reacts-with-water", "reacts-with-water",
      "charge.foams", "foams", "charge.oil.burns", "burns", "charge.oil.toxic", "toxic");

  private final Scene scene;
  private final SignSet out;

  RigSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  /** The name that a question uses for a part that nobody has named yet. */
  static String usualName(Role role) {
    return USUAL.getOrDefault(role, role.word());
  }

  void make() {
    Vocabulary words = Vocabulary.get();
    words.facts().values().stream().filter(Key::closed).forEach(this::fact);
    words.permits().keySet().forEach(p -> out.seenIf(scene.policy().permits(p), "permits." + p, "site policy"));
    for (Role role : Role.values()) {
      partsOf(role);
    }
    missingParts();
  }

  private void fact(Key key) {
    Optional<Datum> d = scene.rig().datum(key.path());
    if (d.isPresent()) {
      value(key.path(), "", d.get().text(), key.path(), scene.stated(d.get()), key.values());
      return;
    }
    String plantKey = FROM_PLANT.get(key.path());
    Tree plant = scene.plant();
    Optional<String> listed = plantKey == null ? Optional.empty() : plant.text(plantKey);
    if (listed.isPresent()) {
      out.seen(key.path(), "", listed.get(), key.path() + " " + listed.get() + ", by the plant list (" + plant.text("name").orElse("") + ")", null, key.path());
    } else {
      out.possible(key.path(), "", key.values(), key.path() + " is not stated", List.of(key.path()));
    }
  }

  private void value(String about, String part, String word, String look, String evidence, List<String> values) {
    if (word.equals("unknown") && values.contains("unknown")) {
      out.possible(about, part, values, evidence, List.of(look));
    } else {
      out.seen(about, part, word, evidence, null, look);
    }
  }

  private void partsOf(Role role) {
    for (Part p : scene.roles().all(role)) {
      Vocabulary.get().keys(p.kind()).values().stream().filter(Key::closed).forEach(k -> keyOf(role, p, k));
    }
    if (scene.roles().missing().contains(role) && !scene.rig().nothingElse()) {
      String name = usualName(role);
      Vocabulary.get().keysOfRole(role.word()).values().stream().filter(Key::closed).forEach(
          k -> out.possible(role.word() + "." + k.path(), name, k.values(), name + " is not described", List.of(name + "." + k.path())));
    }
  }

  private void keyOf(Role role, Part p, Key key) {
    String about = role.word() + "." + key.path();
    String look = p.name() + "." + key.path();
    Datum d = p.keys().get(key.path());
    Optional<Entry> flows = flows(scene);
    if (about.equals("condenser.coolant.flow-proven") && flows.isPresent()) {
      out.seen(about, p.name(), "yes", scene.told(flows.get()), null, look);
    } else if (d != null) {
      value(about, p.name(), d.text(), look, scene.stated(d), key.values());
    } else {
      out.possible(about, p.name(), key.values(), look + " is not stated", List.of(look));
    }
  }

  private static Optional<Entry> flows(Scene scene) {
    return scene.run().lastSaw("coolant-running").filter(e -> e.text().equals("yes"));
  }

  /** All of a moment that these signs and those of {@link SetupSigns} depend on; the rest is the rig file. */
  static Object madeFrom(Scene scene) {
    return List.of(scene.live(), flows(scene), scene.offset());
  }

  private void missingParts() {
    for (Role role : Role.IN_FLASK) {
      String name = scene.name(role);
      if (!scene.roles().all(role).isEmpty()) {
        out.seen("part-missing", name, "no", name + " is described", null, name + ".kind");
      } else if (scene.roles().absent().contains(role) || scene.rig().nothingElse()) {
        out.seen("part-missing", name, "yes", "the rig file has no " + role.word(), null, name + ".kind");
      } else {
        out.possible("part-missing", name, List.of("no", "yes"), "no " + role.word() + " is described", List.of(name + ".kind"));
      }
    }
  }
}
