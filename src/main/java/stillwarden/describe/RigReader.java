package stillwarden.describe;

import java.nio.file.Path;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/** Reads a rig file (YAML or JSON): complete and consistent, or {@link Unusable} with every defect. */
public final class RigReader {
  private static final Pattern NAME = Pattern.compile("[\\p{L}\\p{N}][\\p{L}\\p{N}_-]{0,39}");

  private static final List<String> STRUCTURE = List.of("format", "method", "based-on", "parts", "joints", "openings");

  private final Vocabulary words = Vocabulary.get();
  private final Defects defects = new Defects();

  private RigReader() {}

  /** @throws Unusable with file, line, column, the user's word and what would be right, for everything that is wrong */
  public static Rig read(Path file) throws Unusable {
    RigReader reader = new RigReader();
    Node root = new Inheritance(reader.defects).resolve(file);
    String method = reader.method(root);
    Rig rig = reader.rig(file, root, method);
    reader.defects.throwIfAny();
    return rig;
  }

  /** A method that can't be judged makes every further complaint about the file pointless. */
  private String method(Node root) throws Unusable {
    Node said = root.get("method").orElse(null);
    if (said == null) {
      return "";
    }
    if (!words.methods().contains(said.text())) {
      defects.add(said.spot(), said.describe() + " is no method; one of " + Words.list(words.methods()) + " is wanted" + Words.hint(said.text(), words.methods()));
    } else if (!words.built(said.text())) {
      throw new Unusable(said.spot(), "method `" + said.text() + "` can't be judged yet");
    }
    return said.text();
  }

  private Rig rig(Path file, Node root, String method) {
    Map<String, Part> parts = new LinkedHashMap<>();
    root.get("parts").ifPresent(n -> parts(n, parts));
    Map<String, Datum> facts = facts(root);
    Ports ports = new Ports(root.get("parts"), parts, defects);
    List<Joint> joints = root.get("joints").map(ports::joints).orElse(List.of());
    var openings = ports.openings(root.get("openings"));
    parts.values().forEach(p -> references(p, parts));
    String name = Optional.ofNullable(facts.get("name")).map(Datum::text).orElse(file.getFileName().toString());
    Contradictions.check(parts, joints, openings, defects);
    return new Rig(file.toString(), name, method, Collections.unmodifiableMap(facts), Collections.unmodifiableMap(parts), joints, openings, "");
  }

  private Map<String, Datum> facts(Node root) {
    Node rest = root;
    for (String own : STRUCTURE) {
      rest = rest.without(own);
    }
    for (Node.Field f : rest.fields()) {
      if (words.later(f.key())) {
        defects.add(f.spot(), Words.quote(f.key()) + " belongs to a method or stage that can't be judged yet");
        rest = rest.without(f.key());
      }
    }
    return new Section(words.facts(), "a rig file", "", STRUCTURE, defects).read(rest);
  }

  private void parts(Node n, Map<String, Part> out) {
    if (!n.is(Node.Kind.MAP)) {
      defects.add(n.spot(), "`parts` takes names of parts, here is " + n.describe());
      return;
    }
    for (Node.Field f : n.fields()) {
      boolean taken = STRUCTURE.contains(f.key()) || words.facts().keySet().stream().anyMatch(p -> (p + ".").startsWith(f.key() + "."));
      if (!NAME.matcher(f.key()).matches() || taken) {
        defects.add(f.spot(), Words.quote(f.key()) + (taken ? " means something else here; choose another name for the part"
            : " is no name of a part: letters, digits and `-`, at most 40"));
      }
      part(f).ifPresent(p -> out.put(p.name(), p));
    }
  }

  private Optional<Part> part(Node.Field f) {
    Node kind = f.value().get("kind").orElse(null);
    if (!f.value().is(Node.Kind.MAP) || kind == null) {
      defects.add(f.spot(), Words.quote(f.key()) + " needs a `kind`; one of " + Words.list(words.kinds()));
      return Optional.empty();
    }
    if (kind.text().equals("none")) {
      return none(f);
    }
    if (words.role(kind.text()).isEmpty()) {
      defects.add(kind.spot(), words.later(kind.text()) ? Words.quote(kind.text()) + " belongs to a method that can't be judged yet"
          : kind.describe() + " is no kind of part" + Words.nearest(kind.text(), words.kinds()).map(k -> "; nearest is `" + k + "`")
              .orElse("; one of " + Words.list(words.kinds())));
      return Optional.empty();
    }
    Section keys = new Section(words.keys(kind.text()), "a " + spoken(kind.text()), f.key() + ".", defects);
    return Optional.of(new Part(f.key(), kind.text(), keys.read(f.value().without("kind"))));
  }

  private Optional<Part> none(Node.Field f) {
    f.value().without("kind").fields().forEach(k -> defects.add(k.spot(), "`kind: none` says there is none of it: it has no " + Words.quote(k.key())));
    if (words.noneOf(f.key()).isEmpty()) {
      defects.add(f.spot(), "`kind: none`, but " + Words.quote(f.key()) + " does not tell what there is none of; name it " + Words.list(words.roles()));
    }
    return Optional.of(new Part(f.key(), "none", Map.of()));
  }

  /** {@code round-bottom-flask} as it is said: {@code round-bottom flask}. */
  static String spoken(String kind) {
    int dash = kind.lastIndexOf('-');
    return dash < 0 ? kind : kind.substring(0, dash) + " " + kind.substring(dash + 1);
  }

  private void references(Part part, Map<String, Part> parts) {
    words.keys(part.kind()).values().stream().filter(k -> k.type() == Key.Type.PART).forEach(k -> {
      Datum d = part.keys().get(k.path());
      Set<String> known = new LinkedHashSet<>(parts.keySet());
      known.addAll(k.values());
      if (d != null && !known.contains(d.text())) {
        String also = k.values().isEmpty() ? "" : " or one of " + Words.list(k.values());
        defects.add(d.spot(), Words.quote(d.text()) + " for " + Words.quote(k.path()) + ": the name of a part of this file" + also + " is wanted"
            + Words.hint(d.text(), known));
      }
    });
  }
}
