package stillwarden.proof;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.SplittableRandom;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.judge.Judge;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.proof.Runs.Line;
import stillwarden.show.JsonView;

/** What must not change when something is changed that does not matter, and what must not calm when less is known. */
class MetamorphicTest {
  private static final long SEED = Long.getLong("proof.seed", 20260512L);
  private static final int RUNS = Integer.getInteger("proof.runs", 150);

  @TempDir
  Path folder;

  /** Kind of problem to its first examples. */
  private final Map<String, List<String>> problems = new LinkedHashMap<>();

  private void problem(String kind, String what) {
    problems.computeIfAbsent(kind, k -> new ArrayList<>()).add(what);
  }

  private void none() {
    List<String> told = new ArrayList<>();
    problems.forEach((k, all) -> told.add(all.size() + " x " + k + "\n    " + String.join("\n    ", all.subList(0, Math.min(3, all.size())))));
    assertThat(told).as("seed %s", SEED).isEmpty();
  }

  /** The drawn part of a log, for a report. */
  private static String tail(List<Line> lines) {
    return lines.subList(Math.min(lines.size(), 67), lines.size()).toString();
  }

  /** M1, and the same bytes twice. */
  @Test
  void linesOfOneMomentMayComeInAnyOrder() throws Exception {
    Rig rig = Runs.good();
    SplittableRandom r = new SplittableRandom(SEED);
    for (int i = 0; i < RUNS; i++) {
      List<Line> lines = Runs.draw(r, true);
      List<Line> other = new ArrayList<>(lines);
      Collections.shuffle(other, new Random(r.nextLong()));
      other.sort(java.util.Comparator.comparing(Line::at));
      String one = JsonView.of(Runs.whole(rig, lines, Runs.last(lines)));
      assertThat(JsonView.of(Runs.whole(rig, lines, Runs.last(lines)))).isEqualTo(one);
      String two = JsonView.of(Runs.whole(rig, other, Runs.last(lines)));
      if (!one.equals(two)) {
        problem("another order, another answer", tail(lines) + " gives " + Runs.ids(Runs.whole(rig, lines, Runs.last(lines))) + "; " + tail(other) + " gives " + Runs.ids(Runs.whole(rig, other, Runs.last(lines)))
            + " first difference at " + difference(one, two));
      }
    }
    none();
  }

  private static String difference(String a, String b) {
    int i = 0;
    while (i < Math.min(a.length(), b.length()) && a.charAt(i) == b.charAt(i)) {
      i++;
    }
    return "`" + a.substring(Math.max(0, i - 60), Math.min(a.length(), i + 60)) + "` against `" + b.substring(Math.max(0, i - 10), Math.min(b.length(), i + 60)) + "`";
  }

  /** M3 in a log: a calm look that nobody is sure of, or that nobody made. */
  @Test
  void lessKnownInTheLogIsNeverCalmer() throws Exception {
    Rig rig = Runs.good();
    SplittableRandom r = new SplittableRandom(SEED + 1);
    for (int i = 0; i < RUNS; i++) {
      List<Line> lines = Runs.draw(r, true);
      Advice before = Runs.whole(rig, lines, Runs.last(lines));
      for (int k = 0; k < lines.size(); k++) {
        Line l = lines.get(k);
        List<String> values = Runs.values(l.id());
        if (k >= lines.size() - 22 && l.verb().equals("saw") && !values.isEmpty() && l.value().equals(values.get(0))) {
          List<Line> doubt = new ArrayList<>(lines);
          doubt.set(k, new Line(l.at(), "saw", l.id(), "not-sure"));
          calmer(before, Runs.whole(rig, doubt, Runs.last(lines)), "not sure of " + l, lines);
        }
      }
    }
    none();
  }

  private void calmer(Advice before, Advice after, String what, List<Line> lines) {
    String kind = what.replaceAll("\\d\\d:\\d\\d:\\d\\d ", "");
    if (Runs.gravest(after) < Runs.gravest(before)) {
      problem("calmer: " + kind, what + " in " + tail(lines) + ": " + told(before) + " becomes " + told(after));
    }
    if (Runs.cuts(before) && !Runs.cuts(after)) {
      problem("no cut any more: " + kind, what + " in " + tail(lines) + ": " + told(before) + " becomes " + told(after));
    }
  }

  private static String told(Advice a) {
    return a.verdict() + a.actions().stream().map(x -> x.act() + "/" + x.signal() + x.because().stream().map(Advice.Because::hazard).distinct().toList()).toList();
  }

  /** "Not sure" after an alarm is no look that clears it; nor is the same thing told of no part. */
  @Test
  void doubtAfterAnAlarmCalmsNothing() throws Exception {
    Rig rig = Runs.good();
    SplittableRandom r = new SplittableRandom(SEED + 7);
    for (int i = 0; i < RUNS; i++) {
      List<Line> lines = Runs.draw(r, false);
      Advice before = Runs.whole(rig, lines, Runs.last(lines));
      for (int k = Math.max(67, 0); k < lines.size(); k++) {
        Line l = lines.get(k);
        if (l.verb().equals("saw") && !Runs.values(l.id()).isEmpty() && !l.value().equals(Runs.values(l.id()).get(0))) {
          List<Line> doubt = new ArrayList<>(lines);
          doubt.add(new Line(Runs.last(lines).plusSeconds(5), "saw", l.id(), "not-sure"));
          calmer(before, Runs.whole(rig, doubt, Runs.last(doubt)), "then not sure of " + l.id() + " " + l.value(), lines);
        }
      }
    }
    none();
  }

  /** M3 in the rig file: a calm fact that nobody has stated. */
  @Test
  void lessKnownInTheRigIsNeverCalmer() throws Exception {
    SplittableRandom r = new SplittableRandom(SEED + 2);
    List<String> text = List.of(java.nio.file.Files.readString(Runs.GOOD).split("(?<=\n)"));
    Pattern fact = Pattern.compile("(?<=[{,] )([a-z-]+): (yes|no|open|off|shut|free|one-motion|fresh-stones|clamp|hood|mixer|water|lower|narrow)(, )?");
    Rig good = Runs.good();
    for (int i = 0; i < RUNS / 3; i++) {
      List<Line> lines = Runs.draw(r, false);
      Advice before = Runs.whole(good, lines, Runs.last(lines));
      int at = r.nextInt(text.size());
      Matcher m = fact.matcher(text.get(at));
      List<int[]> spans = new ArrayList<>();
      while (m.find()) {
        spans.add(new int[] {m.start(), m.end()});
      }
      if (!spans.isEmpty() && !text.get(at).contains("coolant: {")) {
        int[] cut = spans.get(r.nextInt(spans.size()));
        String line = text.get(at).substring(0, cut[0]) + text.get(at).substring(cut[1]);
        String left = line.replace(", }", " }");
        Rig less = Runs.rig(folder, all -> all.replace(text.get(at), left));
        calmer(before, Runs.whole(less, lines, Runs.last(lines)), "without " + text.get(at).strip().split(":")[0] + " " + text.get(at).substring(cut[0], cut[1]), lines);
      }
    }
    none();
  }

  /** M4. */
  @Test
  void unitsSayNothing() throws Exception {
    Rig one = Runs.good();
    Rig two = Runs.rig(folder, MetamorphicTest::inOtherUnits);
    SplittableRandom r = new SplittableRandom(SEED + 3);
    assertThat(plain(Advisor.inspect(two, Policy.NONE, Optional.empty()))).isEqualTo(plain(Advisor.inspect(one, Policy.NONE, Optional.empty())));
    for (int i = 0; i < RUNS; i++) {
      List<Line> lines = Runs.draw(r, true);
      List<Line> other = lines.stream().map(l -> new Line(l.at(), l.verb(), l.id(), inOtherUnits(l.value()))).toList();
      String a = plain(Runs.whole(one, lines, Runs.last(lines)));
      String b = plain(Runs.whole(two, other, Runs.last(lines)));
      if (!a.equals(b)) {
        problem("other units, another answer", tail(lines) + "\n      " + a + "\n      " + b);
      }
    }
    none();
  }

  private static String inOtherUnits(String text) {
    String out = each(text, "Cel", n -> n.multiply(new BigDecimal("1.8")).add(new BigDecimal(32)).stripTrailingZeros().toPlainString() + " °F");
    out = each(out, "mL", n -> n.movePointLeft(3).toPlainString() + " L");
    out = each(out, "kPa", n -> n.movePointRight(1).toPlainString() + " mbar");
    out = each(out, "mm", n -> n.movePointLeft(1).toPlainString() + " cm");
    return each(out, "g", n -> n.movePointLeft(3).toPlainString() + " kg");
  }

  private static String each(String text, String unit, java.util.function.Function<BigDecimal, String> to) {
    return Pattern.compile("(\\d+(?:\\.\\d+)?) " + unit + "(?![A-Za-z/])").matcher(text).replaceAll(m -> to.apply(new BigDecimal(m.group(1))));
  }

  /** Without the texts that quote what was written. */
  private static String plain(Advice a) {
    return a.verdict() + " " + a.stage() + " " + a.actions().stream().map(x -> x.act() + "/" + x.part() + "/" + x.signal() + "/" + x.within() + "/" + x.state()).toList() + " not "
        + a.doNot().stream().map(b -> b.act() + "/" + b.until()).toList() + " ask " + a.ask().stream().map(Advice.Question::about).toList() + " start " + a.toStart().stream().map(Advice.ToStart::about).toList();
  }

  /** M5: what is done is confirmed, and nothing above it changes places. */
  @Test
  void aDoneStepReordersNothingAboveIt() throws Exception {
    Rig rig = Runs.good();
    SplittableRandom r = new SplittableRandom(SEED + 4);
    for (int i = 0; i < RUNS; i++) {
      List<Line> lines = Runs.draw(r, false);
      Advice before = Runs.whole(rig, lines, Runs.last(lines));
      List<Advice.Action> due = before.actions().stream().filter(a -> a.state().equals("due") && a.iff().isEmpty())
          // whoever touches the receiver makes the place of the tip unknown: that is another state
          .filter(a -> !a.act().equals("swap-receiver")).toList();
      if (!due.isEmpty()) {
        Advice.Action done = due.get(r.nextInt(due.size()));
        List<Line> more = new ArrayList<>(lines);
        more.add(new Line(Runs.last(lines), "did", done.act(), ""));
        Advice after = Runs.whole(rig, more, Runs.last(lines));
        List<String> above = Runs.ids(before).subList(0, done.order() - 1);
        List<String> now = Runs.ids(after).stream().filter(above::contains).toList();
        if (!now.equals(above.stream().filter(now::contains).toList())) {
          problem("reordered by " + done.act(), tail(lines) + ": " + Runs.ids(before) + " becomes " + Runs.ids(after));
        }
        if (after.actions().stream().anyMatch(a -> a.act().equals(done.act()) && a.state().equals("due") && a.part().equals(done.part()))) {
          problem("still due: " + done.act(), tail(lines) + ": " + told(before) + " becomes " + told(after));
        }
      }
    }
    none();
  }

  /** Time alone calms nothing while heat is on. */
  @Test
  void timeAloneCalmsNothing() throws Exception {
    Rig rig = Runs.good();
    SplittableRandom r = new SplittableRandom(SEED + 5);
    for (int i = 0; i < RUNS; i++) {
      List<Line> lines = Runs.draw(r, false);
      if (lines.stream().noneMatch(l -> l.id().equals("power") || l.id().equals("heater-power"))) {
        Instant at = Runs.last(lines);
        Advice before = Runs.whole(rig, lines, at);
        for (int minutes : new int[] {1, 3, 6, 11, 25, 70}) {
          Advice after = Runs.whole(rig, lines, at.plusSeconds(60L * minutes));
          if (after.stage().equals("running")) {
            calmer(before, after, "later", lines);
            before = after;
          }
        }
      }
    }
    none();
  }

  /** A kept session and a fresh one say the same at every line, byte for byte; and the answer's own form holds. */
  @Test
  void aKeptSessionSaysWhatAFreshOneSays() throws Exception {
    Rig rig = Runs.good();
    SplittableRandom r = new SplittableRandom(SEED + 6);
    for (int i = 0; i < RUNS / 8; i++) {
      List<Line> lines = Runs.draw(r, true);
      stillwarden.derive.Ground ground = new stillwarden.derive.Ground(rig, Policy.NONE);
      try (Judge kept = Judge.forRuns()) {
        for (int n = 1; n <= lines.size(); n += n < lines.size() - 12 ? 7 : 1) {
          var log = Runs.log(lines.subList(0, n));
          Optional<java.time.OffsetDateTime> at = Optional.of(Runs.at(Runs.last(lines.subList(0, n))));
          Advice fresh = Advisor.advise(rig, Policy.NONE, log, at);
          String live = JsonView.of(Advisor.advise(ground, log, at, kept));
          assertThat(live).as("after %s", lines.get(n - 1)).isEqualTo(JsonView.of(fresh));
          form(fresh, Advisor.whole(rig, Policy.NONE, log, at), live);
        }
      }
    }
    none();
  }

  /** INV-25: seven steps, the rest counted; reasons; deference; never a word of all clear. */
  private void form(Advice shown, Advice whole, String json) {
    if (!shown.stage().equals("setting-up")) {
      assertThat(shown.actions()).hasSizeLessThanOrEqualTo(7);
      assertThat(shown.ask()).hasSizeLessThanOrEqualTo(3);
      assertThat(shown.doNot()).hasSizeLessThanOrEqualTo(7);
    }
    assertThat(shown.actions().size() + shown.more()).isEqualTo(whole.actions().size());
    // the cap leaves out what can wait, never turns anything round
    assertThat(Runs.ids(whole)).containsSubsequence(Runs.ids(shown));
    assertThat(shown.actions()).allMatch(a -> !a.because().isEmpty() && a.because().stream().noneMatch(b -> b.facts().isEmpty() || b.source().isEmpty()));
    assertThat(json).doesNotContainPattern("(?i)\\bsafe\\b").doesNotContain("NaN");
    if (whole.actions().stream().anyMatch(a -> a.signal().equals("DANGER"))) {
      assertThat(shown.defersTo()).contains("emergency plan");
    }
  }
}
