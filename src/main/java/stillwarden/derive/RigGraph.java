package stillwarden.derive;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Stream;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Port;
import stillwarden.describe.Rig;

/**
 * The vapour spaces of a rig. Nodes are ports and, as the port with an empty name, the space inside each part;
 * edges are joints and the passages from a part's space to its ports; exits lead from a port to the air.
 */
final class RigGraph {
  /** What an exit is for. */
  enum Kind {
    DESIGNED,
    FEED,
    OTHER,
    LEAK
  }

  /** @param tip the passage to the delivery tip: behind it nothing lets air in upstream of the tip */
  record Edge(Port a, Port b, Gate gate, boolean tip) {
    Port other(Port from) {
      return from.equals(a) ? b : a;
    }
  }

  record Exit(Port at, Gate gate, Kind kind) {}

  private static final Set<Role> DOWNSTREAM =
      Set.of(Role.CONDENSER, Role.TAKE_OFF, Role.RECEIVER, Role.VENT_HOSE, Role.DRYING_TUBE);

  final Rig rig;
  final Roles roles;
  final PathState seen;
  final List<Edge> edges = new ArrayList<>();
  final List<Exit> exits = new ArrayList<>();
  final List<Port> unlisted = new ArrayList<>();
  /** It vents somewhere that nobody can name. */
  boolean leakSomewhere;
  /** Edges looked at by all searches so far: the measure of work that the tests bound. */
  long work;

  private final Map<String, Role> roleOf = new HashMap<>();
  private final Map<Port, List<Edge>> byNode = new LinkedHashMap<>();
  private final Map<Port, String> names = new LinkedHashMap<>();
  private final Set<Port> joined = new LinkedHashSet<>();

  RigGraph(Rig rig, PathState seen) {
    this.rig = rig;
    this.roles = Roles.of(rig);
    this.seen = seen;
    roles.parts().forEach((role, parts) -> parts.forEach(p -> roleOf.put(p.name(), role)));
    rig.joints().forEach(this::remember);
    rig.openings().keySet().forEach(p -> names.putIfAbsent(canonical(p), p.toString()));
    Passages passages = new Passages(this);
    rig.parts().values().forEach(p -> ports(p).forEach(port -> edge(passages.inside(p, port))));
    rig.joints().forEach(j -> join(j, passages));
    Exits ends = new Exits(this);
    rig.parts().values().forEach(ends::addAll);
    seen.leaks().forEach(this::leak);
    leakSomewhere |= passages.perhapsApart();
  }

  private void remember(Joint j) {
    for (Port p : List.of(j.a(), j.b())) {
      joined.add(canonical(p));
      names.putIfAbsent(canonical(p), p.toString());
    }
  }

  private void join(Joint j, Passages passages) {
    Port a = canonical(j.a());
    Port b = canonical(j.b());
    edge(new Edge(a, b, passages.through(j), false));
    if (passages.isApart(j)) {
      exits.add(new Exit(a, Gate.OPEN, Kind.LEAK));
      exits.add(new Exit(b, Gate.OPEN, Kind.LEAK));
    }
  }

  private void edge(Edge e) {
    if (e.a().equals(e.b())) {
      return;
    }
    edges.add(e);
    byNode.computeIfAbsent(e.a(), n -> new ArrayList<>()).add(e);
    byNode.computeIfAbsent(e.b(), n -> new ArrayList<>()).add(e);
  }

  private void leak(String where) {
    Optional<Port> at = jointsNamed(where).stream().map(j -> canonical(j.a())).findFirst();
    at.or(() -> rig.parts().containsKey(where) ? Optional.of(space(where)) : Optional.empty())
        .ifPresentOrElse(p -> exits.add(new Exit(p, Gate.OPEN, Kind.LEAK)), () -> leakSomewhere = true);
  }

  /** Joints that a log line's part may mean: one by its path or port, several by a part between them. */
  List<Joint> jointsNamed(String where) {
    List<Joint> exact = rig.joints().stream().filter(j -> named(j, where)).toList();
    return !exact.isEmpty() ? exact : rig.joints().stream().filter(j -> touches(j, where)).toList();
  }

  private boolean named(Joint j, String where) {
    return where.equals(j.path())
        || where.equals(j.toString())
        || (where.contains(".") && (where.equals(text(j.a())) || where.equals(text(j.b()))));
  }

  private String text(Port p) {
    return canonical(p).toString();
  }

  private static boolean touches(Joint j, String part) {
    return j.a().part().equals(part) || j.b().part().equals(part);
  }

  Optional<Role> role(String part) {
    return Optional.ofNullable(roleOf.get(part));
  }

  boolean hasRole(String part) {
    return roleOf.containsKey(part);
  }

  boolean is(String part, Role role) {
    return roleOf.get(part) == role;
  }

  Kind kind(Port p) {
    return downstream(p) ? Kind.DESIGNED : is(p.part(), Role.RESERVOIR) ? Kind.FEED : Kind.OTHER;
  }

  boolean downstream(Port p) {
    return role(p.part()).filter(DOWNSTREAM::contains).isPresent();
  }

  /** The delivery tip: the take-off's outlet, or without a take-off the condenser's own lower end. */
  boolean isTip(Port port) {
    return is(port.part(), Role.TAKE_OFF)
        ? port.port().equals("outlet")
        : roles.all(Role.TAKE_OFF).isEmpty() && is(port.part(), Role.CONDENSER) && port.port().equals("lower");
  }

  /** A single port named by its part alone gets its name; a round-bottom flask has a neck, receiver or not. */
  Port canonical(Port p) {
    Part part = rig.parts().get(p.part());
    List<String> own = part == null ? List.of() : Passages.portsOfKind(part.kind());
    boolean alias = p.port().equals("mouth") && own.equals(List.of("neck"));
    return own.size() == 1 && (p.port().isEmpty() || alias) ? new Port(p.part(), own.get(0)) : p;
  }

  /** Ports of a part: those of its kind and those that the file names besides; glass of an unknown kind has the latter. */
  Set<Port> ports(Part part) {
    Set<Port> out = new LinkedHashSet<>();
    names.keySet().stream().filter(p -> p.part().equals(part.name()) && !p.port().isEmpty()).forEach(out::add);
    for (String own : Passages.portsOf(part, !out.isEmpty())) {
      out.add(new Port(part.name(), own));
    }
    return Passages.isSolid(part.kind()) ? Set.of() : out;
  }

  String name(Port p) {
    return names.getOrDefault(p, p.toString());
  }

  boolean joined(Port p) {
    return joined.contains(p);
  }

  boolean joined(Part part) {
    return joined.stream().anyMatch(p -> p.part().equals(part.name()));
  }

  static Port space(String part) {
    return new Port(part, "");
  }

  Stream<Edge> edgesAt(Port node) {
    List<Edge> at = byNode.getOrDefault(node, List.of());
    work += at.size();
    return at.stream();
  }

  boolean holdsVapour(Port p) {
    Part part = rig.parts().get(p.part());
    return part != null && Passages.holdsVapour(part.kind());
  }

  /** Every node that can be reached from one, through the edges that the test lets pass. */
  Set<Port> reach(Port start, Predicate<Edge> passes) {
    return reach(List.of(start), passes);
  }

  Set<Port> reach(List<Port> starts, Predicate<Edge> passes) {
    Set<Port> found = new LinkedHashSet<>(starts);
    Deque<Port> queue = new ArrayDeque<>(found);
    while (!queue.isEmpty()) {
      Port at = queue.remove();
      edgesAt(at).filter(passes).map(e -> e.other(at)).filter(found::add).forEach(queue::add);
    }
    return found;
  }
}
