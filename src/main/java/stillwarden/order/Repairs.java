package stillwarden.order;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import stillwarden.derive.Change;
import stillwarden.derive.Changes;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.describe.Tree;
import stillwarden.judge.Finding;

/** One change for each failed item of the start gate; where a number can be met in two ways, both. */
final class Repairs {
  private final Situation situation;

  Repairs(Situation situation) {
    this.situation = situation;
  }

  List<Advice.ToStart> of(List<Finding> findings) {
    Map<String, Advice.ToStart> out = new LinkedHashMap<>();
    for (Finding f : findings) {
      if (f.isActive() && Verdicts.gate(f) && Hazards.signal(f) != Signal.NOTICE) {
        changes(f).forEach(c -> out.putIfAbsent(c.about() + " " + c.to(), c));
      }
    }
    List<Advice.ToStart> sorted = new ArrayList<>(out.values());
    sorted.sort(java.util.Comparator.comparingInt((Advice.ToStart t) -> Walk.place(situation, t.about())).thenComparing(Advice.ToStart::about));
    return sorted;
  }

  private List<Advice.ToStart> changes(Finding f) {
    List<Advice.ToStart> out = new ArrayList<>();
    Map<String, Tree> page = Hazards.of(f.hazard()).toStart();
    for (Sign s : f.facts()) {
      List<Change> computed = Changes.of(situation, s);
      computed.forEach(c -> out.add(new Advice.ToStart(c.about(), c.to(), c.why())));
      if (computed.isEmpty()) {
        stated(page, s).ifPresent(to -> out.add(new Advice.ToStart(s.looks().isEmpty() ? s.about() : s.looks().get(0), to, f.rule())));
      }
    }
    return out;
  }

  /** The hazard's page names the right value by sign or by rig key. */
  private java.util.Optional<String> stated(Map<String, Tree> page, Sign s) {
    for (String key : java.util.stream.Stream.concat(java.util.stream.Stream.of(s.about()), s.looks().stream().map(l -> Walk.byRole(situation, l))).toList()) {
      if (page.containsKey(key)) {
        return page.get(key).text();
      }
    }
    return java.util.Optional.empty();
  }
}
