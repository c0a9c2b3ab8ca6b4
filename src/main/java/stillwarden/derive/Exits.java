package stillwarden.derive;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import stillwarden.derive.PathState.Look;
import stillwarden.describe.Datum;
import stillwarden.describe.Part;
import stillwarden.describe.Port;

/** What becomes of a port that is in no joint: open to the air, stoppered, ending in a hose, or nobody said. */
final class Exits {
  private final RigGraph graph;

  Exits(RigGraph graph) {
    this.graph = graph;
  }

  void addAll(Part part) {
    if (Passages.isThrough(part)) {
      hoseEnd(part);
      return;
    }
    boolean receives = graph.is(part.name(), Role.RECEIVER);
    if (receives && !graph.joined(part)) {
      return; // stands free: its mouth is no end of the chain of glass
    }
    for (Port port : graph.ports(part)) {
      if (!graph.joined(port)) {
        Gate tight = receives ? ownVent(part) : Gate.OPEN;
        graph.exits.add(new RigGraph.Exit(port, at(part, port).and(tight), graph.kind(port)));
      }
    }
    if (receives) {
      graph.exits.add(new RigGraph.Exit(RigGraph.space(part.name()), ownVent(part), RigGraph.Kind.DESIGNED));
    }
  }

  private Gate at(Part part, Port port) {
    List<Gate> said = new ArrayList<>();
    opening(port).ifPresent(said::add);
    if (port.port().equals("side-arm") && graph.is(part.name(), Role.TAKE_OFF)) {
      part.word("side-arm").map(w -> word(port, w)).ifPresent(said::add);
    }
    if (port.port().equals("top") && graph.is(part.name(), Role.RESERVOIR)) {
      said.add(stopper(part, port, !said.isEmpty()));
    }
    if (port.port().equals("upper") && graph.is(part.name(), Role.CONDENSER)) {
      graph.seen.word(Look.CONDENSER_TOP).map(w -> word(port, w)).ifPresent(said::add);
    }
    if (graph.isTip(port)) {
      underTip(port).ifPresent(said::add);
    }
    return said.isEmpty() ? unlisted(part, port) : said.stream().reduce(Gate.OPEN, Gate::and);
  }

  private Optional<Gate> opening(Port port) {
    return graph.rig.openings().entrySet().stream()
        .filter(e -> graph.canonical(e.getKey()).equals(port))
        .map(e -> word(port, e.getValue().text()))
        .reduce(Gate::and);
  }

  private Gate word(Port port, String word) {
    return switch (word) {
      case "open" -> Gate.OPEN;
      case "stoppered", "capped" -> Gate.closed(graph.name(port), "is " + word);
      case "tube" -> tube(port);
      default -> Gate.unknown(graph.name(port), "may be closed", path(port));
    };
  }

  private String path(Port port) {
    return graph.is(port.part(), Role.TAKE_OFF) && port.port().equals("side-arm") ? port.toString() : "openings." + graph.name(port);
  }

  private Gate stopper(Part part, Port port, boolean alreadySaid) {
    Optional<String> seen = graph.seen.word(Look.STOPPER);
    return switch (seen.or(() -> part.word("stopper")).orElse(alreadySaid ? "off" : PathState.NOT_SURE)) {
      case "off" -> Gate.OPEN;
      case "on" -> Gate.closed(graph.name(port), "has its stopper on");
      default -> Gate.unknown(graph.name(port), "may have its stopper on", seen.isPresent() ? Look.STOPPER.id() : part.name() + ".stopper");
    };
  }

  /** With the receiver free the tip ends in the air. Of several receivers the file does not say which one stands there. */
  private Optional<Gate> underTip(Port tip) {
    List<Part> here = graph.roles.all(Role.RECEIVER).stream().filter(r -> !graph.joined(r)).toList();
    List<Gate> each = here.stream().flatMap(r -> underTip(tip, r).stream()).toList();
    boolean tight = each.stream().anyMatch(Gate::isClosed);
    if (tight && here.size() > 1) {
      return Optional.of(Gate.unknown(graph.name(tip), "may end in a gas-tight receiver", "path"));
    }
    return each.stream().reduce(Gate::and);
  }

  /** A receiver with no joint listed; stated to be jointed nevertheless, it counts by its own vent. */
  private Optional<Gate> underTip(Port tip, Part receiver) {
    if (receiver.word("held").filter("jointed"::equals).isPresent()) {
      return Optional.of(ownVent(receiver));
    }
    if (receiver.word("gas-tight").filter("yes"::equals).isPresent()) {
      return Optional.of(Gate.closed(graph.name(tip), "ends in `" + receiver.name() + "`, which is gas-tight"));
    }
    return receiver.word("gas-tight").or(() -> receiver.word("held")).map(said -> Gate.OPEN);
  }

  /** "Nothing else on the bench" leaves no stopper that could be in it. */
  private Gate unlisted(Part part, Port port) {
    if (graph.hasRole(part.name())) {
      graph.unlisted.add(port);
    }
    return graph.rig.nothingElse() && !sideArm(port) ? Gate.OPEN : Gate.unknown(graph.name(port), "is in no joint, and nobody said whether it is open", path(port));
  }

  /** A jointed receiver's own way to the air, which its liquid can close. */
  private Gate ownVent(Part receiver) {
    Gate tight =
        switch (receiver.word("gas-tight").orElse(PathState.NOT_SURE)) {
          case "no" -> Gate.OPEN;
          case "yes" -> Gate.closed(receiver.name(), "is gas-tight");
          default -> Gate.unknown(receiver.name(), "may be gas-tight", receiver.name() + ".gas-tight");
        };
    Gate level =
        switch (graph.seen.word(Look.RECEIVER_VENT).orElse(PathState.NOT_SURE)) {
          case "clear" -> Gate.OPEN;
          case "under-liquid" -> Gate.sealed(receiver.name(), "has its liquid at or over its own vent");
          default -> Gate.unknown(receiver.name(), "may have its liquid over its own vent", Look.RECEIVER_VENT.id());
        };
    return tight.and(level);
  }

  private Gate tube(Port port) {
    List<Part> hoses = graph.roles.all(Role.VENT_HOSE).stream().filter(h -> !graph.joined(h)).toList();
    if (hoses.isEmpty()) {
      return Gate.unknown(graph.name(port), "ends in a tube of which nothing is said", "vent-hose.end");
    }
    return hoses.stream().map(h -> bore(graph, h).and(end(h))).reduce(Gate.OPEN, Gate::and);
  }

  /** A hose in a joint ends in the air with its other end, unless that is jointed too. */
  private void hoseEnd(Part hose) {
    Port space = RigGraph.space(hose.name());
    long ends = graph.rig.joints().stream().filter(j -> j.a().part().equals(hose.name()) || j.b().part().equals(hose.name())).count();
    if (ends == 1) {
      graph.exits.add(new RigGraph.Exit(space, end(hose), hangsDownstream(space)));
    }
  }

  /** A hose on a head or a flask is no designed way out. */
  private RigGraph.Kind hangsDownstream(Port hose) {
    return graph.reach(hose, e -> graph.downstream(e.a()) && graph.downstream(e.b())).stream()
            .anyMatch(p -> !Passages.isThrough(graph.rig.parts().get(p.part())))
        ? RigGraph.Kind.DESIGNED
        : RigGraph.Kind.OTHER;
  }

  private Gate end(Part hose) {
    Optional<String> seen = graph.seen.word(Look.HOSE_END);
    String endsInAir = hose.kind().equals("drying-tube") ? "open" : PathState.NOT_SURE;
    Gate end =
        switch (seen.or(() -> hose.word("end")).orElse(endsInAir)) {
          case "open" -> Gate.OPEN;
          case "under-liquid" -> Gate.sealed(hose.name(), "has its end under liquid");
          default -> Gate.unknown(hose.name(), "may have its end under liquid", seen.isPresent() ? Look.HOSE_END.id() : hose.name() + ".end");
        };
    return graph.roles.all(Role.DRYING_TUBE).stream()
        .filter(d -> hose.kind().equals("vent-hose") && !graph.joined(d))
        .map(d -> bore(graph, d))
        .reduce(end, Gate::and);
  }

  /** What stands in a hose or a drying tube between its ends. */
  static Gate bore(RigGraph graph, Part part) {
    return part.kind().equals("drying-tube") ? drier(graph, part) : hose(graph, part).and(inlineDrier(graph, part));
  }

  private static Gate hose(RigGraph graph, Part hose) {
    Gate kink =
        switch (graph.seen.word(Look.HOSE).orElse(PathState.NOT_SURE)) {
          case "clear" -> Gate.OPEN;
          case "kinked" -> Gate.closed(hose.name(), "is kinked");
          default -> Gate.unknown(hose.name(), "may be kinked: not looked", Look.HOSE.id());
        };
    boolean loop = hose.word("low-loop").filter("yes"::equals).isPresent();
    return loop ? kink.and(Gate.unknown(hose.name(), "hangs in a low loop, where liquid can stand", Look.HOSE_END.id())) : kink;
  }

  private static Gate inlineDrier(RigGraph graph, Part hose) {
    Optional<Datum> drier = Optional.ofNullable(hose.keys().get("drying-tube"));
    return drier.filter(d -> !d.text().equals("no") && !d.text().equals("none")).isPresent() ? drier(graph, hose) : Gate.OPEN;
  }

  private static Gate drier(RigGraph graph, Part part) {
    String lookedOver = part.word("looked-over").filter("yes"::equals).map(y -> "clear").orElse(PathState.NOT_SURE);
    return switch (graph.seen.word(Look.DRYING_TUBE).orElse(lookedOver)) {
      case "clear" -> Gate.OPEN;
      case "caked" -> Gate.closed(part.name(), "has its drying tube caked");
      default -> Gate.unknown(part.name(), "may have its drying tube caked", Look.DRYING_TUBE.id());
    };
  }

  /** The vent arm of a take-off is asked for even where nothing else is on the bench: it is the way out. */
  private boolean sideArm(Port port) {
    return port.port().equals("side-arm") && graph.is(port.part(), Role.TAKE_OFF);
  }
}
