package stillwarden.describe;

import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** What one line of a run log says: an entry, or defects. */
final class LogLine {
  private static final Pattern ABOUT = Pattern.compile("\"(?:saw|did)\"\\s*:\\s*\"([^\"]{1,60})");
  private static final Pattern AT = Pattern.compile("\"at\"\\s*:\\s*\"([^\"]{1,40})\"");
  private static final int LONGEST_NAME = 80;
  private static final Key REACH = tri("reach");

  private final Vocabulary words = Vocabulary.get();
  private final List<String> keys = Knowledge.section("words").get("log").words("line");
  private final List<String> headerKeys = Knowledge.section("words").get("log").words("header");

  private static Key tri(String path) {
    return new Key(path, Key.Type.TRI, List.of("yes", "no"), Optional.empty(), List.of(), java.util.OptionalDouble.empty(), java.util.OptionalDouble.empty(), false, "", "");
  }

  /** The header's words without {@code format}. */
  Map<String, String> header(Node n, Defects defects) {
    Map<String, String> out = new LinkedHashMap<>();
    for (Node.Field f : n.fields()) {
      if (!headerKeys.contains(f.key()) || !f.value().isText()) {
        defects.add(f.spot(), headerKeys.contains(f.key()) ? Words.quote(f.key()) + " takes words, here is " + f.value().describe()
            : "unknown key " + Words.quote(f.key()) + " in the header" + Words.hint(f.key(), headerKeys));
      } else if (!f.key().equals("format")) {
        out.put(f.key(), f.value().text());
      }
    }
    return out;
  }

  Optional<Entry> read(int number, Node n, Defects defects) {
    if (!n.is(Node.Kind.MAP)) {
      defects.add(n.spot(), "a line is `{...}`, here is " + n.describe());
      return Optional.empty();
    }
    for (Node.Field f : n.fields()) {
      if (!keys.contains(f.key())) {
        defects.add(f.spot(), "unknown key " + Words.quote(f.key()) + Words.hint(f.key(), keys));
      }
    }
    Optional<OffsetDateTime> when = when(n, defects);
    Optional<String> who = one(n, "by", "from", defects);
    Optional<String> id = one(n, "saw", "did", defects);
    if (id.isEmpty() || who.isEmpty() || when.isEmpty()) {
      return Optional.empty();
    }
    return n.get("saw").isPresent() ? saw(number, n, when.get(), who.get(), id.get(), defects) : did(number, n, when.get(), who.get(), id.get(), defects);
  }

  private Optional<OffsetDateTime> when(Node n, Defects defects) {
    Node at = n.get("at").orElse(null);
    if (at == null) {
      defects.add(n.spot(), "`at` is missing");
      return Optional.empty();
    }
    try {
      OffsetDateTime t = Values.instant(at.text());
      if (t.getYear() >= 2000 && t.getYear() < 2100) {
        return Optional.of(t);
      }
      defects.add(at.spot(), Words.quote(at.text()) + " is no time of a run: a slip in the year?");
    } catch (BadValue e) {
      defects.add(at.spot(), e.getMessage());
    }
    return Optional.empty();
  }

  private Optional<String> one(Node n, String a, String b, Defects defects) {
    if (n.get(a).isPresent() == n.get(b).isPresent()) {
      defects.add(n.spot(), n.get(a).isPresent() ? "`" + a + "` and `" + b + "` both stand here; one is wanted" : "one of `" + a + "` and `" + b + "` is missing");
      return Optional.empty();
    }
    return name(n, n.get(a).isPresent() ? a : b, defects);
  }

  private Optional<String> name(Node n, String key, Defects defects) {
    Node said = n.get(key).orElse(null);
    if (said == null) {
      return Optional.empty();
    }
    boolean plain = said.isText() && said.text().length() <= LONGEST_NAME && said.text().chars().noneMatch(Character::isISOControl);
    if (!plain) {
      defects.add(said.spot(), "`" + key + "` takes a word of at most " + LONGEST_NAME + " characters, here is " + said.describe());
    }
    return plain ? Optional.of(said.text().strip()) : Optional.empty();
  }

  private Optional<Entry> saw(int number, Node n, OffsetDateTime when, String who, String id, Defects defects) {
    Observation o = words.observation(id).orElse(null);
    if (o == null) {
      defects.add(n.get("saw").orElseThrow().spot(), "unknown observation " + Words.quote(id) + Words.hint(id, words.observations().keySet()));
      return Optional.empty();
    }
    later(n, id, o.later(), defects);
    if (!o.reach() && n.get("reach").isPresent()) {
      defects.add(n.spot(), "`reach` belongs to an injury, not to " + Words.quote(id));
    }
    Optional<Datum> value = n.get("value").isPresent() ? value(o.key(), n.get("value").get(), true, defects) : Optional.of(yes(o, n, defects));
    Optional<String> what = what(o, n, defects);
    return value.map(v -> entry(number, n, when, who, Entry.Verb.SAW, id, what.map(w -> worded(v, w)).orElse(v), defects));
  }

  /** {@code what} was spilt is the word of the line; how much stays its quantity. */
  private static Datum worded(Datum v, String what) {
    return new Datum(v.path(), what, v.measured(), v.spot());
  }

  private Optional<String> what(Observation o, Node n, Defects defects) {
    Optional<String> said = name(n, "what", defects);
    if (said.isPresent() && !o.what().contains(said.get())) {
      defects.add(n.get("what").orElseThrow().spot(), o.what().isEmpty() ? "`what` does not belong to " + Words.quote(o.id())
          : Words.quote(said.get()) + " for `what`: one of " + Words.list(o.what()) + " is wanted" + Words.hint(said.get(), o.what()));
    }
    if (said.isPresent() && n.get("value").filter(v -> v.text().equals("no") || v.is(Node.Kind.FALSE)).isPresent()) {
      defects.add(n.spot(), "`what` was spilt and `value` says that nothing was");
    }
    return said;
  }

  private Datum yes(Observation o, Node n, Defects defects) {
    if (!o.key().values().contains("yes")) {
      String wanted = o.key().values().isEmpty() ? "a quantity, for example `" + Units.example(o.key().dimension().orElseThrow()) + "`" : "one of " + Words.list(o.key().values());
      defects.add(n.spot(), Words.quote(o.id()) + " needs a `value`: " + wanted);
    }
    return new Datum(o.id(), "yes", Optional.empty(), n.spot());
  }

  private Optional<Entry> did(int number, Node n, OffsetDateTime when, String who, String id, Defects defects) {
    Deed deed = words.deeds().get(id);
    if (deed == null) {
      defects.add(n.get("did").orElseThrow().spot(), "unknown deed " + Words.quote(id) + Words.hint(id, words.deeds().keySet()));
      return Optional.empty();
    }
    later(n, id, deed.later(), defects);
    for (String key : List.of("reach", "what")) {
      n.get(key).ifPresent(k -> defects.add(k.spot(), "`" + key + "` does not belong to a deed"));
    }
    Optional<Datum> value = Optional.of(new Datum(id, "yes", Optional.empty(), n.spot()));
    Node said = n.get("value").orElse(null);
    if (said == null && deed.valueRequired()) {
      defects.add(n.spot(), Words.quote(id) + " needs a `value`, for example `" + Units.example(deed.value().orElseThrow().dimension().orElseThrow()) + "`");
    } else if (said != null && deed.value().isEmpty()) {
      defects.add(said.spot(), Words.quote(id) + " takes no value");
    } else if (said != null) {
      value = value(deed.value().get(), said, false, defects);
    }
    return value.map(v -> entry(number, n, when, who, Entry.Verb.DID, id, v, defects));
  }

  private static void later(Node n, String id, boolean later, Defects defects) {
    if (later) {
      defects.add(n.spot(), Words.quote(id) + " belongs to a method or stage that can't be judged yet");
    }
  }

  private Optional<Datum> value(Key key, Node n, boolean notSure, Defects defects) {
    if (notSure && n.isText() && n.text().equals("not-sure")) {
      return Optional.of(new Datum(key.path(), "not-sure", Optional.empty(), n.spot()));
    }
    try {
      return Optional.of(Values.read(key, key.path(), n));
    } catch (BadValue e) {
      defects.add(n.spot(), e.getMessage());
      return Optional.empty();
    }
  }

  private Entry entry(int number, Node n, OffsetDateTime when, String who, Entry.Verb verb, String id, Datum value, Defects defects) {
    Optional<String> reach = n.get("reach").flatMap(r -> value(REACH, r, true, defects)).map(Datum::text);
    return new Entry(number, when, who, n.get("from").isPresent(), verb, id, name(n, "part", defects).orElse(""), value.text(), value.measured(),
        name(n, "id", defects), name(n, "corrects", defects), reach);
  }

  /** The observation or deed that an unreadable line seems to concern: the nearest known word, or empty. */
  String about(String line) {
    Matcher m = ABOUT.matcher(line);
    if (!m.find()) {
      return "";
    }
    List<String> known = new ArrayList<>(words.observations().keySet());
    known.addAll(words.deeds().keySet());
    return known.contains(m.group(1)) ? m.group(1) : Words.nearest(m.group(1), known).orElse("");
  }

  String at(String line) {
    Matcher m = AT.matcher(line);
    return m.find() ? m.group(1) : "";
  }
}
