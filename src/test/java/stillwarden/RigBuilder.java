package stillwarden;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.function.Predicate;
import stillwarden.describe.Datum;
import stillwarden.describe.Dimension;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Port;
import stillwarden.describe.Quantity;
import stillwarden.describe.Rig;
import stillwarden.describe.Spot;

/**
 * Rigs for tests without files. Paths are those of the rig file ({@code take-off.side-arm}, {@code place.elevation},
 * {@code openings.head.top}, {@code joints[3].seated}); a path whose first word is a part's name is a key of that part.
 */
public final class RigBuilder {
  private static final Spot HERE = new Spot("good.rig.yaml", 0, 0);

  private static final Set<String> SECTIONS =
      Set.of("seen", "nothing-else", "place", "charge", "target", "people", "emergency", "steam", "work-up", "notes");

  private final Map<String, Datum> facts = new LinkedHashMap<>();
  private final Map<String, String> kinds = new LinkedHashMap<>();
  private final Map<String, Map<String, Datum>> keys = new LinkedHashMap<>();
  private final List<Joint> joints = new ArrayList<>();
  private final Map<Port, Datum> openings = new TreeMap<>();
  private String name = "Bench 4, fennel";
  private String method = "in-flask";

  private RigBuilder() {}

  public static RigBuilder empty() {
    return new RigBuilder();
  }

  /** The example rig of the contract, complete, to be changed: {@code good().with("take-off.side-arm", "stoppered").rig()}. */
  public static RigBuilder good() {
    return GoodRig.fill(new RigBuilder());
  }

  /** The same, as it stands. */
  public static Rig goodRig() {
    return good().rig();
  }

  public RigBuilder named(String newName) {
    name = newName;
    return this;
  }

  public RigBuilder method(String newMethod) {
    method = newMethod;
    return this;
  }

  /** A part with alternating keys and words. */
  public RigBuilder part(String part, String kind, String... keysAndWords) {
    kinds.put(part, kind);
    keys.putIfAbsent(part, new LinkedHashMap<>());
    for (int i = 0; i < keysAndWords.length; i += 2) {
      with(part + "." + keysAndWords[i], keysAndWords[i + 1]);
    }
    return this;
  }

  public RigBuilder with(String path, String word) {
    return put(path, new Datum(path, word, Optional.empty(), HERE));
  }

  public RigBuilder quantity(String path, double si, Dimension dimension, String text) {
    return put(path, new Datum(path, text, Optional.of(new Quantity(si, dimension, text)), HERE));
  }

  public RigBuilder without(String path) {
    return put(path, null);
  }

  /** A part goes, with every joint and opening of it. */
  public RigBuilder drop(String part) {
    kinds.remove(part);
    keys.remove(part);
    openings.keySet().removeIf(p -> p.part().equals(part));
    return unjoinIf(j -> j.a().part().equals(part) || j.b().part().equals(part));
  }

  public RigBuilder join(String a, String b) {
    return join(a, b, "24/40", "yes");
  }

  public RigBuilder join(String a, String b, String size, String clipped) {
    int i = joints.size();
    Map<String, Datum> k = new LinkedHashMap<>();
    Map.of("size", size, "greased", "yes", "clipped", clipped, "seated", "yes")
        .forEach((key, word) -> k.put(key, new Datum("joints[" + i + "]." + key, word, Optional.empty(), HERE)));
    joints.add(new Joint(i, port(a), port(b), k));
    return this;
  }

  /** Takes the joint at one port away. */
  public RigBuilder unjoin(String port) {
    return unjoinIf(j -> j.a().equals(port(port)) || j.b().equals(port(port)));
  }

  public Rig rig() {
    Map<String, Part> parts = new LinkedHashMap<>();
    kinds.forEach((part, kind) -> parts.put(part, new Part(part, kind, keys.get(part))));
    return new Rig("good.rig.yaml", name, method, Map.copyOf(facts), parts, List.copyOf(joints), new TreeMap<>(openings), "sha256:0");
  }

  /** {@code claisen.foot}; a part named alone has a port with an empty name. */
  public static Port port(String text) {
    int dot = text.indexOf('.');
    return dot < 0 ? new Port(text, "") : new Port(text.substring(0, dot), text.substring(dot + 1));
  }

  private RigBuilder put(String path, Datum datum) {
    int dot = path.indexOf('.');
    String first = dot < 0 ? path : path.substring(0, dot);
    String rest = path.substring(dot + 1);
    if (first.equals("openings")) {
      set(openings, port(rest), datum);
    } else if (first.startsWith("joints[")) {
      onJoint(Integer.parseInt(first.substring(7, first.length() - 1)), rest, datum);
    } else if (kinds.containsKey(first)) {
      onPart(first, rest, datum);
    } else if (SECTIONS.contains(first)) {
      set(facts, path, datum);
    } else {
      throw new IllegalArgumentException("`" + first + "` is neither a part of this rig nor a section of the file");
    }
    return this;
  }

  private void onPart(String part, String key, Datum datum) {
    if (key.equals("kind") && datum != null) {
      kinds.put(part, datum.text());
    } else {
      set(keys.get(part), key, datum);
    }
  }

  private void onJoint(int index, String key, Datum datum) {
    Joint j = joints.get(index);
    Map<String, Datum> k = new LinkedHashMap<>(j.keys());
    set(k, key, datum);
    joints.set(index, new Joint(index, j.a(), j.b(), k));
  }

  private static <K> void set(Map<K, Datum> map, K key, Datum datum) {
    if (datum == null) {
      map.remove(key);
    } else {
      map.put(key, datum);
    }
  }

  private RigBuilder unjoinIf(Predicate<Joint> test) {
    List<Joint> left = joints.stream().filter(test.negate()).toList();
    joints.clear();
    left.forEach(j -> joints.add(new Joint(joints.size(), j.a(), j.b(), j.keys())));
    return this;
  }
}
