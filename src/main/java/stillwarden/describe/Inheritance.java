package stillwarden.describe;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * {@code based-on}: a rig file laid over another one, key by key, lists replaced whole. Only what stands is inherited;
 * what wears, moves or is worn today is dropped from the base, so that nobody's look of last week counts as today's.
 */
final class Inheritance {
  private static final int MOST = 8;

  private final Vocabulary words = Vocabulary.get();
  private final Defects defects;

  Inheritance(Defects defects) {
    this.defects = defects;
  }

  /** The file with everything that it inherits. */
  Node resolve(Path path) throws Unusable {
    return resolve(path, List.of());
  }

  private Node resolve(Path path, List<Path> chain) throws Unusable {
    Node root = Documents.read(path, defects);
    Documents.format(root, "stillwarden/rig/1", defects);
    Optional<Node> base = root.get("based-on");
    if (base.isEmpty()) {
      return root;
    }
    List<Path> longer = new ArrayList<>(chain);
    longer.add(path);
    return base(path, base.get(), longer).map(b -> merge(standing(b), root.without("based-on"), "")).orElse(root.without("based-on"));
  }

  private Optional<Node> base(Path path, Node said, List<Path> chain) throws Unusable {
    if (!said.isText()) {
      defects.add(said.spot(), "`based-on` takes the name of a rig file, here is " + said.describe());
      return Optional.empty();
    }
    Path base = path.resolveSibling(said.text());
    if (chain.stream().anyMatch(p -> same(p, base)) || chain.size() >= MOST) {
      defects.add(said.spot(), "`based-on` goes round in a circle: " + chain.stream().map(Path::toString).collect(Collectors.joining(" -> ")) + " -> " + base);
      return Optional.empty();
    }
    if (!Files.isRegularFile(base)) {
      defects.add(said.spot(), "there is no file " + Words.quote(said.text()) + " beside this one");
      return Optional.empty();
    }
    return Optional.of(resolve(base, chain));
  }

  private static boolean same(Path a, Path b) {
    return a.toAbsolutePath().normalize().equals(b.toAbsolutePath().normalize());
  }

  private Node merge(Node base, Node over, String at) {
    Node out = base;
    for (Node.Field f : over.fields()) {
      Optional<Node> old = base.get(f.key());
      String path = at + f.key();
      boolean both = old.isPresent() && old.get().is(Node.Kind.MAP) && f.value().is(Node.Kind.MAP) && !whole(path, old.get(), f.value());
      out = out.with(both ? new Node.Field(f.key(), f.spot(), merge(old.get(), f.value(), path + ".")) : f);
    }
    return new Node(Node.Kind.MAP, "", out.fields(), List.of(), over.spot(), over.flow());
  }

  /** Shares are one value, and a part of another kind is another part: neither is mixed with the base's. */
  private boolean whole(String path, Node old, Node now) {
    boolean shares = Optional.ofNullable(words.facts().get(path)).filter(k -> k.type() == Key.Type.SHARES).isPresent();
    Optional<String> kind = now.get("kind").map(Node::text);
    return shares || path.startsWith("parts.") && kind.isPresent() && !kind.equals(old.get("kind").map(Node::text));
  }

  /** What of a base file may be inherited. */
  private Node standing(Node base) {
    List<Node.Field> out = new ArrayList<>();
    for (Node.Field f : base.fields()) {
      Node kept = switch (f.key()) {
        case "openings" -> Node.map(List.of(), f.value().spot(), false);
        case "parts" -> parts(f.value());
        case "joints" -> joints(f.value());
        default -> f.value();
      };
      out.add(new Node.Field(f.key(), f.spot(), kept));
    }
    return standing(Node.map(out, base.spot(), false), "", words.facts());
  }

  private Node standing(Node group, String at, Map<String, Key> keys) {
    List<Node.Field> out = new ArrayList<>();
    for (Node.Field f : group.fields()) {
      String path = at + f.key();
      Key key = keys.get(path);
      if (key == null && f.value().is(Node.Kind.MAP) && !path.equals("parts")) {
        Node inner = standing(f.value(), path + ".", keys);
        if (!inner.fields().isEmpty()) {
          out.add(new Node.Field(f.key(), f.spot(), inner));
        }
      } else if (key == null || !key.wears()) {
        out.add(f);
      }
    }
    return Node.map(out, group.spot(), group.flow());
  }

  private Node parts(Node parts) {
    return Node.map(parts.fields().stream().map(f -> new Node.Field(f.key(), f.spot(), part(f.value()))).toList(), parts.spot(), false);
  }

  private Node part(Node part) {
    return part.is(Node.Kind.MAP) ? standing(part, "", words.keys(part.get("kind").map(Node::text).orElse(""))) : part;
  }

  private Node joints(Node joints) {
    return Node.list(joints.items().stream().map(j -> j.is(Node.Kind.MAP) ? standing(j, "", words.jointKeys()) : j).toList(), joints.spot(), false);
  }
}
