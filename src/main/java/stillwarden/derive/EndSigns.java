package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.format.DateTimeParseException;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Entry;

/** The criteria by which a run can be over, and the ones that never are by themselves. */
final class EndSigns {
  private static final Duration HOLD = Duration.ofMinutes(10);

  private final Scene scene;
  private final SignSet out;

  EndSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    Timeline t = scene.time();
    boolean target = scene.numbers().targetReached();
    out.seenIf(target, "target-reached", target ? "collected volume at the target" : "target not reached, or not known");
    boolean clear = clear();
    boolean head = headAtWater();
    out.seenIf(clear, "distillate-clear", clear ? "three clear looks in a row, tip clear, bore clean" : "not three clear looks in a row with tip clear and bore clean");
    oilStopped();
    boolean time = over("target.time");
    out.seenIf(time, "time-over", time ? "the planned time is over" : "the planned time is not over, or none is set");
    boolean period = scene.rig().word("target.until").flatMap(EndSigns::instant).filter(u -> !u.isAfter(scene.at())).isPresent() && t.heatOn().isPresent();
    out.seenIf(period, "period-over", period ? "the supervised period is over" : "the supervised period is not over, or none is set");
    out.seen("end-decided", "", t.endRun().isPresent() ? "yes" : "no", t.endRun().map(e -> "end of run logged " + scene.clock(e)).orElse("no end of run logged"), t.endRun().orElse(null), "flask-level");
    overdue(t, clear, head);
  }

  private static Optional<Instant> instant(String text) {
    try {
      return Optional.of(OffsetDateTime.parse(text).toInstant());
    } catch (DateTimeParseException e) {
      return Optional.empty();
    }
  }

  private boolean over(String path) {
    return scene.rig().si(path).isPresent() && scene.time().heatOn().filter(on -> !on.plusMillis(Math.round(scene.rig().si(path).get() * 1000)).isAfter(scene.at())).isPresent();
  }

  private boolean clear() {
    List<Entry> looks = scene.run().saw("distillate-look");
    int n = looks.size();
    boolean three = n >= 3 && looks.subList(n - 3, n).stream().allMatch(e -> e.text().equals("clear"));
    boolean bore = scene.run().lastSaw("condenser-solids").filter(e -> e.text().equals("none")).isPresent();
    boolean tip = out.all().stream().anyMatch(s -> s.about().equals("tip") && s.value().equals("clear") && s.isSeen());
    return three && bore && tip && !scene.numbers().leakSuspected();
  }

  private boolean headAtWater() {
    Optional<Estimate> shift = scene.number("co-boiling-shift");
    Optional<Estimate> water = scene.number("water-boiling-point-here");
    double error = scene.si(Role.THERMOMETER, "error").orElse(scene.limit("thermometer-error"));
    boolean baro = scene.run().lastSaw("barometer").isPresent() || scene.rig().datum("place.barometer").isPresent();
    if (shift.isEmpty() || water.isEmpty() || !baro || shift.get().nominal() <= 2 * error) {
      out.seen("head-at-water", "", "not-informative", !baro ? "no barometer reading: the head cannot show the end" : "the oil moves the boiling point by no more than twice the thermometer's error: the head cannot show the end for this oil", null, "barometer");
      return false;
    }
    boolean held = held(water.get(), error);
    out.seen("head-at-water", held ? "yes" : "no", held ? "head at water's boiling point here for 10 min" : "head below water's boiling point here");
    return held;
  }

  private boolean held(Estimate water, double error) {
    List<Entry> all = scene.run().saw("head-temperature");
    Instant since = null;
    for (int i = all.size() - 1; i >= 0; i--) {
      double c = all.get(i).measured().map(q -> q.si() - 273.15).orElse(Double.NEGATIVE_INFINITY);
      if (Math.abs(c - water.nominal()) > error) {
        break;
      }
      since = all.get(i).at();
    }
    return since != null && !since.plus(HOLD).isAfter(all.get(all.size() - 1).at());
  }

  private void oilStopped() {
    List<Entry> oil = scene.run().saw("oil-volume").stream().filter(e -> e.measured().isPresent()).toList();
    int n = oil.size();
    boolean same = n >= 3 && oil.get(n - 1).measured().get().si() - oil.get(n - 3).measured().get().si() < 0.1e-6
        && Duration.between(oil.get(n - 3).at(), oil.get(n - 1).at()).compareTo(Duration.ofMinutes(20)) >= 0;
    out.seenIf(same, "oil-stopped-rising", same ? "oil unchanged over three readings" : "no three readings of unchanged oil");
  }

  private void overdue(Timeline t, boolean clear, boolean head) {
    boolean on = t.heatOn().isPresent() && t.cut().filter(c -> t.endRun().filter(c::equals).isEmpty()).isEmpty();
    boolean decided = t.endRun().filter(e -> !e.plus(HOLD).isAfter(scene.at())).isPresent();
    boolean exceeded = scene.numbers().targetExceeded();
    boolean overdue = on && (decided || exceeded);
    out.seen("end-overdue", "", overdue ? "yes" : "no", overdue ? (exceeded ? "the target is exceeded" : "the end was decided over 10 min ago") + " and heat is on" : "no end is overdue", null, "receiver-level");
  }
}
