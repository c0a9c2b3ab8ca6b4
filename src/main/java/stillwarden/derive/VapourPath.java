package stillwarden.derive;

import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Stream;
import stillwarden.derive.PathFinding.Closure;
import stillwarden.derive.PathFinding.Relief;
import stillwarden.derive.PathFinding.State;
import stillwarden.derive.RigGraph.Edge;
import stillwarden.derive.RigGraph.Exit;
import stillwarden.derive.RigGraph.Kind;
import stillwarden.describe.Port;
import stillwarden.describe.Rig;

/**
 * Looks for a way from the boiling flask to the air. Two searches bound the truth: one through what is surely open,
 * one through all that is not surely closed. What they agree on is known; an unknown can therefore never pass for open.
 */
public final class VapourPath {
  private final RigGraph graph;
  private final Port flask;
  private final Set<Port> sure;
  private final Set<Port> may;
  private final Set<Port> pushed;
  private final Set<Port> linked;

  private VapourPath(RigGraph graph, Port flask) {
    this.graph = graph;
    this.flask = flask;
    this.sure = graph.reach(flask, e -> e.gate().isOpen());
    this.may = graph.reach(flask, e -> e.gate().mayPass());
    this.pushed = graph.reach(flask, e -> e.gate().yields());
    this.linked = graph.reach(flask, e -> true);
  }

  /** The answer for one rig and one state of what was seen. */
  public static PathFinding find(Rig rig, PathState seen) {
    return find(new RigGraph(rig, seen));
  }

  static PathFinding find(RigGraph graph) {
    return graph.roles.one(Role.FLASK)
        .map(f -> new VapourPath(graph, RigGraph.space(f.name())).finding())
        .orElseGet(() -> noFlask(graph));
  }

  /** Without one boiling flask there is nothing to start from, and nothing is known. */
  private static PathFinding noFlask(RigGraph graph) {
    List<String> which = graph.roles.all(Role.FLASK).stream().map(p -> p.name() + ".boiling-aid").toList();
    return new PathFinding(
        State.UNKNOWN, List.of(), List.of(), which.isEmpty() ? List.of("flask.kind") : which, List.of(), List.of(), false,
        Optional.empty(), Relief.UNKNOWN, false, Optional.empty(), false, Optional.empty(), List.of(), graph.unlisted, List.of());
  }

  private PathFinding finding() {
    List<Exit> open = exits(sure, Gate::isOpen).toList();
    List<Exit> designed = open.stream().filter(e -> e.kind() == Kind.DESIGNED).toList();
    State state = state(designed);
    List<Port> vents = open.stream().map(Exit::at).distinct().toList();
    List<Port> throughLiquid = throughLiquid(vents);
    Layout layout = new Layout(graph, flask);
    return new PathFinding(
        state,
        designed.stream().map(e -> graph.name(e.at())).distinct().toList(),
        closures(state),
        state == State.UNKNOWN ? deciding() : List.of(),
        vents,
        throughLiquid,
        !graph.leakSomewhere && exits(may, Gate::mayPass).map(Exit::at).distinct().count() == vents.size(),
        last(vents, throughLiquid),
        relief(),
        inletUpstream(),
        layout.narrowest(designed),
        layout.feedCrosses(),
        layout.feedArm(),
        layout.unreached(linked),
        graph.unlisted,
        layout.seals());
  }

  private Stream<Exit> exits(Set<Port> reached, Predicate<Gate> gate) {
    return graph.exits.stream().filter(e -> reached.contains(e.at()) && gate.test(e.gate()));
  }

  private State state(List<Exit> designed) {
    if (!designed.isEmpty()) {
      return State.OPEN;
    }
    boolean maybe = exits(may, Gate::mayPass).anyMatch(e -> e.kind() == Kind.DESIGNED);
    return maybe || !looseEnds().isEmpty() ? State.UNKNOWN : State.CLOSED;
  }

  private boolean leadsOn() {
    return graph.exits.stream().anyMatch(e -> e.kind() == Kind.DESIGNED && linked.contains(e.at()));
  }

  /** Where no joint leads on to a designed exit at all, an unlisted port may still be joined to something not in the file. */
  private List<Exit> looseEnds() {
    return leadsOn() ? List.of() : exits(may, Gate::isUnknown).filter(e -> e.kind() == Kind.OTHER).toList();
  }

  /** What would tell about the unknown gates on some way that may lead to a designed exit. */
  private List<String> deciding() {
    List<Exit> ends = Stream.concat(exits(may, Gate::mayPass).filter(e -> e.kind() == Kind.DESIGNED), looseEnds().stream()).toList();
    Set<Port> back = graph.reach(ends.stream().map(Exit::at).toList(), e -> e.gate().mayPass());
    List<Edge> unknown = graph.edges.stream().filter(e -> e.gate().isUnknown() && back.contains(e.a()) && back.contains(e.b())).toList();
    List<String> looks = looks(unknown.stream().filter(e -> !feeds(e)).map(Edge::gate), ends);
    return looks.isEmpty() ? looks(unknown.stream().map(Edge::gate), ends) : looks;
  }

  private static List<String> looks(Stream<Gate> inside, List<Exit> ends) {
    return Stream.concat(inside, ends.stream().map(Exit::gate)).flatMap(g -> g.looks().stream()).distinct().toList();
  }

  /** The reservoir is no part of the designed way, unless nothing else leads on. */
  private boolean feeds(Edge e) {
    return graph.kind(e.a()) == Kind.FEED || graph.kind(e.b()) == Kind.FEED;
  }

  private List<Closure> closures(State state) {
    Set<Closure> out = new LinkedHashSet<>();
    closed().filter(e -> !feeds(e)).forEach(e -> out.add(closure(e)));
    exits(linked, Gate::isClosed)
        .filter(e -> e.kind() == Kind.DESIGNED)
        .forEach(e -> out.add(closure(e.gate(), may.contains(e.at()))));
    if (state == State.CLOSED && out.stream().noneMatch(Closure::nearest) && leadsOn()) {
      closed().forEach(e -> out.add(closure(e)));
    }
    if (state == State.CLOSED && out.stream().noneMatch(Closure::nearest)) {
      out.add(new Closure(lastOfChain(), "leads on to no exit: the joint is missing", true, true));
    }
    return out.stream().sorted(Comparator.comparing(Closure::nearest).reversed()).toList();
  }

  /** A port filled by a thermometer is meant to be closed and ends no way. */
  private Stream<Edge> closed() {
    return graph.edges.stream()
        .filter(e -> e.gate().isClosed() && linked.contains(e.a()) && graph.holdsVapour(e.a()) && graph.holdsVapour(e.b()));
  }

  private Closure closure(Edge e) {
    return closure(e.gate(), may.contains(e.a()) || may.contains(e.b()));
  }

  private static Closure closure(Gate g, boolean nearest) {
    return new Closure(g.what(), g.why(), g.handsCold(), nearest);
  }

  private String lastOfChain() {
    return linked.stream().filter(p -> graph.holdsVapour(p) && graph.kind(p) != Kind.FEED).reduce(flask, (first, next) -> next).part();
  }

  /** Exits that a push would open by moving liquid, over and above those that vent freely. */
  private List<Port> throughLiquid(List<Port> vents) {
    return exits(pushed, Gate::yields).map(Exit::at).distinct().filter(p -> !vents.contains(p)).toList();
  }

  private static Optional<Port> last(List<Port> vents, List<Port> throughLiquid) {
    List<Port> left = vents.isEmpty() ? throughLiquid : vents;
    return left.size() == 1 ? Optional.of(left.get(0)) : Optional.empty();
  }

  private Relief relief() {
    Set<Port> perhaps = graph.reach(flask, e -> e.gate().mayPass() || e.gate().liquid());
    return ventsByReservoir(sure, Gate::isOpen)
        ? Relief.FREE
        : ventsByReservoir(pushed, Gate::yields)
            ? Relief.THROUGH_LIQUID
            : ventsByReservoir(perhaps, g -> g.mayPass() || g.liquid()) ? Relief.UNKNOWN : Relief.NONE;
  }

  private boolean ventsByReservoir(Set<Port> reached, Predicate<Gate> gate) {
    return exits(reached, gate).anyMatch(e -> e.kind() == Kind.FEED);
  }

  /** A leak may let air in as well as out, but nobody should count on it. */
  private boolean inletUpstream() {
    Set<Port> above = graph.reach(flask, e -> e.gate().isOpen() && !e.tip());
    return exits(above, Gate::isOpen).anyMatch(e -> e.kind() != Kind.LEAK);
  }
}
