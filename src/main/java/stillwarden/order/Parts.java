package stillwarden.order;

import java.util.Map;
import stillwarden.derive.RigNames;
import stillwarden.derive.Role;
import stillwarden.derive.Situation;

/** Which part of this rig a deed is done on, where the rule did not say. */
final class Parts {
  private static final Map<String, Role> ON = Map.ofEntries(
      Map.entry("cut-power", Role.HEATER), Map.entry("isolate-remote", Role.HEATER), Map.entry("isolate-auto", Role.HEATER), Map.entry("keep-heat-off", Role.HEATER),
      Map.entry("close-gas", Role.HEATER), Map.entry("lower-heat", Role.HEATER), Map.entry("lower-heat-part", Role.HEATER), Map.entry("reduce-heat", Role.HEATER),
      Map.entry("hold-heat", Role.HEATER), Map.entry("lower-receiver", Role.RECEIVER), Map.entry("swap-receiver", Role.RECEIVER), Map.entry("open-vent", Role.TAKE_OFF),
      Map.entry("support-load", Role.FLASK), Map.entry("let-cool", Role.FLASK), Map.entry("verify-level", Role.FLASK), Map.entry("close-feed", Role.RESERVOIR),
      Map.entry("leave-feed", Role.RESERVOIR), Map.entry("feed-slow", Role.RESERVOIR), Map.entry("refill-reservoir", Role.RESERVOIR),
      Map.entry("unstopper-reservoir", Role.RESERVOIR), Map.entry("coolant-keep", Role.CONDENSER), Map.entry("coolant-start-slow", Role.CONDENSER),
      Map.entry("coolant-raise", Role.CONDENSER), Map.entry("coolant-stop", Role.CONDENSER), Map.entry("coolant-leave-off", Role.CONDENSER),
      Map.entry("coolant-warm", Role.CONDENSER), Map.entry("jacket-drain", Role.CONDENSER));

  private Parts() {}

  static String of(Situation s, String action) {
    Role role = ON.get(action);
    return role == null ? "" : RigNames.part(s.roles(), role);
  }
}
