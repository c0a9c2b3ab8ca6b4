package stillwarden.derive;

import java.util.Optional;
import stillwarden.describe.Rig;

/** Between the user's names of parts and the roles that rules speak of. */
public final class RigNames {
  private RigNames() {}

  /** The role's word for a part of this name, described or only expected. */
  public static Optional<String> role(Rig rig, Roles roles, String part) {
    Optional<String> described = roles.of(part).map(Role::word);
    if (described.isPresent() || rig.parts().containsKey(part)) {
      return described;
    }
    for (Role r : Role.values()) {
      if (RigSigns.usualName(r).equals(part)) {
        return Optional.of(r.word());
      }
    }
    return Optional.empty();
  }

  /** The user's name of the one part of a role, or the usual name. */
  public static String part(Roles roles, Role role) {
    return roles.one(role).map(p -> p.name()).orElseGet(() -> RigSigns.usualName(role));
  }
}
