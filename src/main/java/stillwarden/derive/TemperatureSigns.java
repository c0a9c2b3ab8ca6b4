package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Entry;

/** Head temperature against what it should be here, and readings against each other. */
final class TemperatureSigns {
  private static final double FALL_KELVIN = 5;
  private static final Duration FALL_WITHIN = Duration.ofMinutes(2);

  private final Scene scene;
  private final SignSet out;
  private final List<Entry> head;

  TemperatureSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
    this.head = scene.run().saw("head-temperature").stream().filter(e -> e.measured().isPresent()).toList();
  }

  void make() {
    high();
    fell();
    disagree();
    warmUp();
  }

  private double error() {
    return scene.si(Role.THERMOMETER, "error").orElse(scene.limit("thermometer-error"));
  }

  /** Never against a fixed temperature: against the high end of water's boiling point here plus the thermometer's error. */
  private void high() {
    if (head.isEmpty()) {
      return;
    }
    double top = scene.number("water-boiling-point-here").map(Estimate::high).orElseGet(this::anywhere) + error();
    Entry last = head.get(head.size() - 1);
    if (celsius(last) <= top) {
      out.seen("head-high", "no", scene.told(last) + ", limit here " + round(top) + " °C");
      return;
    }
    Instant since = last.at();
    for (int i = head.size() - 1; i >= 0 && celsius(head.get(i)) > top; i--) {
      since = head.get(i).at();
    }
    boolean held = !last.instrument() || !since.plus(scene.limitTime("head-hold")).isAfter(scene.at());
    out.seen("head-high", "", held ? "yes" : "no", scene.told(last) + ", above " + round(top) + " °C (water's boiling point here and the errors)" + (held ? "" : ", not yet held"), since, "head-temperature");
  }

  /** Nobody knows the pressure here: ordinary high weather explains less than the highest there is, and with the level unseen nothing else does. */
  private double anywhere() {
    boolean levelSeen = out.all().stream().anyMatch(s -> s.about().equals("flask-level") && s.isSeen());
    return scene.limit(levelSeen ? "water-boiling-point-unknown-place" : "water-boiling-point-unknown-place-level-unseen") - 273.15;
  }

  private void fell() {
    if (head.size() < 2 || !scene.time().live() || scene.time().cut().isPresent()) {
      return;
    }
    Entry last = head.get(head.size() - 1);
    Optional<Entry> before = head.stream().filter(e -> e.at().isBefore(last.at()) && !e.at().isBefore(last.at().minus(FALL_WITHIN)))
        .filter(e -> e.who().equals(last.who())).filter(e -> celsius(e) - celsius(last) > FALL_KELVIN).findFirst();
    if (before.isPresent() && scene.run().age(last).compareTo(Duration.ofMinutes(4)) <= 0) {
      out.seen("head-fell", "", "yes", "head from " + before.get().text() + " to " + last.text() + ", " + scene.told(last), last.at(), "head-temperature");
    } else {
      out.seen("head-fell", "no", scene.told(last));
    }
  }

  /** Two sources of one temperature within two minutes of each other, apart by more than their errors. */
  private void disagree() {
    for (int i = head.size() - 1; i > 0; i--) {
      Entry a = head.get(i);
      Entry b = head.get(i - 1);
      boolean together = Duration.between(b.at(), a.at()).compareTo(FALL_WITHIN) <= 0 && scene.run().age(a).compareTo(FALL_WITHIN.multipliedBy(2)) <= 0;
      if (together && !a.who().equals(b.who()) && Math.abs(celsius(a) - celsius(b)) > 2 * error() + 1) {
        out.seen("readings-disagree", "", "yes", scene.told(b) + " against " + scene.told(a), a.at(), "head-temperature");
        return;
      }
    }
    if (!levelsDisagree()) {
      out.seen("readings-disagree", "no", "no two readings of one thing disagree");
    }
  }

  /** Two sources of one level within two minutes, two words apart or more. */
  private boolean levelsDisagree() {
    for (String id : List.of("flask-level", "reservoir-level", "receiver-level")) {
      List<Entry> all = scene.run().saw(id);
      List<String> words = stillwarden.describe.Vocabulary.get().observation(id).orElseThrow().key().values();
      for (int i = all.size() - 1; i > 0; i--) {
        Entry a = all.get(i);
        Entry b = all.get(i - 1);
        boolean together = Duration.between(b.at(), a.at()).compareTo(FALL_WITHIN) <= 0 && scene.run().age(a).compareTo(FALL_WITHIN.multipliedBy(2)) <= 0;
        boolean words2 = words.contains(a.text()) && words.contains(b.text());
        if (together && !a.who().equals(b.who()) && words2 && Math.abs(words.indexOf(a.text()) - words.indexOf(b.text())) >= 2) {
          out.seen("readings-disagree", "", "yes", scene.told(b) + " against " + scene.told(a), a.at(), id);
          return true;
        }
      }
    }
    return false;
  }

  private void warmUp() {
    Optional<Instant> on = scene.time().heatOn();
    Optional<Duration> high = scene.high("heat-up-time");
    boolean overdue = on.isPresent() && high.isPresent() && scene.time().cut().isEmpty() && scene.time().firstDrop().isEmpty()
        && Duration.between(on.get(), scene.at()).compareTo(high.get().multipliedBy(3).dividedBy(2)) > 0;
    out.seenIf(overdue, "warm-up-overdue", overdue ? "no drop after one and a half times the computed heat-up time" : "heat-up within its time");
  }

  private static double celsius(Entry e) {
    return e.measured().map(q -> q.si() - 273.15).orElseThrow();
  }

  private static double round(double x) {
    return Math.round(x * 10) / 10.0;
  }
}
