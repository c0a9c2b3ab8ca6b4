package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Stream;
import stillwarden.describe.Entry;

/**
 * Where a run stands, read off its log: when heat came on, when vapour began, when energy was cut and why, when boiling
 * stopped.
 *
 * @param stage {@code setting-up, heating, running, stopping, cooling, work-up, closed}
 * @param heatOn when heat was logged or showed itself, last time
 * @param boilStart when vapour began, seen or at the low end of the computed heat-up time
 * @param firstDrop when distillate first came
 * @param cut when energy went, after {@code heatOn}: cut, lost or ended
 * @param boilEnd when boiling was seen or computed to have stopped after {@code cut}
 * @param endRun when the run was decided to be over
 * @param uncleared energy was cut other than by a decided end, and the restart gate is not complete
 */
public record Timeline(
    String stage,
    Optional<Instant> heatOn,
    Optional<Instant> boilStart,
    Optional<Instant> firstDrop,
    Optional<Instant> cut,
    Optional<Instant> boilEnd,
    Optional<Instant> endRun,
    boolean uncleared) {

  private static final String[] CUTS = {"cut-power", "isolate-remote", "isolate-auto", "close-gas", "keep-heat-off"};
  private static final List<String> GATE = List.of("cause-removed", "inspected-cold", "restart-agreed");
  private static final Set<String> DRIPS = Set.of("drops", "stream", "slugs");
  private static final Set<String> BOILS = Set.of("gentle", "steady", "violent");
  private static final double WARM_KELVIN = 318.15;
  private static final double HAND_WARM_KELVIN = 323.15;

  /**
   * @param heatUpLow low end of the computed heat-up time, or null when it cannot be had
   * @param residualBoil how long boiling may go on unseen after energy is cut
   * @param cooling how long a flask stays above hand-warm after boiling stopped
   */
  static Timeline of(RunState run, Duration heatUpLow, Duration residualBoil, Duration cooling) {
    Optional<Instant> heatOn = heatOn(run);
    if (heatOn.isEmpty()) {
      return new Timeline(run.didSince(Instant.MIN, "close-run") ? "closed" : "setting-up", heatOn, Optional.empty(), Optional.empty(),
          Optional.empty(), Optional.empty(), endRun(run, Instant.MIN), false);
    }
    Instant on = heatOn.get();
    Optional<Instant> drop = first(run, on, Timeline::dripping);
    Optional<Instant> boil = boilStart(run, on, drop, heatUpLow);
    Optional<Instant> end = endRun(run, on);
    Optional<Instant> cut = cut(run, on, end);
    Optional<Instant> boilEnd = cut.flatMap(c -> boilEnd(run, c, residualBoil));
    boolean uncleared = uncleared(run);
    return new Timeline(stage(run, drop, cut, boilEnd, cooling), heatOn, boil, drop, cut, boilEnd, end, uncleared);
  }

  public boolean live() {
    return stage.equals("heating") || stage.equals("running") || stage.equals("stopping");
  }

  /** Vapour is being made, or may be. */
  public boolean vapour(Instant at) {
    return live() && boilStart.filter(b -> !b.isAfter(at)).isPresent();
  }

  private static Optional<Instant> heatOn(RunState run) {
    Optional<Instant> logged = run.lastDid("heat-on").map(Entry::at);
    return logged.or(() -> run.entries().stream().filter(Timeline::showsHeat).map(Entry::at).findFirst());
  }

  /** Heat that nobody logged shows itself. */
  private static boolean showsHeat(Entry e) {
    return switch (e.id()) {
      case "boiling" -> BOILS.contains(e.text());
      case "first-drop", "drip" -> dripping(e);
      case "heater-power", "heat-setting", "set-heat" -> e.measured().filter(q -> q.si() > 0).isPresent();
      case "head-temperature", "flask-temperature" -> e.measured().filter(q -> q.si() > WARM_KELVIN).isPresent();
      default -> false;
    };
  }

  private static boolean dripping(Entry e) {
    return e.id().equals("first-drop") && e.text().equals("yes") || e.id().equals("drip") && DRIPS.contains(e.text())
        || e.id().equals("drip-rate") && e.measured().filter(q -> q.si() > 0).isPresent();
  }

  private static Optional<Instant> first(RunState run, Instant from, Predicate<Entry> what) {
    return run.entries().stream().filter(e -> !e.at().isBefore(from)).filter(what).map(Entry::at).findFirst();
  }

  private static Optional<Instant> boilStart(RunState run, Instant on, Optional<Instant> drop, Duration heatUpLow) {
    Optional<Instant> seen = first(run, on, e -> e.id().equals("boiling") && BOILS.contains(e.text()));
    Optional<Instant> computed = heatUpLow == null ? Optional.of(on) : Optional.of(on.plus(heatUpLow)).filter(t -> !t.isAfter(run.at()));
    return Stream.of(seen, drop, computed).flatMap(Optional::stream).min(Instant::compareTo);
  }

  private static Optional<Instant> endRun(RunState run, Instant from) {
    return run.lastDid("end-run").map(Entry::at).filter(t -> !t.isBefore(from));
  }

  private static Optional<Instant> cut(RunState run, Instant on, Optional<Instant> end) {
    Optional<Instant> done = Stream.of(CUTS).flatMap(id -> run.did(id).stream()).map(Entry::at).filter(t -> !t.isBefore(on)).min(Instant::compareTo);
    Optional<Instant> lost = first(run, on, e -> e.id().equals("power") && e.text().equals("lost"));
    return Stream.of(done, lost, end).flatMap(Optional::stream).min(Instant::compareTo);
  }

  private static Optional<Instant> boilEnd(RunState run, Instant cut, Duration residualBoil) {
    Optional<Instant> seen = first(run, cut, e -> e.id().equals("boiling") && e.text().equals("none"));
    return seen.or(() -> Optional.of(cut.plus(residualBoil)).filter(t -> !t.isAfter(run.at())));
  }

  /** Every cut that was no decided end needs the three steps of the gate after it; heat put on again does not stand for them. */
  private static boolean uncleared(RunState run) {
    Optional<Entry> lastCut = run.lastDid(CUTS);
    Optional<Entry> lost = run.saw("power").stream().filter(e -> e.text().equals("lost")).reduce((a, b) -> b);
    Optional<Instant> cut = Stream.of(lastCut, lost).flatMap(Optional::stream).map(Entry::at).max(Instant::compareTo);
    if (cut.isEmpty() || run.didSince(cut.get().minus(Duration.ofMinutes(30)), "end-run")) {
      return false;
    }
    return !GATE.stream().allMatch(deed -> run.didSince(cut.get(), deed));
  }

  private static String stage(RunState run, Optional<Instant> drop, Optional<Instant> cut, Optional<Instant> boilEnd, Duration cooling) {
    if (cut.isEmpty()) {
      return drop.isPresent() ? "running" : "heating";
    }
    if (run.didSince(cut.get(), "close-run")) {
      return "closed";
    }
    if (boilEnd.isEmpty()) {
      return "stopping";
    }
    boolean cool = run.didSince(cut.get(), "start-work-up") || cool(run, boilEnd.get())
        || !readHot(run, boilEnd.get()) && !boilEnd.get().plus(cooling).isAfter(run.at());
    return cool ? "work-up" : "cooling";
  }

  private static boolean cool(RunState run, Instant from) {
    return first(run, from, e -> flask(e) && (e.id().equals("part-feels") && !e.text().equals("hot")
        || e.measured().filter(q -> q.si() <= HAND_WARM_KELVIN).isPresent())).isPresent();
  }

  /** The last reading of the flask says hot: it outranks the computed time. */
  private static boolean readHot(RunState run, Instant from) {
    return run.entries().stream().filter(e -> !e.at().isBefore(from) && flask(e)).reduce((a, b) -> b)
        .filter(e -> e.text().equals("hot") || e.measured().filter(q -> q.si() > HAND_WARM_KELVIN).isPresent()).isPresent();
  }

  private static boolean flask(Entry e) {
    return e.id().equals("flask-temperature") || e.id().equals("flask-wall-temperature")
        || (e.id().equals("part-temperature") || e.id().equals("part-feels")) && e.part().contains("flask");
  }
}
