package stillwarden.describe;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** A plain tree of maps, lists and words, as the rule data are written; read-only, never null inside. */
public record Tree(Object raw) {
  public static final Tree EMPTY = new Tree(Map.of());

  /** The child, or an empty tree. */
  public Tree get(String key) {
    Object v = raw instanceof Map<?, ?> m ? m.get(key) : null;
    return v == null ? EMPTY : new Tree(v);
  }

  public boolean has(String key) {
    return raw instanceof Map<?, ?> m && m.containsKey(key);
  }

  public Optional<String> text() {
    return raw instanceof Map || raw instanceof List ? Optional.empty() : Optional.of(raw.toString());
  }

  public Optional<String> text(String key) {
    return get(key).text();
  }

  /** A number that the data file wrote as a number; words are not converted. */
  public OptionalDouble number(String key) {
    return get(key).raw instanceof Number n ? OptionalDouble.of(n.doubleValue()) : OptionalDouble.empty();
  }

  /** Children of a map in file order; empty for anything else. */
  public Map<String, Tree> fields() {
    Map<String, Tree> out = new LinkedHashMap<>();
    if (raw instanceof Map<?, ?> m) {
      m.forEach((k, v) -> out.put(k.toString(), new Tree(v)));
    }
    return out;
  }

  /** Items of a list; a single word counts as a list of one; a map or nothing as an empty one. */
  public List<Tree> items() {
    List<Tree> out = new ArrayList<>();
    if (raw instanceof List<?> l) {
      l.forEach(v -> out.add(new Tree(v)));
    } else if (!(raw instanceof Map)) {
      out.add(this);
    }
    return out;
  }

  public List<String> words(String key) {
    return get(key).items().stream().flatMap(t -> t.text().stream()).toList();
  }
}
