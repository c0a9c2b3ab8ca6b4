package stillwarden.show;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import stillwarden.derive.Estimate;
import stillwarden.order.Advice;

/** Answers built by hand, one of each kind. */
public final class Samples {
  private static final String DEFERS = "The site's rules, the safety officer and the emergency services decide.";

  private Samples() {}

  static Advice.Because because(String rule, String hazard, String... facts) {
    return new Advice.Because(rule, hazard, List.of(facts), "common practice");
  }

  static Advice.Action action(int order, String act, String say, String signal, Duration within) {
    return new Advice.Action(order, act, "mantle", say, signal, Optional.ofNullable(within), "due", Optional.empty(),
        List.of(because("the flask runs low and nothing is left to feed", "flask-low-no-reserve",
            "flask level low, seen 10:52:00 by nk", "reservoir empty, seen 10:52:05 by nk")),
        List.of(), "seen done");
  }

  static Advice.Action cutPower() {
    Advice.Action a = action(1, "cut-power", "Switch the heater off at the wall switch left of the hood, not the dial.",
        "WARNING", Duration.ofSeconds(5));
    return new Advice.Action(1, a.act(), a.part(), a.say(), a.signal(), a.within(), a.state(), a.iff(), a.because(),
        List.of("The mantle stays hot after the power is off: it must come away from the flask."), "switch off, seen");
  }

  static List<Estimate> numbers() {
    return List.of(
        Estimate.of("boiling-point-here", 98.49123456, 98.54321987, 98.6, "Cel", "water and oil together", "IAPWS-IF97",
            List.of("pressure from the elevation")),
        Estimate.of("time-to-minimum-level", 540, 720, 1020, "s", "boil-up against level", "energy balance", List.of()),
        Estimate.of("water-available", 0.00061, 0.00061, 0.00061, "m3", "charge and reservoir", "rig file", List.of()),
        Estimate.absent("condenser-capacity", "W", "the jacket length is not stated", List.of("condenser.jacket-length")));
  }

  /** A stop with five deeds, bans with and without an end, a question. */
  public static Advice stop() {
    return new Advice("Bench 4, fennel", "2026-04-14T10:52:05+02:00", "running", "stop",
        List.of(cutPower(),
            action(2, "lower-heat", "Wind the mantle down, away from the flask.", "WARNING", Duration.ofMinutes(1)),
            action(3, "refill-reservoir", "Refill the reservoir with its stopcock shut.", "WARNING", null),
            action(4, "wait-quiet", "Wait, hands off, until boiling has stopped and time is up.", "WARNING", null),
            new Advice.Action(5, "feed-slow", "", "Add water from the reservoir drop by drop.", "CAUTION", Optional.empty(), "confirm",
                Optional.of("boiling has stopped"), List.of(because("water comes last", "flask-low-no-reserve", "flask level low")),
                List.of(), "drops fall singly")),
        2,
        List.of(new Advice.Ban("open-joint", "Do not open a joint to look.", "", List.of("the rig is hot")),
            new Advice.Ban("feed-slow", "Do not add water from the reservoir.", "wait-quiet", List.of("a slug bumps"))),
        List.of(new Advice.Question("vapour-past-condenser", "Is vapour leaving at the tip?", Optional.of(Duration.ofMinutes(2)),
            List.of("vapour-past-condenser"), "take-off")),
        numbers(), List.of(), List.of("line 7: unknown word `flask-levl`; the nearest is `flask-level`"), List.of(), 0, 0,
        List.of("flask-fill-max 60 % until 2026-12-31 (the safety officer)"), DEFERS);
  }

  public static Advice start() {
    return plain("start", "setting-up", "", List.of(), List.of(), List.of(), 41, 41);
  }

  public static Advice notYet() {
    Advice.Action fix = new Advice.Action(1, "fix-setup", "joints[4]", "Clip every joint that gravity does not hold.", "CAUTION",
        Optional.empty(), "due", Optional.empty(),
        List.of(because("a joint that can fall apart has no clip", "joint-unclipped", "joints[4] clipped no, as the rig file states")),
        List.of(), "every joint clipped");
    return plain("not-yet", "setting-up", "2026-04-14T08:50:00Z", List.of(fix),
        List.of(new Advice.Question("place.hood.running", "Does the hood's indicator say that it runs?", Optional.empty(),
            List.of("hood-off-start"), "hood")),
        List.of(new Advice.ToStart("condenser.coolant.supply", "28 Cel", "the oil begins to freeze at 21 °C")), 39, 41);
  }

  public static Advice carryOn() {
    return plain("carry-on", "running", "2026-04-14T09:40:00Z", List.of(), List.of(), List.of(), 0, 0);
  }

  public static List<Advice> all() {
    return List.of(stop(), start(), notYet(), carryOn());
  }

  private static Advice plain(String verdict, String stage, String at, List<Advice.Action> actions, List<Advice.Question> ask,
      List<Advice.ToStart> toStart, int lookedAt, int items) {
    return new Advice("Bench 4, fennel", at, stage, verdict, actions, 0, List.of(), ask, numbers(), toStart, List.of(), List.of(),
        lookedAt, items, List.of(), DEFERS);
  }
}
