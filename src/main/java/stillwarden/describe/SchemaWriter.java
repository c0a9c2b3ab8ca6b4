package stillwarden.describe;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import tools.jackson.core.util.DefaultIndenter;
import tools.jackson.core.util.DefaultPrettyPrinter;
import tools.jackson.databind.ObjectWriter;
import tools.jackson.databind.json.JsonMapper;

/**
 * The JSON Schemas (2020-12) of the files that go in, written from the {@link Vocabulary}, so that schema and reader
 * can't drift apart. A schema knows shapes, not meanings: ranges, joints and inheritance are the reader's.
 */
public final class SchemaWriter {
  private static final ObjectWriter JSON = JsonMapper.builder().build().writer().with(printer());

  private final Vocabulary words = Vocabulary.get();

  /** The same line ends on every machine. */
  private static DefaultPrettyPrinter printer() {
    DefaultIndenter lines = new DefaultIndenter("  ", "\n");
    return new DefaultPrettyPrinter().withObjectIndenter(lines).withArrayIndenter(lines);
  }

  /** Names that {@link #schema} takes. */
  public static List<String> names() {
    return List.of("rig", "policy", "log");
  }

  /**
   * @param name {@code rig, policy} or {@code log} (of one line)
   * @throws IllegalArgumentException for any other name
   */
  public static String schema(String name) {
    SchemaWriter w = new SchemaWriter();
    return JSON.writeValueAsString(switch (name) {
      case "rig" -> w.rig();
      case "policy" -> w.policy();
      case "log" -> w.log();
      default -> throw new IllegalArgumentException("no schema `" + name + "`");
    }) + "\n";
  }

  private static Map<String, Object> top(String title) {
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("$schema", "https://json-schema.org/draft/2020-12/schema");
    out.put("title", title);
    return out;
  }

  private static Map<String, Object> object(Map<String, ?> properties, List<String> required) {
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("type", "object");
    out.put("properties", properties);
    if (!required.isEmpty()) {
      out.put("required", required);
    }
    out.put("additionalProperties", false);
    return out;
  }

  /** Dotted paths as nested objects. */
  private static Map<String, Object> nested(Map<String, Key> keys) {
    Map<String, Map<String, Key>> groups = new LinkedHashMap<>();
    keys.forEach((path, key) -> {
      int dot = path.indexOf('.');
      groups.computeIfAbsent(dot < 0 ? path : path.substring(0, dot), g -> new LinkedHashMap<>()).put(dot < 0 ? "" : path.substring(dot + 1), key);
    });
    Map<String, Object> out = new LinkedHashMap<>();
    groups.forEach((name, inner) -> out.put(name, inner.containsKey("") ? KeySchema.of(inner.get("")) : object(nested(inner), List.of())));
    return out;
  }

  private Map<String, Object> rig() {
    Map<String, Object> properties = new LinkedHashMap<>();
    properties.put("format", KeySchema.map("const", "stillwarden/rig/1"));
    properties.put("method", KeySchema.map("enum", words.methods().stream().filter(words::built).toList()));
    properties.put("based-on", KeySchema.pattern("\\S"));
    properties.putAll(nested(words.facts()));
    properties.put("parts", KeySchema.map("type", "object", "propertyNames", KeySchema.pattern("^[\\p{L}\\p{N}][\\p{L}\\p{N}_-]{0,39}$"), "additionalProperties", KeySchema.map("$ref", "#/$defs/part")));
    properties.put("joints", KeySchema.map("type", "array", "items", joint()));
    properties.put("openings", KeySchema.map("type", "object", "additionalProperties", KeySchema.of(words.opening())));
    Map<String, Object> out = top("A rig file of Stillwarden");
    out.putAll(object(properties, List.of("format")));
    out.put("if", KeySchema.map("not", KeySchema.map("required", List.of("based-on"))));
    out.put("then", KeySchema.map("properties", KeySchema.map("parts", KeySchema.map("additionalProperties", KeySchema.map("required", List.of("kind"))))));
    out.put("$defs", KeySchema.map("part", part()));
    return out;
  }

  private Map<String, Object> joint() {
    Map<String, Object> keys = new LinkedHashMap<>();
    keys.put("joins", KeySchema.map("type", "array", "items", KeySchema.pattern("\\S"), "minItems", 2, "maxItems", 2));
    keys.putAll(nested(words.jointKeys()));
    return object(keys, List.of("joins"));
  }

  private Map<String, Object> part() {
    List<String> kinds = new ArrayList<>(words.kinds());
    kinds.add("none");
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("type", "object");
    out.put("properties", KeySchema.map("kind", KeySchema.map("enum", kinds)));
    List<Object> cases = new ArrayList<>();
    for (String kind : kinds) {
      Map<String, Object> keys = new LinkedHashMap<>();
      keys.put("kind", KeySchema.map("const", kind));
      keys.putAll(nested(words.keys(kind)));
      cases.add(ifThen("kind", kind, object(keys, List.of())));
    }
    out.put("allOf", cases);
    return out;
  }

  private static Map<String, Object> ifThen(String key, String word, Object then) {
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("if", KeySchema.map("properties", KeySchema.map(key, KeySchema.map("const", word)), "required", List.of(key)));
    out.put("then", then);
    return out;
  }

  private Map<String, Object> policy() {
    Map<String, Object> properties = new LinkedHashMap<>();
    properties.put("format", KeySchema.map("const", "stillwarden/policy/1"));
    properties.putAll(nested(words.policyFacts()));
    properties.put("contacts", KeySchema.map("type", "object", "additionalProperties", KeySchema.pattern("\\S")));
    Map<String, Object> limits = new LinkedHashMap<>();
    SiteLimits.all().forEach((key, limit) -> limits.put(key, limit(limit)));
    properties.put("limits", object(limits, List.of()));
    properties.put("permits", object(nested(words.permits()), List.of()));
    Map<String, Object> shelf = new LinkedHashMap<>();
    words.observations().values().stream().filter(o -> o.shelf().isPresent()).forEach(o -> shelf.put(o.id(), KeySchema.quantity(Dimension.TIME, List.of())));
    properties.put("shelf-life", object(shelf, List.of()));
    properties.put("waivers", KeySchema.map("type", "array", "items", object(nested(words.waiver()), List.copyOf(words.waiver().keySet()))));
    Map<String, Object> out = top("A site policy of Stillwarden");
    out.putAll(object(properties, List.of("format")));
    return out;
  }

  private static Map<String, Object> limit(SiteLimits.Limit limit) {
    Map<String, Object> out = new LinkedHashMap<>();
    if (!limit.words().isEmpty()) {
      out.put("enum", limit.words());
    } else if (limit.dimension().orElseThrow() == Dimension.COUNT) {
      out.putAll(KeySchema.anyOf(KeySchema.map("type", "number", "minimum", 0), KeySchema.quantity(Dimension.FRACTION, List.of("%"))));
    } else {
      out.putAll(KeySchema.quantity(limit.dimension().get(), List.of()));
    }
    out.put("description", "guards: " + limit.guards());
    return out;
  }

  private Map<String, Object> log() {
    Map<String, Object> header = new LinkedHashMap<>();
    Knowledge.section("words").get("log").words("header").forEach(k -> header.put(k, KeySchema.pattern("\\S")));
    header.put("format", KeySchema.map("const", "stillwarden/log/1"));
    Map<String, Object> out = top("One line of a run log of Stillwarden");
    out.put("anyOf", List.of(object(header, List.of("format")), KeySchema.map("type", "object", "required", List.of("shown")), new LogSchema(words).entry()));
    return out;
  }

  /** An object of exactly these keys, for the schema of a line. */
  static Map<String, Object> closed(Map<String, ?> properties, List<String> required) {
    return object(properties, required);
  }

  static Map<String, Object> when(String key, String word, Object then) {
    return ifThen(key, word, then);
  }
}
