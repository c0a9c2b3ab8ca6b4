package stillwarden.order;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import stillwarden.derive.RunState;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.describe.Entry;
import stillwarden.judge.Finding;

/** What of the advice has been done, and whether it helped. */
final class Progress {
  private final Situation situation;
  private final RunState run;

  Progress(Situation situation) {
    this.situation = situation;
    this.run = situation.run();
  }

  /** When a deed that is asked for was done, if it was done for this, or still stands. */
  Optional<Instant> done(Step s) {
    Optional<Entry> last = run.lastDid(s.id()).filter(e -> s.part.isEmpty() || e.part().isEmpty() || e.part().equals(s.part));
    if (last.isEmpty()) {
      return Optional.empty();
    }
    Instant at = last.get().at();
    Instant from = s.deed.lasting() ? situation.time().heatOn().orElse(Instant.MIN) : since(s.reasons);
    boolean undone = s.deed.undoneBy().stream().flatMap(id -> run.did(id).stream()).anyMatch(e -> e.at().isAfter(at));
    return at.isBefore(from) || undone ? Optional.empty() : Optional.of(at);
  }

  /** Seen to be done: then it need not be confirmed any more. */
  boolean confirmed(Step s, Instant doneAt) {
    return s.deed.seenBy().stream().anyMatch(sign -> {
      String[] idAndValue = sign.split("=", 2);
      return run.saw(idAndValue[0]).stream().anyMatch(e -> !e.at().isBefore(doneAt) && matches(e, idAndValue[1]));
    });
  }

  private static boolean matches(Entry e, String wanted) {
    return e.text().equals(wanted) || wanted.equals("0") && e.measured().filter(q -> q.si() == 0).isPresent();
  }

  /** When what is behind these findings came to be so: the earliest of them. */
  private static Instant since(List<Finding> reasons) {
    return reasons.stream().map(Progress::since).min(Instant::compareTo).orElse(Instant.MIN);
  }

  /** A finding came to be when the last of its signs did. */
  static Instant since(Finding f) {
    return f.facts().stream().map(Sign::since).filter(t -> t != null).max(Instant::compareTo).orElse(Instant.MIN);
  }

  /** Deeds done for a finding longer ago than its sign should take to clear. */
  List<String> triedInVain(Finding f) {
    if (Hazards.of(f.hazard()).principle() || Hazards.of(f.hazard()).end() || since(f).equals(Instant.MIN)) {
      // a principle has no sign of its own to clear, and what always was so was not answered by a deed
      return List.of();
    }
    Duration allowed = Hazards.speaking(f).clearsWithin();
    List<String> out = new ArrayList<>();
    for (String action : proposed(f)) {
      Deeds.Deed deed = Deeds.of(action);
      if (!deed.equipment() || deed.waits() || deed.cut()) {
        continue;
      }
      run.lastDid(action).filter(e -> !e.at().isBefore(since(f)) && run.age(e).compareTo(allowed) > 0)
          .ifPresent(e -> out.add(action + " at " + e.when().toLocalTime().withNano(0)));
    }
    return out;
  }

  private static List<String> proposed(Finding f) {
    return f.statements().stream().filter(s -> s instanceof stillwarden.judge.Statement.Propose).map(s -> ((stillwarden.judge.Statement.Propose) s).action()).toList();
  }
}
