package stillwarden.order;

import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeParseException;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import stillwarden.derive.Ground;
import stillwarden.derive.Situation;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.judge.Judge;
import stillwarden.judge.Judgement;

/**
 * The whole chain in one call: derive, judge, order. A pure function of its arguments; the clock is never read.
 */
public final class Advisor {
  private Advisor() {}

  /** @param at the moment of the inspection; else the rig's {@code seen.at}, else none: then nothing dated is in force */
  public static Advice inspect(Rig rig, Policy policy, Optional<OffsetDateTime> at) {
    Optional<OffsetDateTime> when = at.or(() -> rig.word("seen.at").flatMap(Advisor::time));
    Policy inForce = policy.asOf(when.map(OffsetDateTime::toInstant));
    Situation s = Situation.inspection(rig, inForce, when.map(OffsetDateTime::toInstant), when.map(OffsetDateTime::getOffset).orElse(ZoneOffset.UTC));
    Judgement j = Judge.once(Judge.forInspection(), s.signs());
    return new Answer(s, j, when, true).advice(List.of());
  }

  /** @param at the moment to judge; later lines are left out; else the latest time in the log */
  public static Advice advise(Rig rig, Policy policy, RunLog log, Optional<OffsetDateTime> at) {
    try (Judge judge = Judge.forRuns()) {
      Instant when = at.orElseGet(() -> latest(log)).toInstant();
      return advise(new Ground(rig, policy.asOf(Optional.of(when))), log, at, judge);
    }
  }

  /** The same without a cap on steps, bans and questions: for those who check, not for those who act. */
  public static Advice whole(Rig rig, Policy policy, RunLog log, Optional<OffsetDateTime> at) {
    OffsetDateTime when = at.orElseGet(() -> latest(log));
    Situation s = situation(rig, policy, log, when);
    try (Judge judge = Judge.forRuns()) {
      return new Answer(s, judge.judge(SetupFaults.with(s, judge.judge(s.signs()))), Optional.of(when), true).advice(log.leftOut());
    }
  }

  /** With what is kept for a live run: only the signs that came or went are handed to the engine. */
  public static Advice advise(Ground ground, RunLog log, Optional<OffsetDateTime> at, Judge judge) {
    OffsetDateTime when = at.orElseGet(() -> latest(log));
    Situation s = Situation.run(ground, log.entries(), when.toInstant(), when.getOffset());
    Judgement j = judge.judge(SetupFaults.with(s, judge.judge(s.signs())));
    return new Answer(s, j, Optional.of(when), s.time().stage().equals("setting-up")).advice(at.isPresent() ? until(log.leftOut(), when) : log.leftOut());
  }

  /** Why the rules of one hazard spoke or kept quiet. */
  public static Explanation explain(String hazard, Rig rig, Policy policy, Optional<RunLog> log, Optional<OffsetDateTime> at) {
    Optional<OffsetDateTime> when = at.or(() -> log.map(Advisor::latest)).or(() -> rig.word("seen.at").flatMap(Advisor::time));
    Situation s = log.isPresent()
        ? situation(rig, policy, log.get(), when.orElseThrow())
        : Situation.inspection(rig, policy, when.map(OffsetDateTime::toInstant), ZoneOffset.UTC);
    Judgement j = Judge.once(Judge.forRuns(), s.signs());
    return Why.explain(hazard, s, j);
  }

  /** The facts of a run at one moment, for those who judge by other means (tests, audits). */
  public static Situation situation(Rig rig, Policy policy, RunLog log, OffsetDateTime when) {
    return Situation.run(rig, policy.asOf(Optional.of(when.toInstant())), log.entries(), when.toInstant(), when.getOffset());
  }

  /** Lines of a moment later than the one asked about are not yet there. */
  private static List<RunLog.LeftOut> until(List<RunLog.LeftOut> leftOut, OffsetDateTime when) {
    return leftOut.stream().filter(l -> time(l.at()).filter(t -> t.isAfter(when)).isEmpty()).toList();
  }

  private static OffsetDateTime latest(RunLog log) {
    return log.entries().stream().max(Comparator.comparing(Entry::at)).map(Entry::when).orElseGet(() -> Instant.EPOCH.atOffset(ZoneOffset.UTC));
  }

  private static Optional<OffsetDateTime> time(String text) {
    try {
      return Optional.of(OffsetDateTime.parse(text));
    } catch (DateTimeParseException e) {
      return Optional.empty();
    }
  }
}
