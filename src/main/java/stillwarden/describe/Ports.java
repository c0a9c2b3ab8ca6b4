package stillwarden.describe;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/** What is joined to what: joints and openings against the ports that the parts really have. */
final class Ports {
  private final Vocabulary words = Vocabulary.get();
  private final Optional<Node> written;
  private final Map<String, Part> parts;
  private final Defects defects;
  private final Map<Port, String> used = new HashMap<>();

  /** @param written the `parts` of the file: a part with defects of its own is not reported as missing as well */
  Ports(Optional<Node> written, Map<String, Part> parts, Defects defects) {
    this.written = written;
    this.parts = parts;
    this.defects = defects;
  }

  List<Joint> joints(Node list) {
    List<Joint> out = new ArrayList<>();
    if (!list.is(Node.Kind.LIST)) {
      defects.add(list.spot(), "`joints` takes a list, here is " + list.describe());
      return out;
    }
    for (int i = 0; i < list.items().size(); i++) {
      joint(i, list.items().get(i)).ifPresent(out::add);
    }
    return List.copyOf(out);
  }

  private Optional<Joint> joint(int index, Node n) {
    Node joins = n.get("joins").orElse(null);
    if (joins == null || !joins.is(Node.Kind.LIST) || joins.items().size() != 2) {
      defects.add(joins == null ? n.spot() : joins.spot(), "a joint needs `joins` with two ports, for example `[flask, claisen.foot]`");
      return Optional.empty();
    }
    Map<String, Datum> keys = new Section(words.jointKeys(), "a joint", "joints[" + index + "].", defects).read(n.without("joins"));
    Optional<Port> a = port(joins.items().get(0));
    Optional<Port> b = port(joins.items().get(1));
    if (a.isEmpty() || b.isEmpty()) {
      return Optional.empty();
    }
    if (a.get().part().equals(b.get().part())) {
      defects.add(joins.spot(), Words.quote(a.get().part()) + " can't be joined to itself");
    }
    use(a.get(), joins.items().get(0), "joint " + (index + 1));
    use(b.get(), joins.items().get(1), "joint " + (index + 1));
    return Optional.of(new Joint(index, a.get(), b.get(), keys));
  }

  SortedMap<Port, Datum> openings(Optional<Node> map) {
    SortedMap<Port, Datum> out = new TreeMap<>();
    if (map.isPresent() && !map.get().is(Node.Kind.MAP)) {
      defects.add(map.get().spot(), "`openings` takes ports with their state, for example `take-off.side-arm: open`; here is " + map.get().describe());
      return out;
    }
    map.ifPresent(m -> m.fields().forEach(f -> opening(f, out)));
    return Collections.unmodifiableSortedMap(out);
  }

  private void opening(Node.Field f, SortedMap<Port, Datum> out) {
    Node name = Node.scalar(Node.Kind.WORD, f.key(), f.spot());
    Optional<Port> port = port(name);
    if (port.isEmpty()) {
      return;
    }
    use(port.get(), name, "`openings`");
    try {
      out.put(port.get(), Values.read(words.opening(), "openings." + port.get(), f.value()));
    } catch (BadValue e) {
      defects.add(f.value().spot(), e.getMessage());
    }
  }

  private void use(Port port, Node said, String where) {
    String before = used.putIfAbsent(port, where);
    if (before != null) {
      defects.add(said.spot(), Words.quote(port.toString()) + " is in " + before + " and in " + where + "; a port is in one only");
    }
  }

  private Optional<Port> port(Node said) {
    if (!said.isText()) {
      defects.add(said.spot(), "a port is wanted, for example `claisen.foot`; here is " + said.describe());
      return Optional.empty();
    }
    int dot = said.text().indexOf('.');
    String name = dot < 0 ? said.text() : said.text().substring(0, dot);
    Part part = parts.get(name);
    if (part == null || part.kind().equals("none")) {
      missing(said, name, part);
      return Optional.empty();
    }
    return port(said, part, dot < 0 ? "" : said.text().substring(dot + 1));
  }

  private void missing(Node said, String name, Part none) {
    if (none != null) {
      defects.add(said.spot(), Words.quote(name) + " is `kind: none`; nothing can be joined to it");
    } else if (written.flatMap(w -> w.get(name)).isEmpty()) {
      defects.add(said.spot(), "there is no part " + Words.quote(name) + " in this file" + Words.hint(name, parts.keySet()));
    }
  }

  private Optional<Port> port(Node said, Part part, String port) {
    List<String> ports = words.ports(part);
    String kind = "a " + RigReader.spoken(part.kind());
    if (ports.isEmpty()) {
      defects.add(said.spot(), Words.quote(part.name()) + " is " + kind + " and has no port");
      return Optional.empty();
    }
    if (port.isEmpty() && ports.size() > 1) {
      defects.add(said.spot(), Words.quote(part.name()) + " has several ports; say which: " + Words.list(ports));
      return Optional.empty();
    }
    if (!port.isEmpty() && !ports.contains(port)) {
      String necks = part.kind().equals("round-bottom-flask") && !part.keys().containsKey("necks") ? " (with more necks say how many: `necks: 2`)" : "";
      defects.add(said.spot(), kind + " has no port " + Words.quote(port) + "; its ports are " + Words.list(ports) + necks);
      return Optional.empty();
    }
    return Optional.of(new Port(part.name(), port.isEmpty() ? ports.get(0) : port));
  }
}
