package stillwarden.derive.physics;

import java.util.Optional;
import stillwarden.derive.Role;
import stillwarden.derive.Roles;
import stillwarden.describe.Part;
import stillwarden.describe.Rig;

/** The parts that numbers are computed from, by role; of several that play one role the first in the file. */
record RigParts(Rig rig, Roles roles) {
  static RigParts of(Rig rig) {
    return new RigParts(rig, Roles.of(rig));
  }

  Optional<Part> heater() {
    return first(Role.HEATER);
  }

  Optional<Part> regulator() {
    return first(Role.REGULATOR).or(() -> first(Role.CONTROLLER));
  }

  Optional<Part> flask() {
    return first(Role.FLASK);
  }

  Optional<Part> reservoir() {
    return first(Role.RESERVOIR);
  }

  Optional<Part> condenser() {
    return first(Role.CONDENSER);
  }

  Optional<Part> takeOff() {
    return first(Role.TAKE_OFF);
  }

  Optional<Part> ventHose() {
    return first(Role.VENT_HOSE);
  }

  Optional<Part> receiver() {
    return first(Role.RECEIVER);
  }

  private Optional<Part> first(Role role) {
    return roles.all(role).stream().findFirst();
  }

  /** A path by role ({@code mantle.power}) in the user's own part names; a role that no part plays keeps its word. */
  String path(String byRole) {
    int dot = byRole.indexOf('.');
    String role = dot < 0 ? byRole : byRole.substring(0, dot);
    Optional<Part> part = switch (role) {
      case "mantle" -> heater();
      case "flask" -> flask();
      case "reservoir" -> reservoir();
      case "condenser" -> condenser();
      case "take-off" -> takeOff();
      case "receiver" -> receiver();
      default -> Optional.empty();
    };
    return part.map(p -> p.name() + byRole.substring(role.length())).orElse(byRole);
  }
}
