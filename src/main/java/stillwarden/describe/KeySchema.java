package stillwarden.describe;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** One {@link Key} as a JSON Schema: what {@link Values} takes, as far as a schema can say it. */
final class KeySchema {
  private static final String NUMBER = "[+-]?(0|[1-9][0-9]*)(\\.[0-9]+)?([eE][+-]?[0-9]+)?";
  private static final String DATE = "\\d{4}-\\d{2}-\\d{2}";
  private static final String TIME = DATE + "T\\d{2}:\\d{2}:\\d{2}(\\.\\d{1,9})?(Z|[+-]\\d{2}:\\d{2})";
  private static final Pattern SPECIAL = Pattern.compile("([\\\\.\\[\\]{}()*+?^$|/-])");

  private KeySchema() {}

  static Map<String, Object> of(Key key) {
    Map<String, Object> out = new LinkedHashMap<>(switch (key.type()) {
      case TRI, CHOICE -> words(key.values());
      case QUANTITY -> quantity(key.dimension().orElseThrow(), key.codes());
      case LEVEL -> anyOf(words(key.values()), quantity(key.dimension().orElseThrow(), key.codes()));
      case COUNT -> count(key);
      case TEXT -> listed(key.list(), pattern("\\S"));
      case PART -> pattern("\\S");
      case TIME -> pattern("^" + TIME + "$");
      case DATE -> pattern("^" + DATE + "$");
      case UNTIL -> pattern("^(" + DATE + "|" + TIME + ")$");
      case SIZE -> pattern("^(ball )?[1-9][0-9]?(\\.[0-9])?/[1-9][0-9]?( in (ball )?[1-9][0-9]?(\\.[0-9])?/[1-9][0-9]?)?$");
      case SHARES -> shares(key);
    });
    if (!key.means().isEmpty()) {
      out.put("description", key.means());
    }
    return out;
  }

  /** Words; where yes or no is one of them JSON's true and false go as well. */
  static Map<String, Object> words(List<String> words) {
    List<Object> values = new ArrayList<>(words);
    if (words.contains("yes")) {
      values.add(true);
    }
    if (words.contains("no")) {
      values.add(false);
    }
    return map("enum", values);
  }

  static Map<String, Object> quantity(Dimension d, List<String> codes) {
    List<String> units = codes.isEmpty() ? Units.codes(d) : codes;
    String alternatives = units.stream().map(u -> SPECIAL.matcher(u).replaceAll("\\\\$1")).collect(Collectors.joining("|"));
    return pattern("^ *" + NUMBER + " *(" + alternatives + ") *$");
  }

  /** Keys and values in turn; keeps their order, so that a schema is the same text on every run. */
  static Map<String, Object> map(Object... pairs) {
    Map<String, Object> out = new LinkedHashMap<>();
    for (int i = 0; i < pairs.length; i += 2) {
      out.put((String) pairs[i], pairs[i + 1]);
    }
    return out;
  }

  static Map<String, Object> anyOf(Object... schemas) {
    return map("anyOf", List.of(schemas));
  }

  static Map<String, Object> pattern(String pattern) {
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("type", "string");
    out.put("pattern", pattern);
    return out;
  }

  private static Map<String, Object> count(Key key) {
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("type", "integer");
    key.from().ifPresent(f -> out.put("minimum", (int) f));
    key.to().ifPresent(t -> out.put("maximum", (int) t));
    return out;
  }

  private static Map<String, Object> listed(String list, Map<String, Object> otherwise) {
    List<String> names = list.isEmpty() ? List.of() : Values.listed(list);
    return names.isEmpty() ? otherwise : map("enum", names);
  }

  private static Map<String, Object> shares(Key key) {
    Map<String, Object> out = new LinkedHashMap<>();
    out.put("type", "object");
    out.put("minProperties", 1);
    out.put("propertyNames", pattern("\\S"));
    out.put("additionalProperties", quantity(Dimension.FRACTION, List.of("%")));
    return out;
  }
}
