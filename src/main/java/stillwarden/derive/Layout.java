package stillwarden.derive;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.Deque;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Stream;
import stillwarden.derive.PathFinding.Narrowest;
import stillwarden.derive.PathFinding.Seal;
import stillwarden.derive.RigGraph.Edge;
import stillwarden.derive.RigGraph.Exit;
import stillwarden.describe.Part;
import stillwarden.describe.Port;

/** How the glass is put together, whatever stands open or closed in it: arms, bores, immersed ends, glass left over. */
final class Layout {
  private static final Map<Role, String> BORES = Map.of(Role.CONDENSER, "tube-bore", Role.VENT_HOSE, "bore");

  private final RigGraph graph;
  private final Port flask;

  Layout(RigGraph graph, Port flask) {
    this.graph = graph;
    this.flask = flask;
  }

  /** The arm whose joint leads to the reservoir without going back through the adapter. */
  Optional<String> feedArm() {
    return graph.roles.one(Role.CLAISEN).flatMap(c -> carries(c, "straight") ? Optional.of("straight") : carries(c, "curved") ? Optional.of("side") : Optional.empty());
  }

  private boolean carries(Part claisen, String arm) {
    Port space = RigGraph.space(claisen.name());
    Port from = new Port(claisen.name(), arm);
    Set<Port> beyond = graph.reach(from, e -> !e.a().equals(space) && !e.b().equals(space));
    return graph.roles.all(Role.RESERVOIR).stream().anyMatch(r -> beyond.contains(RigGraph.space(r.name())));
  }

  boolean feedCrosses() {
    Optional<Part> end = graph.roles.all(Role.TAKE_OFF).stream().findFirst().or(() -> graph.roles.all(Role.CONDENSER).stream().findFirst());
    Set<String> vapour = end.map(e -> between(flask, RigGraph.space(e.name()), x -> true)).orElse(Set.of());
    return graph.roles.all(Role.RESERVOIR).stream()
        .flatMap(r -> between(flask, RigGraph.space(r.name()), x -> true).stream())
        .filter(p -> !graph.roles.is(p, Role.FLASK) && !graph.roles.is(p, Role.CLAISEN))
        .anyMatch(vapour::contains);
  }

  /** Parts on the shortest chain of joints from one space to another, both included; empty where there is none. */
  private Set<String> between(Port from, Port to, Predicate<Edge> passes) {
    Map<Port, Port> before = new HashMap<>(Map.of(from, from));
    Deque<Port> queue = new ArrayDeque<>(List.of(from));
    while (!queue.isEmpty() && !before.containsKey(to)) {
      Port at = queue.remove();
      graph.edgesAt(at).filter(passes).map(e -> e.other(at)).filter(n -> before.putIfAbsent(n, at) == null).forEach(queue::add);
    }
    Set<String> parts = new LinkedHashSet<>();
    for (Port p = before.containsKey(to) ? to : from; !p.equals(from); p = before.get(p)) {
      parts.add(p.part());
    }
    return parts;
  }

  /** Of the open ways the one whose narrowest place is widest; a way with a bore that nobody stated counts only if all have one. */
  Optional<Narrowest> narrowest(List<Exit> open) {
    List<Narrowest> ways = open.stream().flatMap(e -> along(e).stream()).toList();
    return ways.stream()
        .max(Comparator.comparing((Narrowest n) -> n.missing().isEmpty()).thenComparing(Narrowest::metres));
  }

  private Optional<Narrowest> along(Exit exit) {
    Set<String> parts = openWay(exit.at());
    List<String> paths = Stream.concat(parts.stream().flatMap(p -> bore(p).stream()), exitBore(exit).stream()).toList();
    List<String> missing = paths.stream().filter(p -> graph.rig.si(p).isEmpty()).toList();
    return paths.stream()
        .filter(p -> graph.rig.si(p).isPresent())
        .map(p -> new Narrowest(graph.rig.si(p).orElseThrow(), p, missing))
        .min(Comparator.comparing(Narrowest::metres));
  }

  private Set<String> openWay(Port to) {
    return between(flask, to, e -> e.gate().isOpen());
  }

  private Optional<String> bore(String part) {
    return graph.roles.of(part).map(BORES::get).map(key -> part + "." + key);
  }

  /** A side arm or a free outlet has a bore of its own; only the side arm's has a key. */
  private Optional<String> exitBore(Exit exit) {
    return graph.roles.is(exit.at().part(), Role.TAKE_OFF) ? Optional.of(exit.at() + "-bore") : Optional.empty();
  }

  List<String> unreached(Set<Port> linked) {
    return graph.rig.parts().values().stream()
        .filter(p -> Passages.holdsVapour(p.kind()) && !linked.contains(RigGraph.space(p.name())))
        .filter(p -> !graph.roles.is(p.name(), Role.RECEIVER) && !endsTube(p) && graph.roles.of(p.name()).isPresent())
        .map(Part::name)
        .toList();
  }

  /** A hose that is in no joint hangs on the port that ends in a tube, or a drying tube on the hose. */
  private boolean endsTube(Part p) {
    return Passages.isThrough(p) && !graph.joined(p);
  }

  List<Seal> seals() {
    Stream<RigGraph.Exit> ends = graph.exits.stream().filter(e -> e.gate().liquid());
    List<Seal> out = new ArrayList<>();
    graph.edges.stream().filter(e -> e.tip() && e.gate().liquid()).map(Edge::gate).forEach(g -> out.add(seal(g)));
    ends.forEach(e -> out.add(seal(e.gate())));
    return out;
  }

  private Seal seal(Gate gate) {
    return new Seal(gate.what(), graph.seen.sealDepth());
  }
}
