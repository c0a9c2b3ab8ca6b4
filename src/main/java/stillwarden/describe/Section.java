package stillwarden.describe;

import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Reads a group of keys, nested groups included, by a closed list.
 *
 * @param keys what may stand here, by path: {@code hood.running}
 * @param where for the message about an unknown key: {@code a round-bottom flask}
 * @param besides keys of the same place that somebody else reads: a misspelling of theirs finds them too
 * @param prefix what stands before the path of each datum: {@code flask.}, or empty
 */
record Section(Map<String, Key> keys, String where, String prefix, List<String> besides, Defects defects) {
  Section(Map<String, Key> keys, String where, String prefix, Defects defects) {
    this(keys, where, prefix, List.of(), defects);
  }

  /** The data of the group by path, without the prefix; everything wrong goes to {@code defects}. */
  Map<String, Datum> read(Node group) {
    Map<String, Datum> out = new LinkedHashMap<>();
    group(group, "", out);
    return out;
  }

  private void group(Node group, String at, Map<String, Datum> out) {
    for (Node.Field f : group.fields()) {
      String path = at + f.key();
      Key key = keys.get(path);
      if (key != null) {
        value(key, path, f.value(), out);
      } else if (!names(path + ".").isEmpty()) {
        inner(f, path, out);
      } else {
        unknown(f, at);
      }
    }
  }

  private void inner(Node.Field f, String path, Map<String, Datum> out) {
    if (f.value().is(Node.Kind.MAP)) {
      group(f.value(), path + ".", out);
    } else {
      defects.add(f.value().spot(), Words.quote(f.key()) + " takes keys (" + Words.list(names(path + ".")) + "), here is " + f.value().describe());
    }
  }

  private void value(Key key, String path, Node n, Map<String, Datum> out) {
    if (key.type() == Key.Type.SHARES) {
      new Shares(key, prefix + path, defects).read(n).forEach((name, d) -> out.put(path + "." + name, d));
      return;
    }
    try {
      Datum d = Values.read(key, prefix + path, n);
      out.put(path, d);
      listed(key, d);
    } catch (BadValue e) {
      defects.add(n.spot(), e.getMessage());
    }
  }

  private void listed(Key key, Datum d) {
    List<String> known = key.list().isEmpty() ? List.of() : Values.listed(key.list());
    if (!known.isEmpty() && !known.contains(d.text())) {
      defects.add(d.spot(), Words.quote(d.text()) + " is not in the list of " + key.list() + Words.hint(d.text(), known));
    }
  }

  private void unknown(Node.Field f, String at) {
    if (defects.full()) {
      return;
    }
    Set<String> known = names(at);
    known.addAll(at.isEmpty() ? besides : List.of());
    String place = at.isEmpty() ? where : "`" + prefix + at.substring(0, at.length() - 1) + "`";
    String elsewhere = keys.keySet().stream().filter(k -> k.endsWith("." + f.key())).findFirst().orElse("");
    Optional<String> near = Words.nearest(f.key(), known);
    String hint = near.isEmpty() && !elsewhere.isEmpty() ? "; it belongs at `" + prefix + elsewhere + "`" : Words.hint(f.key(), known);
    defects.add(f.spot(), "unknown key " + Words.quote(f.key()) + " in " + place + (hint.isEmpty() ? "; known are " + Words.list(known) : hint));
  }

  /** Names that may follow a path: {@code running, face-velocity, ...} after {@code hood.}. */
  private Set<String> names(String at) {
    Set<String> out = new LinkedHashSet<>();
    for (String k : keys.keySet()) {
      if (k.startsWith(at)) {
        String rest = k.substring(at.length());
        out.add(rest.contains(".") ? rest.substring(0, rest.indexOf('.')) : rest);
      }
    }
    return out;
  }
}
