package stillwarden.derive;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import stillwarden.describe.Port;

/**
 * Whether vapour can leave the boiling flask, worked out on the graph of parts and joints. All names are the user's.
 *
 * @param path the designed way: flask, Claisen adapter, head, condenser, take-off, the air
 * @param openExits designed exits that are surely open and surely reached
 * @param closures what closes the designed way or a branch of it; never empty when {@code path} is CLOSED
 * @param unknowns rig paths or observation ids that would decide; filled only when {@code path} is UNKNOWN
 * @param vents everything through which the flask surely vents now, leaks and open ports off the designed way included
 * @param throughLiquid ports that would vent only by pushing liquid out of the way
 * @param countKnown no unknown port, passage or leak could add to {@code vents}
 * @param last the one vent left, or, with none, the one port left that vents through liquid
 * @param relief what the reservoir would let out
 * @param inletUpstreamOfTip air surely gets in upstream of the tip (false also where nobody can say)
 * @param narrowest on the widest of the open designed ways
 * @param feedCrossesVapourPath the feed falls through a part beyond flask and Claisen adapter that the vapour takes too
 * @param feedArm arm of the Claisen adapter that carries the reservoir: {@code straight} or {@code side}
 * @param unreached glass that no chain of joints links to the flask (a receiver standing free is not glass of the chain)
 * @param unlisted ports in no joint of which the file says nothing
 * @param seals immersed ends
 */
public record PathFinding(
    State path,
    List<String> openExits,
    List<Closure> closures,
    List<String> unknowns,
    List<Port> vents,
    List<Port> throughLiquid,
    boolean countKnown,
    Optional<Port> last,
    Relief relief,
    boolean inletUpstreamOfTip,
    Optional<Narrowest> narrowest,
    boolean feedCrossesVapourPath,
    Optional<String> feedArm,
    List<String> unreached,
    List<Port> unlisted,
    List<Seal> seals) {

  public PathFinding {
    openExits = List.copyOf(openExits);
    closures = List.copyOf(closures);
    unknowns = List.copyOf(unknowns);
    vents = List.copyOf(vents);
    throughLiquid = List.copyOf(throughLiquid);
    unreached = List.copyOf(unreached);
    unlisted = List.copyOf(unlisted);
    seals = List.copyOf(seals);
  }

  /** UNKNOWN: open or closed by something nobody has looked at. */
  public enum State {
    OPEN,
    UNKNOWN,
    CLOSED
  }

  /** The reservoir as a way out: never a designed one, but never to be closed when it is the last. */
  public enum Relief {
    /** stopcock shut or stopper on */
    NONE,
    /** unstoppered, stopcock open, water in it: vapour comes through as backflow only */
    THROUGH_LIQUID,
    /** unstoppered, stopcock open and dry: vapour leaves there freely */
    FREE,
    UNKNOWN
  }

  /**
   * One thing that closes a way.
   *
   * @param what port, part or joint
   * @param why in words, to be read after {@code what}
   * @param handsCold hands could open it on a cold rig; false for a plug of solid
   * @param nearest vapour gets up to it; otherwise it lies behind another closure
   */
  public record Closure(String what, String why, boolean handsCold, boolean nearest) {
    @Override
    public String toString() {
      return what + " " + why;
    }
  }

  /**
   * The narrowest place.
   *
   * @param metres inner diameter
   * @param what rig path of the bore
   * @param missing bores on the same way that nobody stated: where any is, {@code metres} is an upper bound
   */
  public record Narrowest(double metres, String what, List<String> missing) {}

  /** An immersed end; the depth in m of liquid over it, where measured. */
  public record Seal(String what, OptionalDouble metres) {}

  public int openings() {
    return vents.size();
  }

  /** No more than one opening is surely left venting: nothing may close it. */
  public boolean lastOpening() {
    return vents.size() <= 1;
  }
}
