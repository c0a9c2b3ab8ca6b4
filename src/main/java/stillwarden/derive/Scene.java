package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Datum;
import stillwarden.describe.Entry;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Part;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.Tree;


/** Everything that the sign makers look at, gathered once for one moment. */
record Scene(Ground ground, RunState run, Figures numbers, Timeline time, Looks looks) {
  private static final DateTimeFormatter CLOCK = DateTimeFormatter.ofPattern("HH:mm:ss");

  Rig rig() {
    return ground.rig();
  }

  Policy policy() {
    return ground.policy();
  }

  Roles roles() {
    return ground.roles();
  }

  boolean live() {
    return time.live();
  }

  Instant at() {
    return run.at();
  }

  /** A part's key by role: {@code flask.cracks} of the one flask there is. */
  Optional<Datum> key(Role role, String key) {
    return roles().one(role).flatMap(p -> Optional.ofNullable(p.keys().get(key)));
  }

  Optional<String> word(Role role, String key) {
    return key(role, key).map(Datum::text);
  }

  Optional<Double> si(Role role, String key) {
    return roles().one(role).flatMap(p -> p.si(key));
  }

  boolean is(Role role, String key, String value) {
    return word(role, key).filter(value::equals).isPresent();
  }

  boolean says(String path, String value) {
    return rig().word(path).filter(value::equals).isPresent();
  }

  /** The user's name of a role's part, or the name that a question uses while there is none. */
  String name(Role role) {
    return roles().one(role).map(Part::name).orElseGet(() -> RigSigns.usualName(role));
  }

  /** The plant list's entry for the charge. */
  Tree plant() {
    return rig().word("charge.plant").map(p -> Knowledge.section("plants").get(p)).orElse(Tree.EMPTY);
  }

  double limit(String id) {
    return Limits.of(policy(), id);
  }

  Duration limitTime(String id) {
    return Duration.ofMillis(Math.round(limit(id) * 1000));
  }

  /** A computed number where there is one. */
  Optional<Estimate> number(String name) {
    return numbers.get(name).filter(Estimate::known);
  }

  /** Low end of a computed time. */
  Optional<Duration> low(String name) {
    return number(name).map(e -> minutes(e.low(), e.unit()));
  }

  Optional<Duration> high(String name) {
    return number(name).map(e -> minutes(e.high(), e.unit()));
  }

  private static Duration minutes(double value, String unit) {
    double seconds = switch (unit) {
      case "min" -> value * 60;
      case "h" -> value * 3600;
      default -> value;
    };
    return Duration.ofMillis(Math.round(Math.min(seconds, 1e7) * 1000));
  }

  String clock(Instant t) {
    return CLOCK.format(t.atOffset(run.offset()));
  }

  ZoneOffset offset() {
    return run.offset();
  }

  /** {@code flask level low, seen 10:52:00 by nk}. */
  String told(Entry e) {
    String what = e.id().replace('-', ' ') + (e.part().isEmpty() ? "" : " (" + e.part() + ")");
    String value = e.text().equals("yes") && e.measured().isEmpty() ? "" : " " + e.text();
    String how = e.verb() == Entry.Verb.DID ? "done" : e.instrument() ? "read" : "seen";
    return what + value + ", " + how + " " + clock(e.at()) + " by " + e.who();
  }

  /** {@code flask.cracks no, by the rig file (nk)}. */
  String stated(Datum d) {
    return d.path() + " " + d.text() + ", by the rig file" + rig().word("seen.by").map(w -> " (" + w + ")").orElse("");
  }

  Map<String, Estimate> allNumbers() {
    return numbers.all();
  }
}
