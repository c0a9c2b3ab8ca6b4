package stillwarden.derive;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import stillwarden.derive.PathState.Look;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Port;

/** The ways inside a part and through a joint: which there are, and what stands in them. */
final class Passages {
  private static final Set<String> THROUGH = Set.of("vent-hose", "drying-tube");
  private static final Set<String> SOLID = Set.of("thermometer", "controller-probe");
  private static final Map<Role, List<String>> PORTS =
      Map.of(
          Role.FLASK, List.of("neck"),
          Role.CLAISEN, List.of("foot", "straight", "curved"),
          Role.HEAD, List.of("foot", "top", "side-arm"),
          Role.CONDENSER, List.of("upper", "lower"),
          Role.TAKE_OFF, List.of("inlet", "outlet", "side-arm"),
          Role.RESERVOIR, List.of("top", "stem"),
          Role.RECEIVER, List.of("mouth"));

  private final RigGraph graph;
  private final List<Joint> apart = new ArrayList<>();
  private final List<Joint> perhapsApart = new ArrayList<>();

  Passages(RigGraph graph) {
    this.graph = graph;
    for (String where : graph.seen.apart()) {
      List<Joint> named = graph.jointsNamed(where);
      (named.size() == 1 ? apart : perhapsApart).addAll(named.isEmpty() ? graph.rig.joints() : named);
    }
  }

  static List<String> portsOfKind(String kind) {
    return Role.ofKind(kind).map(r -> PORTS.getOrDefault(r, List.of())).orElse(List.of());
  }

  static boolean holdsVapour(String kind) {
    return THROUGH.contains(kind) || !portsOfKind(kind).isEmpty();
  }

  /** What fills the port that it is put into. */
  static boolean isSolid(String kind) {
    return SOLID.contains(kind);
  }

  /** A flask with several necks has {@code neck-1} and so on, as many as stated; with no number, those that are named. */
  static List<String> portsOf(Part part, boolean named) {
    List<String> own = portsOfKind(part.kind());
    if (!own.equals(List.of("neck"))) {
      return own;
    }
    int necks = part.si("necks").map(Double::intValue).orElse(1);
    if (necks == 1) {
      return named ? List.of() : own;
    }
    List<String> out = new ArrayList<>();
    for (int i = 1; i <= Math.min(necks, 9); i++) {
      out.add("neck-" + i);
    }
    return out;
  }

  static boolean isThrough(Part part) {
    return THROUGH.contains(part.kind());
  }

  /** From the space inside a part to one of its ports. */
  RigGraph.Edge inside(Part part, Port port) {
    boolean tip = graph.isTip(port);
    Gate gate = part.kind().equals("separatory-funnel") && port.port().equals("stem") ? stopcock(part) : solids(part, port);
    return new RigGraph.Edge(RigGraph.space(part.name()), port, gate.and(foam(part, port)).and(tip ? tip(port) : Gate.OPEN), tip);
  }

  private Gate solids(Part part, Port port) {
    if (graph.is(part.name(), Role.CONDENSER) && port.port().equals("lower")) {
      return solids(part, Look.CONDENSER_SOLIDS);
    }
    boolean takeOff = graph.is(part.name(), Role.TAKE_OFF) && port.port().equals("inlet");
    return takeOff ? solids(part, Look.TAKE_OFF_SOLIDS) : Gate.OPEN;
  }

  private Gate solids(Part part, Look look) {
    return switch (graph.seen.word(look).orElse(PathState.NOT_SURE)) {
      case "none", "film", "growing" -> Gate.OPEN;
      case "blocking" -> Gate.plugged(part.name(), "is blocked by solid");
      default -> Gate.unknown(part.name(), "may hold solid: not looked", look.id());
    };
  }

  /** Foam or plant in the head closes nothing for sure and leaves nothing proven open. */
  private Gate foam(Part part, Port port) {
    boolean head = graph.is(part.name(), Role.HEAD) && port.port().equals("side-arm");
    boolean headless = graph.roles.all(Role.HEAD).isEmpty() && graph.is(part.name(), Role.CONDENSER);
    if (!head && !(headless && port.port().equals("upper"))) {
      return Gate.OPEN;
    }
    Gate foam =
        switch (graph.seen.word(Look.FOAM).orElse(PathState.NOT_SURE)) {
          case "none", "low-and-steady", "rising", "past-half" -> Gate.OPEN;
          case "at-head", "over" -> Gate.unknown(part.name(), "has foam in it", "path");
          default -> Gate.unknown(part.name(), "may have foam in it: not looked", Look.FOAM.id());
        };
    Gate plant =
        switch (graph.seen.word(Look.PLANT_IN_HEAD).orElse(PathState.NOT_SURE)) {
          case "no" -> Gate.OPEN;
          case "yes" -> Gate.unknown(part.name(), "has plant in it", "path");
          default -> Gate.unknown(part.name(), "may have plant in it: not looked", Look.PLANT_IN_HEAD.id());
        };
    return foam.and(plant);
  }

  private Gate tip(Port port) {
    List<Part> receivers = graph.roles.all(Role.RECEIVER);
    String what = graph.name(port);
    String look = receivers.stream().findFirst().map(r -> r.name() + ".tip-below-liquid").orElse(Look.TIP.id());
    String word = graph.seen.word(Look.TIP).orElseGet(() -> statedTip(receivers));
    return switch (word) {
      case "clear" -> Gate.OPEN;
      case "under-liquid" -> Gate.sealed(what, "is under liquid");
      default -> Gate.unknown(what, "may be under liquid", graph.seen.seen().containsKey(Look.TIP) ? Look.TIP.id() : look);
    };
  }

  private static String statedTip(List<Part> receivers) {
    if (says(receivers, "tip-below-liquid", "yes")) {
      return "under-liquid";
    }
    // with no receiver on the bench there is no liquid for a tip to hang in
    boolean clear = receivers.isEmpty() || says(receivers, "tip-above-rim", "yes") || says(receivers, "tip-below-liquid", "no");
    return clear ? "clear" : PathState.NOT_SURE;
  }

  static boolean says(List<Part> parts, String key, String word) {
    return parts.stream().anyMatch(p -> p.word(key).filter(word::equals).isPresent());
  }

  private Gate stopcock(Part reservoir) {
    String what = reservoir.name();
    Optional<String> seen = graph.seen.word(Look.STOPCOCK);
    return switch (seen.or(() -> reservoir.word("stopcock")).orElse(PathState.NOT_SURE)) {
      case "shut" -> Gate.closed(what, "has its stopcock shut");
      case "open" -> column(reservoir);
      case "stuck" -> Gate.unknown(what, "has its stopcock stuck, nobody says where", Look.STOPCOCK.id());
      default -> Gate.unknown(what, "may have its stopcock shut", seen.isPresent() ? Look.STOPCOCK.id() : what + ".stopcock");
    };
  }

  private Gate column(Part reservoir) {
    String what = reservoir.name();
    Optional<String> seen = graph.seen.word(Look.RESERVOIR_LEVEL);
    String stated = reservoir.si("water").map(w -> w > 0 ? "ok" : "empty").orElse(PathState.NOT_SURE);
    return switch (seen.orElse(stated)) {
      case "empty", "dry" -> Gate.OPEN;
      case PathState.NOT_SURE -> Gate.unknown(what, "may hold water over its stopcock", seen.isPresent() ? Look.RESERVOIR_LEVEL.id() : what + ".water");
      default -> Gate.sealed(what, "holds water over its open stopcock");
    };
  }

  Gate through(Joint j) {
    if (apart.contains(j)) {
      return Gate.closed(j.toString(), "is apart");
    }
    Gate end = side(j.a()).and(side(j.b()));
    return perhapsApart.contains(j) ? end.and(Gate.unknown(j.toString(), "may be the joint seen apart", "joint-apart")) : end;
  }

  boolean isApart(Joint j) {
    return apart.contains(j);
  }

  /** True when some joint is apart and nobody can say which. */
  boolean perhapsApart() {
    return !perhapsApart.isEmpty();
  }

  private Gate side(Port p) {
    Part part = graph.rig.parts().get(p.part());
    if (part == null || (!holdsVapour(part.kind()) && !isSolid(part.kind()))) {
      return Gate.unknown(p.toString(), "is no glass that is described", p.part() + ".kind");
    }
    return isSolid(part.kind()) ? Gate.plugged(p.toString(), "fills the port") : isThrough(part) ? Exits.bore(graph, part) : Gate.OPEN;
  }
}
