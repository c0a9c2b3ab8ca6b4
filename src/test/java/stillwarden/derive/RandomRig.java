package stillwarden.derive;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import stillwarden.RigBuilder;
import stillwarden.derive.PathState.Look;
import stillwarden.describe.Dimension;

/** Glass put together at random, rings and dead ends included, and random looks at it. */
final class RandomRig {
  private static final Map<String, List<String>> PORTS =
      Map.of(
          "claisen-adapter", List.of("foot", "straight", "curved"),
          "still-head", List.of("foot", "top", "side-arm"),
          "liebig-condenser", List.of("upper", "lower"),
          "vacuum-adapter", List.of("inlet", "outlet", "side-arm"),
          "separatory-funnel", List.of("top", "stem"),
          "graduated-receiver", List.of("mouth"));

  private final Random random;
  private final RigBuilder rig;
  private final Map<String, List<String>> ports = new LinkedHashMap<>();

  private RandomRig(Random random) {
    this.random = random;
    this.rig = RigBuilder.empty();
  }

  /** Seven to ten parts or so. */
  static RigBuilder small(Random random) {
    RandomRig r = new RandomRig(random);
    r.flask();
    r.some("claisen-adapter", 2);
    r.some("still-head", 2);
    r.some("liebig-condenser", 2);
    r.some("vacuum-adapter", 2);
    r.some("separatory-funnel", 1);
    r.some("graduated-receiver", 2);
    r.chain();
    r.joints(random.nextInt(5));
    r.say();
    return r.rig;
  }

  /** Many parts and, where the ports suffice, this many joints. */
  static RigBuilder large(Random random, int joints) {
    RandomRig r = new RandomRig(random);
    r.flask();
    for (int i = 0; i < 30; i++) {
      r.part("claisen-adapter");
      r.part("still-head");
    }
    for (int i = 0; i < 5; i++) {
      r.part("liebig-condenser");
      r.part("vacuum-adapter");
    }
    r.joints(joints);
    r.say();
    return r.rig;
  }

  /** A new stopper in one port that is in no joint, or a look that finds something closed. */
  static PathState closeOneMore(Random random, RigBuilder rig, PathState seen, List<String> free) {
    List<PathState> looks =
        List.of(
            seen.saw(Look.CONDENSER_SOLIDS, "blocking"),
            seen.saw(Look.TAKE_OFF_SOLIDS, "blocking"),
            seen.saw(Look.TIP, "under-liquid"),
            seen.saw(Look.STOPCOCK, "shut"),
            seen.saw(Look.STOPPER, "on"),
            seen.saw(Look.RECEIVER_VENT, "under-liquid"));
    if (!free.isEmpty() && random.nextInt(3) > 0) {
      rig.with("openings." + free.get(random.nextInt(free.size())), random.nextBoolean() ? "stoppered" : "capped");
      return seen;
    }
    return looks.get(random.nextInt(looks.size()));
  }

  static PathState looks(Random random) {
    PathState s = PathState.beforeHeat();
    s = maybe(random, s, Look.CONDENSER_SOLIDS, "none", "growing", "blocking", PathState.NOT_SURE);
    s = maybe(random, s, Look.FOAM, "rising", "at-head", PathState.NOT_SURE);
    s = maybe(random, s, Look.TIP, "clear", "under-liquid", PathState.NOT_SURE);
    s = maybe(random, s, Look.STOPCOCK, "open", "shut", "stuck");
    s = maybe(random, s, Look.STOPPER, "on", "off");
    s = maybe(random, s, Look.RESERVOIR_LEVEL, "empty", "low", PathState.NOT_SURE);
    return maybe(random, s, Look.RECEIVER_VENT, "clear", "under-liquid", PathState.NOT_SURE);
  }

  private static PathState maybe(Random random, PathState s, Look look, String... words) {
    return random.nextInt(3) == 0 ? s.saw(look, words[random.nextInt(words.length)]) : s;
  }

  private void flask() {
    int necks = 2 + random.nextInt(2);
    rig.part("flask", "round-bottom-flask", "boiling-aid", "fresh-stones").quantity("flask.necks", necks, Dimension.COUNT, "" + necks);
    ports.put("flask", new ArrayList<>());
    for (int i = 1; i <= necks; i++) {
      ports.get("flask").add("neck-" + i);
    }
  }

  private void some(String kind, int most) {
    int n = random.nextInt(4) == 0 ? random.nextInt(most + 1) : 1;
    for (int i = 0; i < n; i++) {
      part(kind);
    }
  }

  private void part(String kind) {
    String name = kind + "-" + (ports.size() + 1);
    rig.part(name, kind);
    ports.put(name, new ArrayList<>(PORTS.get(kind)));
  }

  /** Mostly a sensible order first: a heap of random joints hardly ever has an open path. */
  private void chain() {
    String before = "flask";
    for (String next : List.copyOf(ports.keySet())) {
      boolean end = next.startsWith("graduated") || next.startsWith("separatory");
      if (!next.equals("flask") && !end && random.nextInt(10) > 0) {
        List<String> out = ports.get(before);
        join(before, out.get(out.size() > 1 && !before.equals("flask") && random.nextInt(4) == 0 ? out.size() - 2 : out.size() - 1), next, ports.get(next).get(0));
        before = next.startsWith("vacuum") ? before : next;
        if (ports.get(before).isEmpty()) {
          return;
        }
      }
    }
  }

  private void joints(int n) {
    for (int i = 0; i < n; i++) {
      List<String> with = new ArrayList<>(ports.keySet());
      with.removeIf(p -> ports.get(p).isEmpty());
      Collections.shuffle(with, random);
      if (with.size() > 1) {
        join(with.get(0), pick(ports.get(with.get(0))), with.get(1), pick(ports.get(with.get(1))));
      }
    }
  }

  private void join(String a, String portA, String b, String portB) {
    rig.join(a + "." + portA, b + "." + portB);
    ports.get(a).remove(portA);
    ports.get(b).remove(portB);
  }

  private String pick(List<String> some) {
    return some.get(random.nextInt(some.size()));
  }

  private void say() {
    if (random.nextInt(3) == 0) {
      rig.with("nothing-else", "yes");
    }
    ports.forEach((part, free) -> free.forEach(port -> opening(part + "." + port)));
    for (String part : ports.keySet()) {
      key(part, "vacuum-", "side-arm", "open", "stoppered");
      key(part, "separatory-", "stopper", "on", "off");
      key(part, "separatory-", "stopcock", "open", "shut");
      key(part, "graduated-", "gas-tight", "yes", "no");
      key(part, "graduated-", "held", "free");
      key(part, "graduated-", "tip-below-liquid", "yes", "no");
      if (part.startsWith("separatory-") && random.nextBoolean()) {
        double water = random.nextInt(2) * 1e-4;
        rig.quantity(part + ".water", water, Dimension.VOLUME, water * 1e6 + " mL");
      }
    }
  }

  private void opening(String port) {
    if (random.nextInt(3) == 0) {
      rig.with("openings." + port, List.of("open", "stoppered", "capped").get(random.nextInt(3)));
    }
  }

  private void key(String part, String kind, String key, String... words) {
    if (part.startsWith(kind) && random.nextInt(3) > 0) {
      rig.with(part + "." + key, words[random.nextInt(words.length)]);
    }
  }
}
