package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import stillwarden.describe.Entry;
import stillwarden.describe.Vocabulary;

/** Is there a way out for the vapour, does anything come over, does pressure show. */
final class PathSigns {
  private static final Set<String> FLOWS = Set.of("drops", "stream", "slugs");

  private final Scene scene;
  private final SignSet out;
  private final Looks.Look pathLook;
  private final Looks.Look dripLook;
  private final Optional<Entry> lastFlow;

  PathSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
    Instant boil = scene.time().boilStart().orElse(null);
    this.pathLook = scene.looks().at("path", pathShelf(), scene.time().heatOn().orElse(null), boil);
    this.lastFlow = lastFlow();
    this.dripLook = new Looks(scene.run()).at("drip", shelf("drip"), scene.time().firstDrop().orElse(boil), boil);
  }

  private Duration shelf(String id) {
    return Shelves.of(scene.policy(), id);
  }

  /** One minute after a disturbance, five otherwise. */
  private Duration pathShelf() {
    Optional<Instant> disturbed = disturbance();
    Optional<Instant> seen = scene.run().lastSaw("path").map(Entry::at).or(() -> scene.time().heatOn());
    boolean since = disturbed.isPresent() && seen.filter(t -> t.isBefore(disturbed.get())).isPresent();
    Duration after = Vocabulary.get().shelfIn("after-disturbance", "path").orElse(Duration.ofMinutes(1));
    if (!since) {
      return shelf("path");
    }
    // a minute from the disturbance, whenever the path was last seen before it
    Duration sinceLook = Duration.between(start(seen.get()), disturbed.get());
    Duration limit = sinceLook.isNegative() ? after : sinceLook.plus(after);
    return limit.compareTo(shelf("path")) < 0 ? limit : shelf("path");
  }

  private Instant start(Instant seen) {
    return scene.time().boilStart().filter(b -> b.isAfter(seen)).orElse(seen);
  }

  private Optional<Instant> disturbance() {
    Stream<Optional<Entry>> deeds = Stream.of(scene.run().lastDid("feed", "swap-receiver"), scene.run().lastSaw("power"),
        scene.run().lastSaw("bumping").filter(e -> !e.text().equals("no")), scene.run().lastSaw("foam").filter(e -> e.text().equals("at-head")));
    return deeds.flatMap(Optional::stream).map(Entry::at).max(Instant::compareTo);
  }

  private Optional<Entry> lastFlow() {
    return Stream.of("drip", "drip-rate", "first-drop", "distillate-look").flatMap(id -> scene.run().lastSaw(id).stream())
        .filter(e -> !e.text().equals(Looks.NOT_SURE))
        // of two at one moment the worse counts: a look at the distillate does not prove a drip that is seen to have stopped
        .max(java.util.Comparator.comparing(Entry::at).thenComparing(e -> flowWord(e).equals("none")).thenComparing(Entry::line));
  }

  PathFinding make() {
    PathFinding graph = scene.ground().path(seenState());
    Flow flow = flow();
    path(graph, flow);
    pressure();
    openings(graph);
    return graph;
  }

  /** drops, stream, slugs, slowing, none; or unknown with how old. */
  private record Flow(String value, boolean known) {}

  private Flow flow() {
    if (!scene.time().vapour(scene.at()) && lastFlow.isEmpty()) {
      return new Flow("none-expected", true);
    }
    boolean sure = lastFlow.filter(e -> scene.run().age(e).compareTo(shelf("drip")) <= 0).isPresent();
    Optional<String> value = lastFlow.map(this::flowWord);
    // a drip seen to have stopped stands until it is seen again; a drip seen running does not
    if (value.isPresent() && (sure || !FLOWS.contains(value.get()))) {
      boolean expected = scene.time().vapour(scene.at()) && (!boiledDry() || plugSeen());
      if (!value.get().equals("none") || expected) {
        out.seen("flow", "", value.get(), scene.told(lastFlow.get()), lastFlow.get().at(), "drip");
      }
      return new Flow(value.get().equals("none") && !expected ? "none-expected" : value.get(), true);
    }
    if (!scene.time().vapour(scene.at()) || scene.time().firstDrop().isEmpty() && !warmUpOver()) {
      return new Flow("none-expected", true);
    }
    Looks.Age age = dripLook.age();
    String old = lastFlow.map(scene::told).orElse("nobody has looked at the tip");
    if (age == Looks.Age.OVERDUE && scene.time().cut().isEmpty()) {
      out.counted("flow", "none", old + ", too old: counts as none", "drip");
      return new Flow("none", false);
    }
    out.possible("flow", old + ", too old", "drip");
    return new Flow("unknown", false);
  }

  /** A flask that is dry, or has stopped boiling, sends nothing over: that says nothing about the way out. */
  private boolean boiledDry() {
    boolean dry = scene.run().sawValue("flask-level", "dry") || scene.run().sawValue("solids", "bare");
    boolean quiet = scene.time().cut().isPresent() && scene.run().sawValue("boiling", "none");
    return dry || quiet;
  }

  private boolean warmUpOver() {
    Optional<Duration> high = scene.high("heat-up-time");
    return scene.time().heatOn().isPresent() && high.isPresent()
        && Duration.between(scene.time().heatOn().get(), scene.at()).compareTo(high.get().multipliedBy(3).dividedBy(2)) > 0;
  }

  private String flowWord(Entry e) {
    return switch (e.id()) {
      case "drip" -> e.text();
      case "first-drop" -> "drops";
      case "distillate-look" -> e.text().equals("none") ? "none" : "drops";
      default -> rateWord(e);
    };
  }

  /** Slowing: under half of the fastest rate of the last ten minutes. */
  private String rateWord(Entry e) {
    double now = e.measured().map(q -> q.si()).orElse(0.0);
    double expected = scene.number("drip-rate").map(x -> x.low() / 60).orElse(0.0);
    double fastest = scene.run().saw("drip-rate").stream().filter(x -> !x.at().isBefore(e.at().minus(Duration.ofMinutes(10))))
        .flatMap(x -> x.measured().stream()).mapToDouble(q -> q.si()).max().orElse(now);
    fastest = Math.max(fastest, expected);
    return now <= 0 ? "none" : now < fastest / 2 ? "slowing" : "drops";
  }

  private void path(PathFinding graph, Flow flow) {
    Optional<Entry> last = pathLook.entry();
    if (!scene.live() && !scene.time().uncleared() && last.isEmpty()) {
      beforeHeat(graph);
    } else if (pathLook.word().filter("closed"::equals).isPresent()) {
      out.seen("path", "", "closed", scene.told(last.get()), last.get().at(), "path");
    } else if (pressed().isPresent()) {
      out.seen("path", "", "closed", scene.told(pressed().get()) + ": no way out that is wide enough", pressed().get().at(), "path");
    } else if (solid().isPresent() && flow.value().equals("none")) {
      out.seen("path", "", "closed", scene.told(solid().get()) + ", and nothing comes over: counts as plugged", closedSince(), "path");
    } else if (graph.path() == PathFinding.State.CLOSED && !(pathLook.fresh() && last.isPresent() && plugless())) {
      out.seen("path", "", "closed", closures(graph), closedSince(), "path");
    } else if (pathLook.fresh() && (last.isPresent() || graph.path() == PathFinding.State.OPEN)) {
      out.seen("path", "", "open", last.map(scene::told).orElse("path open by the rig file: " + String.join(", ", graph.openExits())), null, "path");
    } else {
      unseen(flow, last.map(scene::told).orElse("nobody has looked along the path since heat came on"));
    }
  }

  /** Something that can close the bore has been seen: a dry flask is then no proof that the bore is free. */
  private boolean plugSeen() {
    return solid().isPresent() || scene.run().sawValue("foam", "at-head", "over") || scene.run().sawValue("plant-in-head", "yes", Looks.NOT_SURE);
  }

  /** A gauge above what an open rig shows, or a joint on the move, says more than a look along the glass. */
  private Optional<Entry> pressed() {
    Optional<Entry> gauge = scene.run().lastSaw("pressure").filter(e -> e.measured().filter(q -> q.si() >= 1000 * scene.limit("gauge-open-max")).isPresent());
    return gauge.or(() -> scene.run().lastSaw("joint-creeping").filter(e -> e.text().equals("yes")));
  }

  /** Solid that was the last thing seen in the condenser. */
  private Optional<Entry> solid() {
    return scene.run().lastSaw("condenser-solids").filter(e -> Set.of("film", "growing", "blocking").contains(e.text()));
  }

  private void unseen(Flow flow, String old) {
    boolean flows = FLOWS.contains(flow.value());
    if (flow.value().equals("none-expected") && (!scene.time().vapour(scene.at()) || boiledDry()) && pathLook.word().isPresent()) {
      out.possible("path", "", List.of("open", "not-proven"), old + ", past its time; no vapour is being made", List.of("path"));
      return;
    }
    boolean overdue = pathLook.age() == Looks.Age.OVERDUE;
    if (flows || !overdue && !flow.value().equals("none") && !flow.value().equals("slowing")) {
      out.counted("path", "not-proven", old + ", past its time; " + (flows ? "something still comes over" : "no sign against it") + ": counts as not proven", "path");
    } else if (!scene.live() && !scene.time().uncleared()) {
      out.possible("path", old, "path");
    } else {
      out.counted("path", "closed", old + ", and " + (flow.known() ? "nothing comes over" : "nobody sees whether anything comes over") + ": counts as closed", "path");
    }
  }

  private void beforeHeat(PathFinding graph) {
    switch (graph.path()) {
      case OPEN -> out.seen("path", "open", "open to the air at " + String.join(", ", graph.openExits()));
      case CLOSED -> out.seen("path", "closed", closures(graph));
      default -> out.possible("path", "", List.of("open", "closed"), "the way to the air is not described", graph.unknowns().isEmpty() ? List.of("path") : graph.unknowns());
    }
  }

  /** A fresh look from end to end outranks what the rig file said about a stopper, never a plug seen in the condenser since. */
  private boolean plugless() {
    Instant since = pathLook.entry().get().at().minusSeconds(60);
    boolean covered = vented() && scene.run().lastSaw("receiver-level").filter(e -> !e.at().isBefore(since)).isPresent();
    return !covered && Stream.of("condenser-solids", "foam", "plant-in-head").flatMap(id -> scene.run().lastSaw(id).stream())
        .noneMatch(e -> Set.of("blocking", "at-head", "over", "yes").contains(e.text()) && !e.at().isBefore(since));
  }

  private Instant closedSince() {
    return Stream.of("condenser-solids", "foam", "plant-in-head", "receiver-level", "tip").flatMap(id -> scene.run().lastSaw(id).stream())
        .map(Entry::at).max(Instant::compareTo).orElse(null);
  }

  private static String closures(PathFinding graph) {
    return "no way out: " + String.join("; ", graph.closures().stream().filter(PathFinding.Closure::nearest).map(Object::toString).toList());
  }

  private PathState seenState() {
    PathState s = PathState.beforeHeat();
    s = said(s, PathState.Look.CONDENSER_SOLIDS, "condenser-solids");
    s = said(s, PathState.Look.FOAM, "foam");
    s = said(s, PathState.Look.PLANT_IN_HEAD, "plant-in-head");
    s = said(s, PathState.Look.TIP, "tip");
    s = said(s, PathState.Look.STOPCOCK, "stopcock");
    s = said(s, PathState.Look.STOPPER, "stopper");
    s = said(s, PathState.Look.RESERVOIR_LEVEL, "reservoir-level");
    if (vented()) {
      s = s.saw(PathState.Look.RECEIVER_VENT, "under-liquid");
    }
    for (Entry e : scene.run().saw("joint-apart")) {
      s = e.text().equals("yes") ? s.sawApart(e.part()) : s;
    }
    for (String id : List.of("hiss", "vapour-from-joint")) {
      for (Entry e : scene.run().lastSaw(id).filter(x -> x.text().equals("yes")).stream().toList()) {
        s = s.sawLeak(e.part());
      }
    }
    return s;
  }

  /** A receiver's own vent is covered once its liquid stands at it. */
  private boolean vented() {
    Optional<Double> at = scene.si(Role.RECEIVER, "vent-at");
    Optional<Entry> level = scene.run().lastSaw("receiver-level");
    return level.isPresent() && at.isPresent() && level.get().measured().filter(q -> q.si() >= at.get()).isPresent();
  }

  private PathState said(PathState s, PathState.Look look, String id) {
    return scene.looks().worstOfLast(id).filter(e -> !e.text().equals(Looks.NOT_SURE)).map(e -> s.saw(look, e.text())).orElse(s);
  }

  private void pressure() {
    Stream<Entry> signs = Stream.of("hiss", "joint-creeping").flatMap(id -> scene.run().lastSaw(id).stream())
        .filter(e -> !Set.of("no", Looks.NOT_SURE).contains(e.text()));
    Stream<Entry> gauge = scene.run().lastSaw("pressure").filter(e -> e.measured().filter(q -> q.si() > 200).isPresent()).stream();
    Optional<Entry> found = Stream.concat(signs, gauge).max(java.util.Comparator.comparing(Entry::at));
    if (found.isPresent()) {
      out.seen("pressure-evident", "", "yes", scene.told(found.get()), found.get().at(), "hiss");
    } else {
      out.seen("pressure-evident", "no", "nobody has seen pressure");
    }
    gone(found.isPresent());
  }

  /** A clock time, since quiet boiling and a cool head both lie in a closed flask; and nothing hisses or creeps. */
  private void gone(boolean evident) {
    Optional<Instant> cut = scene.time().cut();
    Duration wait = scene.limitTime("pressure-wait-min");
    Duration still = scene.limitTime("quiet-time-min");
    boolean lately = Stream.of("hiss", "joint-creeping").flatMap(id -> scene.run().saw(id).stream())
        .anyMatch(e -> e.text().equals("yes") && scene.run().age(e).compareTo(still) < 0);
    boolean waited = !lately && cut.filter(c -> !c.plus(wait).isAfter(scene.at())).isPresent();
    boolean cool = scene.run().lastSaw("flask-temperature").flatMap(Entry::measured)
        .flatMap(q -> scene.number("water-boiling-point-here").map(bp -> q.si() - 273.15 <= bp.low() - scene.limit("quiet-below-boiling-min"))).orElse(true);
    if (waited && cool && !evident) {
      out.seen("pressure-gone", "yes", "energy cut " + scene.clock(cut.get()) + ", the wait of " + wait.toMinutes() + " min is over and nothing hisses");
    } else {
      out.seen("pressure-gone", "no", evident ? "pressure shows" : "the computed wait is not over", cut.orElse(null));
    }
  }

  private void openings(PathFinding graph) {
    boolean pathOpen = out.all().stream().anyMatch(s -> s.about().equals("path") && s.value().equals("open") && s.isSeen());
    out.seenIf(!pathOpen && (graph.lastOpening() || !graph.countKnown()), "last-opening",
        "openings that vent: " + (graph.vents().isEmpty() ? "none" : String.join(", ", graph.vents().stream().map(Object::toString).toList())));
    boolean backflow = scene.run().lastSaw("reservoir-backflow").filter(e -> !e.text().equals("none")).isPresent();
    boolean relief = !pathOpen && (backflow || graph.relief() == PathFinding.Relief.FREE || graph.relief() == PathFinding.Relief.THROUGH_LIQUID);
    out.seenIf(relief, "reservoir-is-relief", relief ? "the reservoir may be the last way out" : "the reservoir is not needed as a way out");
    out.seen("inlet-upstream", graph.inletUpstreamOfTip() ? "yes" : "no", graph.inletUpstreamOfTip() ? "air gets in upstream of the tip" : "no opening upstream of the tip");
    if (graph.feedArm().isPresent()) {
      out.seen("feed-arm", graph.feedArm().get(), "the reservoir sits on the " + graph.feedArm().get() + " arm");
    } else if (!scene.roles().absent().contains(Role.RESERVOIR) && !scene.roles().absent().contains(Role.CLAISEN)) {
      out.possible("feed-arm", "no joint says which arm carries the reservoir", "joints");
    }
  }

  Looks.Look pathLook() {
    return pathLook;
  }

  Looks.Look dripLook() {
    return dripLook;
  }
}
