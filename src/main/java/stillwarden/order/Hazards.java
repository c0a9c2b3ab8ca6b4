package stillwarden.order;

import java.time.Duration;
import java.util.HashSet;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;
import stillwarden.judge.Finding;

/** What the hazard pages say about each hazard: signal word, urgency, sources, what would put it right. */
final class Hazards {
  private static final Map<String, Page> PAGES = new ConcurrentHashMap<>();

  private Hazards() {}

  /**
   * @param principle true for a rule that modifies others
   * @param end true for end criteria and the shutdown order: they ask for an energy cut, but are no alarm
   * @param warnFirst fire, shock, hammer, spill: the warning comes before everything
   * @param timeToHarm the number that tells how long there is, or empty
   */
  record Page(
      String id,
      Signal signal,
      String urgency,
      boolean principle,
      boolean end,
      boolean warnFirst,
      Duration clearsWithin,
      String timeToHarm,
      Map<String, Tree> toStart) {}

  static Page of(String id) {
    return PAGES.computeIfAbsent(id, Hazards::read);
  }

  /** Every sign that a set-up rule looks at. */
  static Set<String> gateSigns() {
    return Gate.SIGNS;
  }

  /** Read when first asked for. */
  private static final class Gate {
    static final Set<String> SIGNS = read();

    private static Set<String> read() {
      Set<String> named = new HashSet<>();
      Knowledge.section("hazards").fields().forEach((id, t) -> {
        if (t.text("urgency").filter("before-start"::equals).isPresent()) {
          t.get("rules").items().forEach(r -> named.addAll(r.words("signs")));
        }
      });
      return Set.copyOf(named);
    }
  }

  static boolean known(String id) {
    return Knowledge.section("hazards").has(id);
  }

  private static Page read(String id) {
    Tree t = Knowledge.section("hazards").get(id);
    String family = t.text("family").orElse("");
    return new Page(
        id,
        t.text("signal").map(Signal::of).orElse(Signal.NOTICE),
        t.text("urgency").orElse("minutes"),
        family.equals("principles"),
        t.text("end").filter("yes"::equals).isPresent(),
        t.text("warn-first").filter("yes"::equals).isPresent(),
        t.text("clears-within").map(Duration::parse).orElse(Duration.ofMinutes(5)),
        t.text("time-to-harm").orElse(""),
        t.get("to-start").fields());
  }

  /** The hazard whose page speaks for a finding: its own, or for a principle the one it modifies. */
  static Page speaking(Finding f) {
    return of(f.under().isEmpty() ? f.hazard() : f.under());
  }

  static Signal signal(Finding f) {
    return Optional.of(f.signal()).filter(s -> !s.isEmpty()).map(Signal::of).orElseGet(() -> speaking(f).signal());
  }

  static String urgency(Finding f) {
    return f.urgency().isEmpty() ? speaking(f).urgency() : f.urgency();
  }

  /** DANGER, or WARNING with urgency {@code seconds}. */
  static boolean stopClass(Finding f) {
    return signal(f) == Signal.DANGER || signal(f) == Signal.WARNING && urgency(f).equals("seconds");
  }
}
