package stillwarden.order;

import java.util.List;
import java.util.Set;
import stillwarden.derive.Situation;
import stillwarden.judge.Finding;
import stillwarden.judge.Statement;

/** The one word that comes first, by the contract's rules. */
final class Verdicts {
  private static final Set<String> PLANNED = Set.of("A1", "A2", "B1", "B2", "B4", "C4");
  private static final Set<String> FORCED = Set.of("C1", "C2", "C3");

  private Verdicts() {}

  /** @param notJudged a rule threw: never calm then */
  static String of(Situation s, List<Finding> findings, List<Step> steps, boolean notJudged) {
    boolean noMethod = s.rig().method().isEmpty();
    return s.time().stage().equals("setting-up") ? beforeHeat(findings, notJudged || noMethod) : inRun(s, findings, steps, notJudged);
  }

  private static String beforeHeat(List<Finding> findings, boolean notJudged) {
    boolean holds = findings.stream().anyMatch(Verdicts::holdsStart);
    return holds || notJudged ? "not-yet" : "start";
  }

  /** Anything of CAUTION or above that is so, or that an unknown could hide. */
  static boolean holdsStart(Finding f) {
    return Hazards.signal(f) != Signal.NOTICE && !Hazards.of(f.hazard()).principle();
  }

  /** A set-up hazard: judged before heat, and no alarm of its own in the run. */
  static boolean gate(Finding f) {
    return Hazards.urgency(f).equals("before-start") && !Hazards.of(f.hazard()).principle();
  }

  private static String inRun(Situation s, List<Finding> findings, List<Step> steps, boolean notJudged) {
    List<Finding> active = findings.stream().filter(Finding::isActive).toList();
    boolean danger = active.stream().anyMatch(f -> Hazards.signal(f) == Signal.DANGER && !gate(f));
    boolean cut = steps.stream().filter(x -> x.deed.cut() && x.iff.isEmpty()).anyMatch(x -> x.reasons.stream().anyMatch(f -> alarm(f) && asksForACut(f)));
    if (danger || cut || notJudged || s.time().uncleared() || active.stream().anyMatch(f -> reaches(f, FORCED))) {
      return "stop";
    }
    boolean shutdown = s.time().stage().equals("closed");
    if (!shutdown && (s.time().endRun().isPresent() || active.stream().anyMatch(f -> reaches(f, PLANNED)))) {
      return "wind-down";
    }
    boolean due = steps.stream().anyMatch(x -> x.signal() != Signal.NOTICE && x.iff.isEmpty());
    return due || s.is("over-check", "yes") ? "adjust" : "carry-on";
  }

  /** A hazard, not an end criterion, asks. */
  private static boolean alarm(Finding f) {
    return !Hazards.speaking(f).end() && !Hazards.of(f.hazard()).end();
  }

  /** Not merely merged into the cut because a weaker deed of its own fell to it. */
  private static boolean asksForACut(Finding f) {
    return f.statements().stream().anyMatch(x -> x instanceof Statement.Propose p && Deeds.of(p.action()).cut());
  }

  private static boolean reaches(Finding f, Set<String> criteria) {
    return f.statements().stream().anyMatch(x -> x instanceof Statement.Reach r && criteria.contains(r.criterion()));
  }
}
