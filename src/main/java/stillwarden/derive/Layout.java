package stillwarden.derive;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Collectors;
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
    Optional<Part> claisen = graph.roles.one(Role.CLAISEN);
    return claisen.filter(c -> carries(c, "straight")).map(c -> "straight").or(() -> claisen.filter(c -> carries(c, "curved")).map(c -> "side"));
  }

  private boolean carries(Part claisen, String arm) {
    Port space = RigGraph.space(claisen.name());
    Port from = new Port(claisen.name(), arm);
    Set<Port> beyond = graph.reach(from, e -> !e.a().equals(space) && !e.b().equals(space));
    return graph.roles.all(Role.RESERVOIR).stream().anyMatch(r -> beyond.contains(RigGraph.space(r.name())));
  }

  boolean feedCrosses() {
    Optional<Part> end = graph.roles.all(Role.TAKE_OFF).stream().findFirst().or(() -> graph.roles.all(Role.CONDENSER).stream().findFirst());
    Set<String> vapour = end.map(e -> between(flask, RigGraph.space(e.name()))).orElse(Set.of());
    return graph.roles.all(Role.RESERVOIR).stream()
        .flatMap(r -> between(flask, RigGraph.space(r.name())).stream())
        .filter(p -> !graph.is(p, Role.FLASK) && !graph.is(p, Role.CLAISEN))
        .anyMatch(vapour::contains);
  }

  private Set<String> between(Port from, Port to) {
    return way(from, to, e -> true).stream().map(Port::part).collect(Collectors.toSet());
  }

  /** The shortest way from one node to another, both included; empty where there is none. */
  private List<Port> way(Port from, Port to, Predicate<Edge> passes) {
    Map<Port, Port> before = new HashMap<>(Map.of(from, from));
    Deque<Port> queue = new ArrayDeque<>(List.of(from));
    while (!queue.isEmpty() && !before.containsKey(to)) {
      Port at = queue.remove();
      graph.edgesAt(at).filter(passes).map(e -> e.other(at)).filter(n -> before.putIfAbsent(n, at) == null).forEach(queue::add);
    }
    List<Port> way = new ArrayList<>();
    for (Port p = before.containsKey(to) ? to : null; p != null; p = p.equals(from) ? null : before.get(p)) {
      way.add(p);
    }
    return way;
  }

  /** Of the open ways the one whose narrowest place is widest; a way with a bore that nobody stated counts only if all have one. */
  Optional<Narrowest> narrowest(List<Exit> open) {
    List<Narrowest> ways = open.stream().flatMap(e -> along(e).stream()).toList();
    return ways.stream()
        .max(Comparator.comparing((Narrowest n) -> n.missing().isEmpty()).thenComparing(Narrowest::metres));
  }

  private Optional<Narrowest> along(Exit exit) {
    List<String> bores = way(flask, exit.at(), e -> e.gate().isOpen()).stream().flatMap(this::bores).distinct().toList();
    List<String> missing = bores.stream().filter(b -> graph.rig.si(b).isEmpty()).toList();
    return bores.stream()
        .filter(b -> graph.rig.si(b).isPresent())
        .map(b -> new Narrowest(graph.rig.si(b).orElseThrow(), b, missing))
        .min(Comparator.comparing(Narrowest::metres));
  }

  /** Rig paths of the bores at one node; a take-off's outlet has one that no key states, so it stands for itself. */
  private Stream<String> bores(Port node) {
    boolean takeOff = graph.is(node.part(), Role.TAKE_OFF);
    if (takeOff && node.port().equals("side-arm")) {
      return Stream.concat(Stream.of(node + "-bore"), tubes());
    }
    if (takeOff && node.port().equals("outlet")) {
      return Stream.of(graph.name(node));
    }
    return node.port().isEmpty() ? graph.role(node.part()).map(BORES::get).map(k -> node.part() + "." + k).stream() : Stream.empty();
  }

  /** Hoses in no joint: they hang on the side arm that ends in a tube. */
  private Stream<String> tubes() {
    return graph.roles.all(Role.VENT_HOSE).stream().filter(h -> !graph.joined(h)).map(h -> h.name() + ".bore");
  }

  List<String> unreached(Set<Port> linked) {
    return graph.rig.parts().values().stream()
        .filter(p -> Passages.holdsVapour(p.kind()) && !linked.contains(RigGraph.space(p.name())))
        .filter(p -> !graph.is(p.name(), Role.RECEIVER) && graph.hasRole(p.name()) && !endsTube(p))
        .map(Part::name)
        .toList();
  }

  /** A hose that is in no joint hangs on the port that ends in a tube, or a drying tube on the hose. */
  private boolean endsTube(Part p) {
    return Passages.isThrough(p) && !graph.joined(p);
  }

  List<Seal> seals() {
    Stream<Gate> tips = graph.edges.stream().filter(Edge::tip).map(Edge::gate);
    Stream<Gate> ends = graph.exits.stream().map(Exit::gate);
    return Stream.concat(tips, ends).filter(Gate::liquid).map(this::seal).toList();
  }

  private Seal seal(Gate gate) {
    return new Seal(gate.what(), graph.seen.sealDepth());
  }
}
