package stillwarden.show;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.derive.Estimate;
import stillwarden.order.Advice;
import stillwarden.order.Wording;

/**
 * The answer for a tired person one or two metres away: the verdict and the first deed on the first line, at most three
 * deeds in the first view, then the rest, then what not to do, what to look at, why, and the numbers.
 */
public final class TextView {
  /** Deeds in the first view; more cannot be kept in mind on the way to the rig. */
  private static final int FIRST_VIEW = 3;

  private static final Map<String, String> VERDICTS = Map.of(
      "not-yet", "NOT YET", "adjust", "ADJUST", "wind-down", "WIND DOWN", "stop", "STOP", "carry-on", "CARRY ON");

  private final Advice advice;
  private final Page page = new Page();

  private TextView(Advice advice) {
    this.advice = advice;
  }

  public static String of(Advice advice) {
    return new TextView(advice).write();
  }

  private String write() {
    page.line(headline()).line(subline());
    List<Advice.Action> all = advice.actions();
    int first = Math.min(FIRST_VIEW, all.size());
    page.section("Do", all.subList(0, first), this::action);
    page.section("Then", all.subList(first, all.size()), this::action);
    if (advice.more() > 0) {
      page.line("   " + advice.more() + " more after these.");
    }
    page.section("Do not", advice.doNot(), this::ban);
    page.section("Look at", advice.ask(), this::question);
    page.section("To start", advice.toStart(), t -> page.item("  - ", t.about() + " to " + t.to() + ": " + t.why()));
    why();
    page.section("Numbers", advice.numbers(), this::number);
    page.section("Worth knowing", advice.notes(), this::bullet);
    page.section("Left out", advice.leftOut(), this::bullet);
    page.section("Waivers in force", advice.waivers(), this::bullet);
    sources();
    page.line("").item("", advice.defersTo());
    return page.text();
  }

  private String headline() {
    if (advice.verdict().equals("start")) {
      return "nothing found against starting: " + advice.lookedAt() + " of " + advice.gateItems() + " looked at";
    }
    String verdict = VERDICTS.getOrDefault(advice.verdict(), advice.verdict());
    return verdict + ": " + firstThing();
  }

  private String firstThing() {
    // in set-up the verdict itself says "not yet": what comes first is the first thing that would change it
    List<Advice.Action> due = advice.actions().stream().filter(this::changesIt).toList();
    Optional<Advice.Action> first = advice.verdict().equals("not-yet") ? gravest(due) : due.stream().findFirst();
    if (first.isPresent() && first.get().state().equals("confirm")) {
      return "look whether it is done: " + first.get().doneWhen() + ".";
    }
    if (first.isPresent()) {
      return conditional(first.get());
    }
    if (!advice.ask().isEmpty()) {
      return advice.ask().get(0).say();
    }
    return advice.leftOut().isEmpty() ? "nothing is due." : "look again and log it: a line of the log could not be used.";
  }

  private static Optional<Advice.Action> gravest(List<Advice.Action> due) {
    return List.of("DANGER", "WARNING", "CAUTION").stream().flatMap(word -> due.stream().filter(a -> a.signal().equals(word))).findFirst();
  }

  private boolean changesIt(Advice.Action a) {
    return !a.act().equals("do-not-start") && !(advice.verdict().equals("not-yet") && a.signal().equals("NOTICE"));
  }

  private String subline() {
    String at = advice.at().isEmpty() ? "" : ", as of " + Times.clock(advice.at());
    return advice.rig() + ", " + advice.stage().replace('-', ' ') + at;
  }

  private void action(Advice.Action a) {
    String by = a.within().map(w -> " [" + Times.by(advice.at(), w) + "]").orElse("");
    page.item(String.format("%2d %-8s ", a.order(), a.signal()), conditional(a) + by);
    String indent = " ".repeat(12);
    a.cautions().forEach(c -> page.item(indent + "Caution: ", c));
    if (a.state().equals("confirm")) {
      page.item(indent, "Logged as done. Look whether it is: " + a.doneWhen() + ".");
    } else if (!a.doneWhen().isEmpty()) {
      page.item(indent, "Done when: " + a.doneWhen() + ".");
    }
  }

  private static String conditional(Advice.Action a) {
    return a.iff().map(sign -> "If " + sign + ": " + a.say()).orElse(a.say());
  }

  private void ban(Advice.Ban b) {
    page.item("  - ", b.until().isEmpty() ? b.say() : b.say() + " Not before: " + Wording.english().until(b.until()) + ".");
  }

  private void question(Advice.Question q) {
    page.item("  - ", q.say() + q.within().map(w -> " [" + Times.by(advice.at(), w) + "]").orElse(""));
  }

  /** Each rule once, with the deeds and bans that rest on it. */
  private void why() {
    Map<Advice.Because, String> reasons = new LinkedHashMap<>();
    advice.actions().forEach(a -> a.because().forEach(b -> reasons.merge(b, "" + a.order(), (x, y) -> x + ", " + y)));
    page.section("Why", List.copyOf(reasons.entrySet()), r -> reason(r.getKey(), r.getValue()));
    List<Advice.Ban> explained = advice.doNot().stream().filter(b -> !b.because().isEmpty()).toList();
    page.section("Why not", explained, b -> page.item("  - ", bare(b.say()) + ": " + String.join("; ", b.because())));
  }

  private static String bare(String sentence) {
    return sentence.endsWith(".") ? sentence.substring(0, sentence.length() - 1) : sentence;
  }

  private void reason(Advice.Because b, String orders) {
    page.item("  - ", "(" + orders + ") " + b.rule() + " [" + b.hazard() + "]");
    b.facts().forEach(f -> page.item("      ", f));
    page.item("      ", "source: " + b.source().replaceAll(" \\([^)]*\\)", ""));
  }

  private void sources() {
    SourceList sources = new SourceList();
    advice.actions().forEach(a -> a.because().forEach(b -> sources.add(b.source())));
    advice.numbers().forEach(e -> sources.add(e.source()));
    sources.write(page);
  }

  private void number(Estimate e) {
    page.item("  - ", Figures.name(e) + ": " + Figures.read(e));
  }

  private void bullet(String text) {
    page.item("  - ", text);
  }
}
