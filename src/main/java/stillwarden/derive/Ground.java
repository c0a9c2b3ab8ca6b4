package stillwarden.derive;

import java.time.Instant;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Supplier;
import stillwarden.derive.physics.Numbers;
import stillwarden.derive.physics.Physics;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/**
 * What stands while a rig and a policy stand, worked out once for all moments of a run. Each piece is kept together
 * with all that it was made from, and made anew when that differs: what is kept saves work and changes no answer. For
 * one thread at a time.
 */
public final class Ground {
  private final Rig rig;
  private final Policy policy;
  private final Roles roles;
  private final Physics physics;
  private final Map<String, Block> blocks = new HashMap<>();
  private PathState pathSeen;
  private PathFinding path;

  /** Signs made by one maker, with all that they depend on besides rig and policy. */
  private record Block(Object madeFrom, List<Sign> signs) {}

  public Ground(Rig rig, Policy policy) {
    this.rig = rig;
    this.policy = policy;
    this.roles = Roles.of(rig);
    this.physics = new Physics(rig, policy);
  }

  public Rig rig() {
    return rig;
  }

  public Policy policy() {
    return policy;
  }

  Roles roles() {
    return roles;
  }

  Numbers numbers(List<Entry> entries, Instant at) {
    return physics.numbers(entries, at);
  }

  /** The way out, searched again only when something on it was seen otherwise. */
  PathFinding path(PathState seen) {
    if (!seen.equals(pathSeen)) {
      path = VapourPath.find(rig, seen);
      pathSeen = seen;
    }
    return path;
  }

  List<Sign> block(String maker, Object madeFrom, Supplier<List<Sign>> make) {
    Block kept = blocks.get(maker);
    if (kept == null || !kept.madeFrom().equals(madeFrom)) {
      kept = new Block(madeFrom, make.get());
      blocks.put(maker, kept);
    }
    return kept.signs();
  }
}
