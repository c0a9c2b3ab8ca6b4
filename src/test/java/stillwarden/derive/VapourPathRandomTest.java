package stillwarden.derive;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import stillwarden.RigBuilder;
import stillwarden.derive.PathFinding.Closure;
import stillwarden.derive.PathFinding.State;
import stillwarden.describe.Port;
import stillwarden.describe.Rig;

@DisplayName("The vapour path of rigs put together at random")
class VapourPathRandomTest {
  private static final long SEED = Long.getLong("stillwarden.seed", 20260414L);
  private static final int RIGS = Integer.getInteger("stillwarden.rigs", 5_000);

  @BeforeAll
  static void tell() {
    System.out.println("random rigs from seed " + SEED + " (one more for each rig)");
  }

  /** What a test does with one random rig; the builder may be changed. */
  private interface Trial {
    void run(String seed, Random random, RigBuilder rig, PathState seen);
  }

  private static void trials(Trial trial) {
    for (long seed = SEED; seed < SEED + RIGS; seed++) {
      Random random = new Random(seed);
      trial.run("seed " + seed, random, RandomRig.small(random), RandomRig.looks(random));
    }
  }

  private static boolean flaskBoils(Rig rig) {
    return Roles.of(rig).one(Role.FLASK).isPresent();
  }

  @Test
  void agreesWithAWalkThroughEveryWay() {
    Map<State, Integer> met = new EnumMap<>(State.class);
    trials(
        (seed, random, builder, seen) -> {
          Rig rig = builder.rig();
          State want = flaskBoils(rig) ? PathOracle.state(rig, seen) : State.UNKNOWN;
          assertThat(VapourPath.find(rig, seen).path()).as(seed).isEqualTo(want);
          met.merge(want, 1, Integer::sum);
        });
    // a generator that hardly ever builds one of the three would prove nothing about it
    assertThat(met.values()).hasSize(3).allMatch(n -> n > RIGS / 20, "met " + met);
  }

  @Test
  void closingOneMorePortNeverOpensAPath() {
    trials(
        (seed, random, builder, seen) -> {
          PathFinding before = VapourPath.find(builder.rig(), seen);
          List<String> free = freePorts(builder.rig());
          PathState worse = RandomRig.closeOneMore(random, builder, seen, free);
          PathFinding after = VapourPath.find(builder.rig(), worse);
          assertThat(after.path()).as(seed).isGreaterThanOrEqualTo(before.path());
          assertThat(before.vents()).as(seed).containsAll(after.vents());
        });
  }

  @Test
  void anUnknownPortIsNeverBetterThanAClosedOneNorWorseThanAnOpenOne() {
    trials(
        (seed, random, builder, seen) -> {
          Rig rig = builder.without("nothing-else").rig();
          PathFinding unknown = VapourPath.find(rig, seen);
          for (Port port : unknown.unlisted()) {
            String path = "openings." + port;
            State closed = VapourPath.find(builder.with(path, "stoppered").rig(), seen).path();
            State open = VapourPath.find(builder.with(path, "open").rig(), seen).path();
            builder.without(path);
            if (closed == State.CLOSED || open == State.CLOSED) {
              assertThat(unknown.path()).as(seed + " " + path).isNotEqualTo(State.OPEN);
            }
            if (closed == State.OPEN || open == State.OPEN) {
              assertThat(unknown.path()).as(seed + " " + path).isNotEqualTo(State.CLOSED);
            }
          }
        });
  }

  @Test
  void everyAnswerSaysWhy() {
    trials(
        (seed, random, builder, seen) -> {
          PathFinding f = VapourPath.find(builder.rig(), seen);
          assertThat(f.openExits().isEmpty()).as(seed).isEqualTo(f.path() != State.OPEN);
          assertThat(f.unknowns().isEmpty()).as(seed).isEqualTo(f.path() != State.UNKNOWN);
          assertThat(f.path() != State.CLOSED || f.closures().stream().anyMatch(Closure::nearest)).as(seed).isTrue();
          assertThat(f.last().isPresent() && f.openings() > 1).as(seed).isFalse();
          assertThat(f.vents()).as(seed).doesNotHaveDuplicates().noneMatch(f.throughLiquid()::contains);
          assertThat(f.closures()).as(seed).noneMatch(c -> c.what().isEmpty() || c.why().isEmpty());
        });
  }

  @Test
  void theWorkOnSeventyJointsIsBounded() {
    int searched = 0;
    for (long seed = SEED; seed < SEED + 200; seed++) {
      Rig rig = RandomRig.large(new Random(seed), 70).rig();
      searched += flaskBoils(rig) ? 1 : 0;
      RigGraph graph = new RigGraph(rig, PathState.beforeHeat());
      PathFinding f = VapourPath.find(graph);
      assertThat(rig.joints()).as("seed " + seed).hasSize(70);
      // every search looks at each edge from both ends at most once; a search more for each open exit and each role
      long searches = 20L + f.openExits().size();
      assertThat(graph.work).as("seed " + seed).isLessThanOrEqualTo(2L * graph.edges.size() * searches);
    }
    assertThat(searched).as("rigs with a boiling flask").isGreaterThan(150);
  }

  private static List<String> freePorts(Rig rig) {
    return VapourPath.find(rig, PathState.nothingSeen()).unlisted().stream().map(Port::toString).toList();
  }
}
