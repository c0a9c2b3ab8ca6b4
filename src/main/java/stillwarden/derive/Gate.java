package stillwarden.derive;

import java.util.List;
import java.util.stream.Stream;

/**
 * Whether one joint, passage or opening lets vapour through.
 *
 * @param what port, part or joint in the user's names
 * @param why in words, after {@code what}
 * @param handsCold hands could open it on a cold rig
 * @param looks what would tell, where it is unknown
 * @param liquid closed by nothing but a liquid, which a push moves out of the way
 */
record Gate(Pass pass, String what, String why, boolean handsCold, List<String> looks, boolean liquid) {
  static final Gate OPEN = new Gate(Pass.OPEN, "", "", true, List.of(), false);

  /** From calm to worst. */
  enum Pass {
    OPEN,
    UNKNOWN,
    CLOSED
  }

  static Gate closed(String what, String why) {
    return new Gate(Pass.CLOSED, what, why, true, List.of(), false);
  }

  /** Closed by something that hands cannot take away. */
  static Gate plugged(String what, String why) {
    return new Gate(Pass.CLOSED, what, why, false, List.of(), false);
  }

  static Gate sealed(String what, String why) {
    return new Gate(Pass.CLOSED, what, why, true, List.of(), true);
  }

  static Gate unknown(String what, String why, String... looks) {
    return new Gate(Pass.UNKNOWN, what, why, true, List.of(looks), false);
  }

  /** Both in one way: the worse counts, and what is unknown is still asked. */
  Gate and(Gate o) {
    if (isOpen() || o.isOpen()) {
      return isOpen() ? o : this;
    }
    Gate worse = pass.compareTo(o.pass) >= 0 ? this : o;
    boolean both = pass == o.pass && !(what + why).equals(o.what + o.why);
    return new Gate(
        worse.pass,
        both ? what : worse.what,
        both ? why + "; " + (o.what.equals(what) ? "" : o.what + " ") + o.why : worse.why,
        (isUnknown() || handsCold) && (o.isUnknown() || o.handsCold),
        Stream.concat(looks.stream(), o.looks.stream()).distinct().toList(),
        liquid && o.liquid);
  }

  boolean isOpen() {
    return pass == Pass.OPEN;
  }

  boolean isClosed() {
    return pass == Pass.CLOSED;
  }

  boolean isUnknown() {
    return pass == Pass.UNKNOWN;
  }

  /** Vapour may come through, for all that is known. */
  boolean mayPass() {
    return pass != Pass.CLOSED;
  }

  /** A push surely gets through, moving liquid if it must. */
  boolean yields() {
    return isOpen() || liquid;
  }
}
