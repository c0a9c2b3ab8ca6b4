package stillwarden.describe;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * A file as it is written, before any of it means something: words stay words, whatever YAML would make of them.
 *
 * @param text of a scalar as written; empty for maps and lists
 * @param flow true for YAML in braces or brackets, where a comma ends a value
 */
record Node(Kind kind, String text, List<Field> fields, List<Node> items, Spot spot, boolean flow) {
  private static final Pattern NUMBER =
      Pattern.compile("[-+]?(0o[0-7]+|0x[0-9a-fA-F]+|[0-9][0-9_]*(\\.[0-9]*)?([eE][-+]?[0-9]+)?|\\.[0-9]+([eE][-+]?[0-9]+)?|\\.(inf|Inf|INF))|\\.(nan|NaN|NAN)");

  enum Kind {
    MAP,
    LIST,
    /** A bare word of YAML. */
    WORD,
    /** Quoted in YAML; every string of JSON. */
    QUOTED,
    NUMBER,
    TRUE,
    FALSE,
    /** Nothing written, {@code null} or {@code ~}. */
    EMPTY
  }

  /** One key of a map with its value. */
  record Field(String key, Spot spot, Node value) {}

  static Node scalar(Kind kind, String text, Spot spot) {
    return new Node(kind, text, List.of(), List.of(), spot, false);
  }

  /** A bare YAML scalar: what looks like a number counts as one, so that {@code 012} is never taken for text. */
  static Node plain(String text, Spot spot) {
    boolean empty = text.isEmpty() || text.equals("~") || text.equalsIgnoreCase("null");
    return scalar(empty ? Kind.EMPTY : NUMBER.matcher(text).matches() ? Kind.NUMBER : Kind.WORD, text, spot);
  }

  static Node map(List<Field> fields, Spot spot, boolean flow) {
    return new Node(Kind.MAP, "", fields, List.of(), spot, flow);
  }

  static Node list(List<Node> items, Spot spot, boolean flow) {
    return new Node(Kind.LIST, "", List.of(), items, spot, flow);
  }

  Optional<Field> field(String key) {
    for (Field f : fields) {
      if (f.key.equals(key)) {
        return Optional.of(f);
      }
    }
    return Optional.empty();
  }

  Optional<Node> get(String key) {
    return field(key).map(Field::value);
  }

  boolean is(Kind k) {
    return kind == k;
  }

  /** A word, quoted or not. */
  boolean isText() {
    return kind == Kind.WORD || kind == Kind.QUOTED;
  }

  boolean isScalar() {
    return kind != Kind.MAP && kind != Kind.LIST;
  }

  Node without(String key) {
    return new Node(kind, text, fields.stream().filter(f -> !f.key.equals(key)).toList(), items, spot, flow);
  }

  Node with(Field field) {
    List<Field> out = new ArrayList<>(without(field.key).fields);
    out.add(field);
    return new Node(kind, text, out, items, spot, flow);
  }

  /** What it is, for a message. */
  String describe() {
    return switch (kind) {
      case MAP -> "a group of keys";
      case LIST -> "a list";
      case EMPTY -> "nothing";
      default -> Words.quote(text);
    };
  }
}
