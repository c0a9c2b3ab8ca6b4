package stillwarden.derive.physics;

import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Rig;

/** Which of the user's parts plays which role: by its kind, and for flasks by what it is joined to. */
final class Roles {
  private static final Set<String> HEATERS = Set.of("heating-mantle", "oil-bath", "water-bath", "hot-plate", "gas-burner");
  private static final Set<String> CONDENSERS = Set.of("liebig-condenser", "coil-condenser", "bulb-condenser");
  private static final Set<String> BOILER_SIDE = Set.of("claisen-adapter", "still-head", "splash-head");
  private static final Set<String> RECEIVERS =
      Set.of("graduated-receiver", "receiver", "measuring-cylinder", "graduated-cylinder", "erlenmeyer-flask", "conical-flask", "beaker", "bottle");
  private static final Set<String> FUNNELS = Set.of("separatory-funnel", "dropping-funnel");
  private static final Set<String> TAKE_OFFS = Set.of("vacuum-adapter", "bent-adapter");
  private static final String ROUND = "round-bottom-flask";

  private Roles() {}

  static Optional<Part> heater(Rig rig) {
    return first(rig, p -> HEATERS.contains(p.kind()));
  }

  static Optional<Part> regulator(Rig rig) {
    return first(rig, p -> p.kind().equals("power-regulator")).or(() -> first(rig, p -> p.kind().equals("temperature-controller")));
  }

  static Optional<Part> reservoir(Rig rig) {
    return first(rig, p -> FUNNELS.contains(p.kind()));
  }

  static Optional<Part> condenser(Rig rig) {
    return first(rig, p -> CONDENSERS.contains(p.kind()));
  }

  static Optional<Part> takeOff(Rig rig) {
    return first(rig, p -> TAKE_OFFS.contains(p.kind()));
  }

  static Optional<Part> ventHose(Rig rig) {
    return first(rig, p -> p.kind().equals("vent-hose"));
  }

  /** The boiling flask: the round flask under the claisen or the head, else the only one. */
  static Optional<Part> flask(Rig rig) {
    List<Part> round = rig.parts().values().stream().filter(p -> p.kind().equals(ROUND)).toList();
    Optional<Part> joined = round.stream().filter(p -> joinedTo(rig, p, BOILER_SIDE)).findFirst();
    return joined.isPresent() || round.size() != 1 ? joined : Optional.of(round.get(0));
  }

  static Optional<Part> receiver(Rig rig) {
    Optional<Part> own = first(rig, p -> RECEIVERS.contains(p.kind()));
    return own.isPresent() ? own : first(rig, p -> p.kind().equals(ROUND) && !flask(rig).filter(p::equals).isPresent());
  }

  /** A path by role ({@code mantle.power}) in the user's own part names; a role that no part plays keeps its word. */
  static String path(Rig rig, String byRole) {
    int dot = byRole.indexOf('.');
    String role = dot < 0 ? byRole : byRole.substring(0, dot);
    Optional<Part> part = switch (role) {
      case "mantle" -> heater(rig);
      case "flask" -> flask(rig);
      case "reservoir" -> reservoir(rig);
      case "condenser" -> condenser(rig);
      case "take-off" -> takeOff(rig);
      case "receiver" -> receiver(rig);
      default -> Optional.empty();
    };
    return part.map(p -> p.name() + byRole.substring(role.length())).orElse(byRole);
  }

  private static Optional<Part> first(Rig rig, Predicate<Part> which) {
    return rig.parts().values().stream().filter(which).findFirst();
  }

  private static boolean joinedTo(Rig rig, Part part, Set<String> kinds) {
    return rig.joints().stream().anyMatch(j -> meets(rig, j, part, kinds));
  }

  private static boolean meets(Rig rig, Joint j, Part part, Set<String> kinds) {
    String other = j.a().part().equals(part.name()) ? j.b().part() : j.b().part().equals(part.name()) ? j.a().part() : "";
    return rig.parts().containsKey(other) && kinds.contains(rig.parts().get(other).kind());
  }
}
