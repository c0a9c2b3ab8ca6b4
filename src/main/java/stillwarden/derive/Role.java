package stillwarden.derive;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** What a part is there for, and the kinds of part that can do it. */
public enum Role {
  HEATER("heater", "heating-mantle", "oil-bath", "water-bath", "hot-plate", "gas-burner"),
  JACK("jack", "lab-jack"),
  /** The jack under the receiver, not the one under the heater. */
  RECEIVER_JACK("receiver-jack"),
  REGULATOR("regulator", "power-regulator"),
  CONTROLLER("controller", "temperature-controller"),
  PROBE("probe", "controller-probe"),
  FLASK("flask", "round-bottom-flask"),
  CLAISEN("claisen", "claisen-adapter"),
  RESERVOIR("reservoir", "separatory-funnel", "dropping-funnel"),
  HEAD("head", "still-head", "splash-head"),
  THERMOMETER("thermometer", "thermometer"),
  CONDENSER("condenser", "liebig-condenser", "coil-condenser", "bulb-condenser"),
  TAKE_OFF("take-off", "vacuum-adapter", "bent-adapter"),
  RECEIVER("receiver", "graduated-receiver", "erlenmeyer-flask", "beaker", "bottle"),
  VENT_HOSE("vent-hose", "vent-hose"),
  DRYING_TUBE("drying-tube", "drying-tube"),
  STAND("stand", "stand");

  /** Without these there is no in-flask steam distillation. */
  public static final List<Role> IN_FLASK =
      List.of(HEATER, FLASK, CLAISEN, RESERVOIR, HEAD, THERMOMETER, CONDENSER, TAKE_OFF, RECEIVER);

  private static final Map<String, Role> BY_KIND = new HashMap<>();

  static {
    for (Role r : values()) {
      r.kinds.forEach(k -> BY_KIND.put(k, r));
    }
  }

  private final String word;
  private final Set<String> kinds;

  Role(String word, String... kinds) {
    this.word = word;
    this.kinds = Set.of(kinds);
  }

  /** The word that rules use for it: {@code take-off}. */
  public String word() {
    return word;
  }

  /** The role that a kind has when nothing else decides. */
  static Optional<Role> ofKind(String kind) {
    return Optional.ofNullable(BY_KIND.get(kind));
  }

  /** The role that a name suggests ({@code condenser-2}, {@code claisen-adapter}): the only hint where the kind is {@code none}. */
  static Optional<Role> ofName(String name) {
    String plain = name.replaceFirst("-\\d+$", "");
    return List.of(values()).stream().filter(r -> r.word.equals(plain)).findFirst().or(() -> ofKind(plain));
  }
}
