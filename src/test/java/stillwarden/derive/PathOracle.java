package stillwarden.derive;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import stillwarden.derive.PathFinding.State;
import stillwarden.derive.PathState.Look;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Port;
import stillwarden.describe.Rig;

/**
 * A second opinion that shares no code with the search: walks every way through the glass that visits no part twice,
 * notes the worst thing on each, and takes the best way. For the kinds that {@link RandomRig} builds.
 */
final class PathOracle {
  private final Rig rig;
  private final PathState seen;
  private State designed = State.CLOSED;
  private boolean leadsOn;
  private boolean looseEnd;
  private final Set<String> visited = new HashSet<>();

  private PathOracle(Rig rig, PathState seen) {
    this.rig = rig;
    this.seen = seen;
  }

  static State state(Rig rig, PathState seen) {
    PathOracle o = new PathOracle(rig, seen);
    o.walk(rig.parts().get("flask"), "", State.OPEN);
    return o.leadsOn ? o.designed : o.looseEnd ? State.UNKNOWN : State.CLOSED;
  }

  private void walk(Part part, String entry, State soFar) {
    visited.add(part.name());
    for (String port : ports(part)) {
      if (port.equals(entry)) {
        continue;
      }
      State here = worse(worse(soFar, gate(part, entry)), gate(part, port));
      Port out = new Port(part.name(), port);
      Port next = partner(out);
      if (next == null) {
        end(part, here, exit(part, out));
      } else if (!visited.contains(next.part())) {
        walk(rig.parts().get(next.part()), next.port(), here);
      }
    }
    if (is(part, "graduated")) {
      end(part, worse(soFar, gate(part, entry)), ownVent(part));
    }
    visited.remove(part.name());
  }

  private void end(Part part, State way, State exit) {
    if (is(part, "liebig") || is(part, "vacuum") || is(part, "graduated")) {
      leadsOn = true;
      State all = worse(way, exit);
      designed = all.compareTo(designed) < 0 ? all : designed;
    } else if (!is(part, "separatory") && way != State.CLOSED && exit == State.UNKNOWN) {
      looseEnd = true;
    }
  }

  private static boolean is(Part p, String kind) {
    return p.kind().startsWith(kind);
  }

  private static State worse(State a, State b) {
    return a.compareTo(b) > 0 ? a : b;
  }

  private List<String> ports(Part p) {
    return switch (p.kind()) {
      case "round-bottom-flask" -> p.si("necks").orElseThrow() > 2 ? List.of("neck-1", "neck-2", "neck-3") : List.of("neck-1", "neck-2");
      case "claisen-adapter" -> List.of("foot", "straight", "curved");
      case "still-head" -> List.of("foot", "top", "side-arm");
      case "liebig-condenser" -> List.of("upper", "lower");
      case "vacuum-adapter" -> List.of("inlet", "outlet", "side-arm");
      case "separatory-funnel" -> List.of("top", "stem");
      default -> List.of("mouth");
    };
  }

  private Port partner(Port p) {
    for (Joint j : rig.joints()) {
      if (j.a().equals(p)) {
        return j.b();
      }
      if (j.b().equals(p)) {
        return j.a();
      }
    }
    return null;
  }

  private boolean any(String kind) {
    return rig.parts().values().stream().anyMatch(p -> is(p, kind));
  }

  private boolean anySays(String key, String word) {
    return rig.parts().values().stream().anyMatch(p -> is(p, "graduated") && p.word(key).orElse("").equals(word));
  }

  private State gate(Part p, String port) {
    State s = State.OPEN;
    if (is(p, "liebig") && port.equals("lower")) {
      s = seen(Look.CONDENSER_SOLIDS, "blocking", "none", "film", "growing");
    }
    if (is(p, "vacuum") && port.equals("inlet")) {
      s = seen(Look.TAKE_OFF_SOLIDS, "blocking", "none", "film", "growing");
    }
    boolean foamed = any("still") ? is(p, "still") && port.equals("side-arm") : is(p, "liebig") && port.equals("upper");
    if (foamed && !List.of("none", "rising").contains(seen.seen().get(Look.FOAM))) {
      s = worse(s, State.UNKNOWN);
    }
    boolean tip = any("vacuum") ? is(p, "vacuum") && port.equals("outlet") : is(p, "liebig") && port.equals("lower");
    if (tip) {
      s = worse(s, tip());
    }
    return is(p, "separatory") && port.equals("stem") ? worse(s, stem(p)) : s;
  }

  private State seen(Look look, String closed, String... open) {
    String word = seen.seen().getOrDefault(look, "");
    return word.equals(closed) ? State.CLOSED : List.of(open).contains(word) ? State.OPEN : State.UNKNOWN;
  }

  private State tip() {
    if (seen.seen().containsKey(Look.TIP)) {
      return seen(Look.TIP, "under-liquid", "clear");
    }
    return anySays("tip-below-liquid", "yes")
        ? State.CLOSED
        : anySays("tip-below-liquid", "no") || !any("graduated") ? State.OPEN : State.UNKNOWN;
  }

  private State stem(Part p) {
    String stopcock = seen.seen().getOrDefault(Look.STOPCOCK, p.word("stopcock").orElse(""));
    String stated = p.si("water").map(w -> w > 0 ? "full" : "empty").orElse("not-sure");
    String level = seen.seen().getOrDefault(Look.RESERVOIR_LEVEL, stated);
    if (stopcock.equals("shut")) {
      return State.CLOSED;
    }
    return !stopcock.equals("open") || level.equals("not-sure") ? State.UNKNOWN : level.equals("empty") ? State.OPEN : State.CLOSED;
  }

  private State exit(Part part, Port port) {
    List<String> said = new ArrayList<>();
    if (rig.openings().containsKey(port)) {
      said.add(rig.openings().get(port).text());
    }
    if (is(part, "vacuum") && port.port().equals("side-arm")) {
      part.word("side-arm").ifPresent(said::add);
    }
    boolean top = is(part, "separatory") && port.port().equals("top");
    if (top) {
      String stopper = seen.seen().getOrDefault(Look.STOPPER, part.word("stopper").orElse(said.isEmpty() ? "unknown" : "off"));
      said.add(stopper.equals("on") ? "stoppered" : stopper.equals("off") ? "open" : "unknown");
    }
    boolean tip = any("vacuum") ? is(part, "vacuum") && port.port().equals("outlet") : is(part, "liebig") && port.port().equals("lower");
    if (tip) {
      receivers(said);
    }
    if (said.isEmpty()) {
      return rig.nothingElse() && !(is(part, "vacuum") && port.port().equals("side-arm")) ? State.OPEN : State.UNKNOWN;
    }
    boolean closed = said.contains("stoppered") || said.contains("capped");
    return closed ? State.CLOSED : said.contains("unknown") ? State.UNKNOWN : State.OPEN;
  }

  private void receivers(List<String> said) {
    List<Part> free = rig.parts().values().stream().filter(p -> is(p, "graduated") && partner(new Port(p.name(), "mouth")) == null).toList();
    boolean tight = free.stream().anyMatch(p -> p.word("gas-tight").orElse("").equals("yes"));
    boolean loose = free.stream().anyMatch(p -> p.word("gas-tight").isPresent() || p.word("held").isPresent());
    if (tight) {
      said.add(free.size() > 1 ? "unknown" : "stoppered");
    } else if (loose) {
      said.add("open");
    }
  }

  private State ownVent(Part p) {
    State level = seen(Look.RECEIVER_VENT, "under-liquid", "clear");
    String tight = p.word("gas-tight").orElse("");
    return worse(level, tight.equals("yes") ? State.CLOSED : tight.equals("no") ? State.OPEN : State.UNKNOWN);
  }
}
