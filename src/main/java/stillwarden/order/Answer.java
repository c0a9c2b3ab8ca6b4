package stillwarden.order;

import java.time.Duration;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.derive.Standing;
import stillwarden.describe.Knowledge;
import stillwarden.describe.RunLog;
import stillwarden.describe.Tree;
import stillwarden.judge.Finding;
import stillwarden.judge.Judgement;
import stillwarden.judge.Statement;

/** Builds one answer from one situation and its judgement. */
final class Answer {
  private static final int MOST_STEPS = 7;
  private static final int MOST_BANS = 7;

  private final Situation situation;
  private final Judgement judgement;
  private final Optional<OffsetDateTime> at;
  private final boolean everything;
  private final List<Finding> findings;
  private final Progress progress;
  private final Deadlines deadlines;
  private final Map<String, String> slots = new HashMap<>();
  private final Map<Finding, List<String>> tried = new HashMap<>();

  /** @param everything no cap on steps and questions: an inspection */
  Answer(Situation situation, Judgement judgement, Optional<OffsetDateTime> at, boolean everything) {
    this.situation = situation;
    this.judgement = judgement;
    this.at = at;
    this.everything = everything;
    this.progress = new Progress(situation);
    this.deadlines = new Deadlines(situation);
    this.findings = judgement.findings().stream().map(this::escalated).toList();
    situation.rig().word("emergency.power-off").ifPresent(w -> slots.put("power-off", w));
  }

  /** A sign that has not cleared in its time raises the signal one word. */
  private Finding escalated(Finding f) {
    if (!f.isActive() || situation.time().stage().equals("setting-up")) {
      return f;
    }
    List<String> inVain = progress.triedInVain(f);
    if (inVain.isEmpty()) {
      return f;
    }
    Finding louder = f.as(Hazards.signal(f).raised().name(), f.urgency());
    tried.put(louder, inVain);
    return louder;
  }

  Advice advice(List<RunLog.LeftOut> leftOut) {
    boolean setup = situation.time().stage().equals("setting-up");
    List<Finding> acted = findings.stream().filter(Finding::isActive).map(f -> setup || !Verdicts.gate(f) ? f : f.bansOnly()).toList();
    Arrange arrange = new Arrange(s -> deadlines.secondsToHarm(s.reasons), s -> setup ? Walk.first(situation, s.reasons) : Walk.station(situation, s.part), setup);
    Arrange.Plan plan = arrange.arrange(acted);
    List<Step> steps = new ArrayList<>(plan.steps());
    markDone(steps);
    boolean notJudged = !judgement.notJudged().isEmpty() || !plan.cycle().isEmpty();
    String verdict = leftOutMatters(leftOut, Verdicts.of(situation, findings, steps, notJudged));
    List<Advice.Action> actions = actions(steps);
    List<Advice.Question> asked = new Questions(situation).again(openLooks(leftOut)).of(findings, everything);
    List<Advice.Action> shown = everything ? actions : Cap.most(MOST_STEPS, actions, asked, awaited(plan.bans(), actions));
    Set<String> gate = gateItems(false);
    return new Advice(
        situation.rig().name(),
        at.map(DateTimeFormatter.ISO_OFFSET_DATE_TIME::format).orElse(""),
        situation.time().stage(),
        verdict,
        shown,
        actions.size() - shown.size(),
        bans(plan.bans()),
        asked,
        situation.numbers().list(),
        setup ? new Repairs(situation).of(findings) : List.of(),
        leftOut.stream().map(l -> "line " + l.line() + ": " + l.reason()).toList(),
        notes(plan.cycle()),
        gate.size() - gateItems(true).size(),
        gate.size(),
        waivers(),
        Deference.words(situation, findings));
  }

  private static Set<String> awaited(List<Bans.Bar> bans, List<Advice.Action> actions) {
    Set<String> out = new TreeSet<>();
    bans.stream().filter(b -> actions.stream().anyMatch(a -> a.act().equals(b.deed()))).forEach(b -> out.addAll(b.untils()));
    return out;
  }

  private void markDone(List<Step> steps) {
    Set<String> waits = new LinkedHashSet<>();
    steps.removeIf(s -> {
      Optional<java.time.Instant> done = progress.done(s);
      s.done = done.isPresent();
      s.doneAt = done.orElse(null);
      return s.done && progress.confirmed(s, s.doneAt);
    });
    for (Step s : steps) {
      if (!waits.isEmpty()) {
        s.behind = waits.iterator().next();
      }
      if (s.deed.waits()) {
        waits.add(s.id());
      }
    }
  }

  /** A bad line in the middle: until a later look at the same thing the verdict is at best `adjust`. */
  private String leftOutMatters(List<RunLog.LeftOut> leftOut, String verdict) {
    boolean open = leftOut.stream().anyMatch(l -> !l.torn() && !lookedAtSince(l));
    return open && verdict.equals("carry-on") ? "adjust" : verdict;
  }

  private List<String> openLooks(List<RunLog.LeftOut> leftOut) {
    return leftOut.stream().filter(l -> !l.torn() && !l.about().isEmpty() && !lookedAtSince(l)).map(RunLog.LeftOut::about).distinct().toList();
  }

  private boolean lookedAtSince(RunLog.LeftOut l) {
    return !l.about().isEmpty() && situation.run().entries().stream().anyMatch(e -> e.id().equals(l.about()) && e.line() > l.line());
  }

  private List<Advice.Action> actions(List<Step> steps) {
    List<Advice.Action> out = new ArrayList<>();
    boolean firstEquipment = true;
    for (Step s : steps) {
      boolean first = s.deed.equipment() && firstEquipment;
      firstEquipment &= !s.deed.equipment();
      out.add(action(out.size() + 1, s, first, steps));
    }
    return out;
  }

  private Advice.Action action(int order, Step s, boolean first, List<Step> all) {
    String variant = s.variants.stream().findFirst().orElseGet(() -> ownWording(s));
    List<String> cautions = new ArrayList<>();
    if (order == 1) {
      people(s, all, cautions);
    }
    Wording.english().caution(s.id()).ifPresent(cautions::add);
    s.reasons.stream().filter(tried::containsKey).distinct().forEach(f -> cautions.add("Tried without effect: " + String.join(", ", tried.get(f)) + ". The sign of " + f.hazard() + " is still there."));
    return new Advice.Action(
        order,
        s.id(),
        part(s),
        Wording.english().say(s.id(), part(s), variant, slots),
        s.signal().name(),
        s.done ? Optional.empty() : deadlines.of(s, first, !s.behind.isEmpty()),
        s.done ? "confirm" : "due",
        Optional.of(s.iff).filter(x -> !x.isEmpty()).map(Wording.english()::until),
        because(s.reasons),
        cautions.stream().distinct().toList(),
        Wording.english().doneWhen(s.id()));
  }

  /** A deed that only one hazard asks for may be said in that hazard's own words. */
  private static String ownWording(Step s) {
    List<String> hazards = s.reasons.stream().map(f -> f.under().isEmpty() ? f.hazard() : f.under()).distinct().toList();
    return hazards.size() == 1 ? hazards.get(0) : "";
  }

  /** Stepping back and warning ride on the first deed, so that they delay nothing. */
  private static void people(Step first, List<Step> all, List<String> cautions) {
    for (String id : List.of("stand-clear", "warn-people")) {
      if (!first.id().equals(id) && all.stream().anyMatch(x -> x.id().equals(id))) {
        cautions.add(Wording.english().say(id, "", "", Map.of()));
      }
    }
  }

  private String part(Step s) {
    return s.part.isEmpty() ? Parts.of(situation, s.id()) : s.part;
  }

  private static List<Advice.Because> because(List<Finding> reasons) {
    Map<String, Advice.Because> out = new LinkedHashMap<>();
    for (Finding f : reasons) {
      String hazard = f.under().isEmpty() ? f.hazard() : f.under();
      List<String> facts = f.facts().stream().map(Sign::evidence).distinct().toList();
      out.merge(f.rule() + "|" + hazard, new Advice.Because(f.rule(), hazard, facts, source(f)), (a, b) -> new Advice.Because(a.rule(), a.hazard(), joined(a.facts(), b.facts()), a.source()));
    }
    return List.copyOf(out.values());
  }

  private static List<String> joined(List<String> a, List<String> b) {
    Set<String> out = new LinkedHashSet<>(a);
    out.addAll(b);
    return List.copyOf(out);
  }

  /** The rule's own sources, in words. */
  private static String source(Finding f) {
    for (Tree rule : Knowledge.section("hazards").get(f.hazard()).get("rules").items()) {
      if (rule.text("name").filter(f.rule()::equals).isPresent()) {
        return String.join("; ", rule.words("source").stream().map(Answer::sourceWords).toList());
      }
    }
    return "";
  }

  /** {@code NICKELS (Nickels, Analytical Chemistry, October 1949)}: the id, and who that is. */
  private static String sourceWords(String cited) {
    String id = cited.split(" ", 2)[0];
    String who = Knowledge.section("sources").get(id).text("ref").orElse("").split("[:;(]", 2)[0].strip();
    return who.isEmpty() ? cited : cited + " (" + who + ")";
  }

  private List<Advice.Ban> bans(List<Bans.Bar> bars) {
    List<Advice.Ban> out = new ArrayList<>();
    for (Bans.Bar b : bars) {
      if ((everything || out.size() < MOST_BANS) && b.named()) {
        Set<String> why = new TreeSet<>();
        b.reasons().forEach(f -> why.add(f.rule()));
        out.add(new Advice.Ban(b.deed(), Wording.english().not(b.deed()), b.until(), List.copyOf(why)));
      }
    }
    return out;
  }

  /** Everything that a set-up rule can look at on this rig; or of it what is unknown. */
  private Set<String> gateItems(boolean unknownOnly) {
    Set<String> unknown = new TreeSet<>();
    findings.stream().filter(f -> !f.isActive() && Verdicts.holdsStart(f))
        .forEach(f -> f.facts().stream().filter(x -> x.standing() == Standing.POSSIBLE).forEach(x -> unknown.add(x.about() + " " + x.part())));
    if (unknownOnly) {
      return unknown;
    }
    Set<String> out = new TreeSet<>(unknown);
    situation.signs().stream().filter(x -> x.isSeen() && Hazards.gateSigns().contains(x.about())).forEach(x -> out.add(x.about() + " " + x.part()));
    return out;
  }

  private List<String> notes(List<String> cycle) {
    List<String> out = new ArrayList<>();
    judgement.notJudged().forEach(r -> out.add("Could not be judged: " + r + ". The worse case counts."));
    if (!cycle.isEmpty()) {
      out.add("Two rules disagree about the order of " + String.join(", ", cycle) + "; the ladder decided.");
    }
    return out;
  }

  private List<String> waivers() {
    return situation.policy().waivers().stream().map(w -> w.limit() + ": loosened by " + w.who() + " until " + w.until() + " (" + w.why() + ")").toList();
  }

  static Duration shortest(Duration a, Duration b) {
    return a.compareTo(b) <= 0 ? a : b;
  }
}
