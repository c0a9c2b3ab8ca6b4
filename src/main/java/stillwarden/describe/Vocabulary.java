package stillwarden.describe;

import java.time.Duration;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * The closed lists of what files can say, from {@code rules/words/{rig,log,policy}.yaml}. Every map keeps the order of
 * its file.
 */
public final class Vocabulary {
  /** A few dozen bounds stand under hundreds of keys; reading each once halves what a one-shot command waits for. */
  private static final Map<String, Double> BOUNDS = new HashMap<>();
  private static final Vocabulary ONLY = new Vocabulary();

  private final Tree rig = Knowledge.section("words").get("rig");
  private final Map<String, Key> facts = keys(rig.get("facts"));
  private final Map<String, Key> jointKeys = keys(rig.get("joints"));
  private final Key opening = key("openings", rig.get("openings"));
  private final Map<String, Kind> kinds = new LinkedHashMap<>();
  private final Map<String, Observation> observations = new LinkedHashMap<>();
  private final Map<String, Deed> deeds = new LinkedHashMap<>();
  private final Map<String, Key> policyFacts;
  private final Map<String, Key> permits;
  private final Map<String, Key> waiver;

  /** A kind of part: its role, its ports (where necks are counted, those of a single neck) and its keys by path. */
  private record Kind(String role, List<String> ports, boolean necks, Map<String, Key> keys) {}

  private Vocabulary() {
    rig.get("kinds").fields().forEach((name, t) -> kinds.put(name, kind(t)));
    Tree log = Knowledge.section("words").get("log");
    log.get("saw").fields().forEach((id, t) -> observations.put(id, observation(id, t)));
    Knowledge.section("actions").fields().keySet().forEach(id -> deeds.put(id, new Deed(id, Optional.empty(), false, false)));
    log.get("did").fields().forEach((id, t) -> deeds.put(id, deed(id, t)));
    Tree policy = Knowledge.section("words").get("policy");
    policyFacts = keys(policy.get("facts"));
    permits = keys(policy.get("permits"));
    waiver = keys(policy.get("waiver"));
  }

  public static Vocabulary get() {
    return ONLY;
  }

  /** Keys outside parts, joints and openings, by path. */
  public Map<String, Key> facts() {
    return facts;
  }

  public Set<String> kinds() {
    return kinds.keySet();
  }

  /** What a part of this kind does on the rig: {@code heater, jack, regulator, flask, ...}. */
  public Optional<String> role(String kind) {
    return Optional.ofNullable(kinds.get(kind)).map(Kind::role);
  }

  /** Every role that some kind has, in the order of the file. */
  public List<String> roles() {
    return kinds.values().stream().map(Kind::role).distinct().toList();
  }

  /** Ports of a kind; with a neck count given, those of a flask with so many necks. */
  public List<String> ports(String kind, OptionalDouble necks) {
    Kind k = kinds.get(kind);
    if (k == null || !k.necks || necks.orElse(1) <= 1) {
      return k == null ? List.of() : k.ports;
    }
    List<String> out = new ArrayList<>();
    for (int i = 1; i <= (int) necks.orElseThrow(); i++) {
      out.add("neck-" + i);
    }
    return out;
  }

  /** Ports of a part as it is described. */
  public List<String> ports(Part part) {
    return ports(part.kind(), part.si("necks").map(OptionalDouble::of).orElse(OptionalDouble.empty()));
  }

  /** Keys that a part of this kind takes, by path without the part's name. */
  public Map<String, Key> keys(String kind) {
    return kinds.containsKey(kind) ? kinds.get(kind).keys : Map.of();
  }

  /** Keys that any kind of this role takes, by path. */
  public Map<String, Key> keysOfRole(String role) {
    Map<String, Key> out = new LinkedHashMap<>();
    kinds.values().stream().filter(k -> k.role.equals(role)).forEach(k -> k.keys.forEach(out::putIfAbsent));
    return out;
  }

  /** True for a kind that can crack. */
  public boolean glass(String kind) {
    return keys(kind).containsKey("cracks");
  }

  public Map<String, Key> jointKeys() {
    return jointKeys;
  }

  /** The states of a port that is in no joint. */
  public Key opening() {
    return opening;
  }

  /** The role that a part of kind {@code none} says there is none of, read off its name. */
  public Optional<String> noneOf(String name) {
    if (roles().contains(name)) {
      return Optional.of(name);
    }
    return role(name).or(() -> rig.get("none-names").text(name));
  }

  /** Names that a part of kind {@code none} can have. */
  List<String> noneNames() {
    List<String> out = new ArrayList<>(roles());
    out.addAll(kinds());
    out.addAll(rig.get("none-names").fields().keySet());
    return out;
  }

  public Set<String> methods() {
    return rig.get("methods").fields().keySet();
  }

  /** True when rigs of this method can be judged. */
  public boolean built(String method) {
    return rig.get("methods").get(method).text("built").filter("yes"::equals).isPresent();
  }

  /** Sections and kinds of methods that can't be judged yet. */
  boolean later(String word) {
    return rig.get("later").words("sections").contains(word) || rig.get("later").words("kinds").contains(word);
  }

  public Map<String, Observation> observations() {
    return observations;
  }

  public Optional<Observation> observation(String id) {
    return Optional.ofNullable(observations.get(id));
  }

  public Map<String, Deed> deeds() {
    return deeds;
  }

  /** Shorter shelf life of an observation in a case ({@code after-disturbance, heat-up, freezing}), where there is one. */
  public Optional<Duration> shelfIn(String situation, String observation) {
    return Knowledge.section("words").get("log").get(situation).text(observation).map(Vocabulary::duration);
  }

  Map<String, Key> policyFacts() {
    return policyFacts;
  }

  public Map<String, Key> permits() {
    return permits;
  }

  Map<String, Key> waiver() {
    return waiver;
  }

  private Kind kind(Tree t) {
    Map<String, Key> keys = new LinkedHashMap<>();
    t.words("sets").forEach(set -> keys.putAll(keys(rig.get("sets").get(set))));
    keys.putAll(keys(t.get("keys")));
    return new Kind(t.text("role").orElseThrow(), t.words("ports"), yes(t, "necks"), keys);
  }

  private static Observation observation(String id, Tree t) {
    return new Observation(id, key(id, t), t.text("kind").filter("look"::equals).isPresent(), t.text("shelf").map(Vocabulary::duration),
        t.text("quarter-of").orElse(""), t.text("part").orElse(""), yes(t, "later"), yes(t, "reach"), t.words("what"));
  }

  private static Deed deed(String id, Tree t) {
    Optional<Key> value = t.has("type") ? Optional.of(key(id, t)) : Optional.empty();
    return new Deed(id, value, t.text("value").filter("required"::equals).isPresent(), yes(t, "later"));
  }

  private static Map<String, Key> keys(Tree t) {
    Map<String, Key> out = new LinkedHashMap<>();
    t.fields().forEach((path, k) -> out.put(path, key(path, k)));
    return out;
  }

  static Key key(String path, Tree t) {
    Key.Type type = Key.Type.valueOf(t.text("type").orElseThrow().toUpperCase(java.util.Locale.ROOT));
    Optional<Dimension> dimension = type == Key.Type.COUNT ? Optional.of(Dimension.COUNT) : t.text("dimension").map(Units::dimension);
    return new Key(path, type, type == Key.Type.TRI ? calmFirst(t) : t.words("values"), dimension, t.words("codes"),
        bound(t.text("from"), dimension), bound(t.text("to"), dimension), yes(t, "wears"), t.text("list").orElse(""), t.text("means").orElse(""));
  }

  private static List<String> calmFirst(Tree t) {
    return t.text("calm").orElseThrow().equals("yes") ? List.of("yes", "no") : List.of("no", "yes");
  }

  private static OptionalDouble bound(Optional<String> text, Optional<Dimension> d) {
    if (text.isEmpty()) {
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(d.orElseThrow() == Dimension.COUNT ? Double.parseDouble(text.get())
        : BOUNDS.computeIfAbsent(d.get() + " " + text.get(), t -> si(text.get(), d.get())));
  }

  static Duration duration(String text) {
    return Duration.ofMillis(Math.round(si(text, Dimension.TIME) * 1000));
  }

  /** Our own rule data: an unreadable quantity in it is a fault of the build, not of a user. */
  private static double si(String text, Dimension d) {
    try {
      return Units.read(text, d).si();
    } catch (BadValue e) {
      throw new IllegalStateException("rules/words: " + e.getMessage(), e);
    }
  }

  private static boolean yes(Tree t, String key) {
    return t.text(key).filter("yes"::equals).isPresent();
  }
}
