package stillwarden.describe;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The schema of a log line that reports something: which value goes with which word. */
final class LogSchema {
  private static final Map<String, Object> NAME = KeySchema.pattern("\\S");
  private static final Object NEVER = false;

  private final Vocabulary words;

  LogSchema(Vocabulary words) {
    this.words = words;
  }

  Map<String, Object> entry() {
    List<Observation> seen = words.observations().values().stream().filter(o -> !o.later()).toList();
    List<Deed> done = words.deeds().values().stream().filter(d -> !d.later()).toList();
    Map<String, Object> keys = new LinkedHashMap<>();
    keys.put("at", KeySchema.of(new Key("at", Key.Type.TIME, List.of(), java.util.Optional.empty(), List.of(), java.util.OptionalDouble.empty(),
        java.util.OptionalDouble.empty(), false, "", "")));
    List.of("by", "from", "part", "id", "corrects").forEach(k -> keys.put(k, NAME));
    keys.put("saw", KeySchema.map("enum", seen.stream().map(Observation::id).toList()));
    keys.put("did", KeySchema.map("enum", done.stream().map(Deed::id).toList()));
    List.of("value", "reach", "what").forEach(k -> keys.put(k, true));
    Map<String, Object> out = SchemaWriter.closed(keys, List.of("at"));
    List<Object> rules = new ArrayList<>();
    rules.add(oneOf("by", "from"));
    rules.add(oneOf("saw", "did"));
    seen.forEach(o -> rules.add(SchemaWriter.when("saw", o.id(), saw(o))));
    done.forEach(d -> rules.add(SchemaWriter.when("did", d.id(), did(d))));
    out.put("allOf", rules);
    return out;
  }

  private static Map<String, Object> oneOf(String a, String b) {
    return KeySchema.map("oneOf", List.of(KeySchema.map("required", List.of(a)), KeySchema.map("required", List.of(b))));
  }

  private static Map<String, Object> saw(Observation o) {
    Map<String, Object> keys = new LinkedHashMap<>();
    keys.put("value", KeySchema.anyOf(KeySchema.of(o.key()), KeySchema.map("const", "not-sure")));
    keys.put("reach", o.reach() ? KeySchema.words(List.of("yes", "no", "not-sure")) : NEVER);
    keys.put("what", o.what().isEmpty() ? NEVER : KeySchema.map("enum", o.what()));
    return rule(keys, !o.key().values().contains("yes"));
  }

  private static Map<String, Object> did(Deed d) {
    Map<String, Object> keys = new LinkedHashMap<>();
    keys.put("value", d.value().isPresent() ? KeySchema.of(d.value().get()) : NEVER);
    keys.put("reach", NEVER);
    keys.put("what", NEVER);
    return rule(keys, d.valueRequired());
  }

  private static Map<String, Object> rule(Map<String, Object> keys, boolean valueRequired) {
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("properties", keys);
    if (valueRequired) {
      out.put("required", List.of("value"));
    }
    return out;
  }
}
