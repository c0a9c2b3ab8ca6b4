package stillwarden.derive;

import java.util.EnumMap;
import java.util.LinkedHashSet;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * What was seen of the vapour's way in the run. A look that is not here was not made: then the rig file's own
 * statement counts, and without one the thing is unknown. {@code not-sure} says that a look no longer counts.
 *
 * @param seen by look, its word in the log's vocabulary
 * @param apart joints seen apart: a port, {@code joints[3]}, or a part
 * @param leaks where it hisses or vapour comes from a joint, named likewise; empty text where nobody said where
 * @param sealDepth depth in m of the immersed tip or hose end, where measured
 */
public record PathState(Map<Look, String> seen, Set<String> apart, Set<String> leaks, OptionalDouble sealDepth) {
  /** The word for a look that was made but no longer counts. */
  public static final String NOT_SURE = "not-sure";

  /** A thing to look at; {@link #id} is the observation (or {@code path}, where the log has no word for it) to ask for. */
  public enum Look {
    /** {@code none, film, growing, blocking} */
    CONDENSER_SOLIDS("condenser-solids"),
    /** {@code none, film, growing, blocking}, in the take-off, its tip or its vent arm */
    TAKE_OFF_SOLIDS("condenser-solids"),
    /** {@code at-head} and {@code over} stand in the vapour's way, {@code hidden} hides it */
    FOAM("foam"),
    /** {@code yes, no} */
    PLANT_IN_HEAD("plant-in-head"),
    /** {@code clear, under-liquid} */
    TIP("tip"),
    /** {@code clear, under-liquid}: a jointed receiver's own vent against its liquid */
    RECEIVER_VENT("receiver-level"),
    /** {@code open, shut, stuck} */
    STOPCOCK("stopcock"),
    /** {@code on, off} */
    STOPPER("stopper"),
    /** a level word; only {@code empty} and {@code dry} leave no column of water in the stem */
    RESERVOIR_LEVEL("reservoir-level"),
    /** {@code clear, kinked} */
    HOSE("path"),
    /** {@code open, under-liquid} */
    HOSE_END("vent-bubbling"),
    /** {@code clear, caked} */
    DRYING_TUBE("path"),
    /** {@code open, stoppered} */
    CONDENSER_TOP("condenser-top");

    private final String id;

    Look(String id) {
      this.id = id;
    }

    public String id() {
      return id;
    }
  }

  public PathState {
    seen = Map.copyOf(seen);
    apart = Set.copyOf(apart);
    leaks = Set.copyOf(leaks);
  }

  /** No look at all: what only a look can tell is unknown. */
  public static PathState nothingSeen() {
    return new PathState(Map.of(), Set.of(), Set.of(), OptionalDouble.empty());
  }

  /** Before heat nothing can have condensed, frozen, foamed or filled up; the rest is as the rig file states. */
  public static PathState beforeHeat() {
    return nothingSeen()
        .saw(Look.CONDENSER_SOLIDS, "none")
        .saw(Look.TAKE_OFF_SOLIDS, "none")
        .saw(Look.FOAM, "none")
        .saw(Look.PLANT_IN_HEAD, "no")
        .saw(Look.RECEIVER_VENT, "clear")
        .saw(Look.HOSE, "clear");
  }

  public PathState saw(Look look, String word) {
    Map<Look, String> more = new EnumMap<>(Look.class);
    more.putAll(seen);
    more.put(look, word);
    return new PathState(more, apart, leaks, sealDepth);
  }

  public PathState sawApart(String joint) {
    return new PathState(seen, plus(apart, joint), leaks, sealDepth);
  }

  public PathState sawLeak(String where) {
    return new PathState(seen, apart, plus(leaks, where), sealDepth);
  }

  /** @param metres of liquid over the immersed tip or hose end */
  public PathState sawSealDepth(double metres) {
    return new PathState(seen, apart, leaks, OptionalDouble.of(metres));
  }

  Optional<String> word(Look look) {
    return Optional.ofNullable(seen.get(look));
  }

  private static Set<String> plus(Set<String> some, String one) {
    Set<String> more = new LinkedHashSet<>(some);
    more.add(one);
    return more;
  }
}
