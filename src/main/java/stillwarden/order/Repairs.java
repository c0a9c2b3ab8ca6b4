package stillwarden.order;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.derive.Change;
import stillwarden.derive.Changes;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.describe.Key;
import stillwarden.describe.Tree;
import stillwarden.describe.Vocabulary;
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
      if (f.isActive() && Verdicts.holdsStart(f)) {
        changes(f).forEach(c -> out.putIfAbsent(c.about() + " " + c.to(), c));
      }
    }
    List<Advice.ToStart> sorted = new ArrayList<>(out.values());
    sorted.sort(java.util.Comparator.comparingInt((Advice.ToStart t) -> Walk.place(situation, t.about())).thenComparing(Advice.ToStart::about));
    return sorted;
  }

  private List<Advice.ToStart> changes(Finding f) {
    List<Advice.ToStart> out = new ArrayList<>();
    for (Sign s : f.facts()) {
      Changes.of(situation, s).forEach(c -> out.add(new Advice.ToStart(c.about(), c.to(), c.why())));
    }
    Map<String, Tree> page = Hazards.of(f.hazard()).toStart();
    for (Sign s : f.facts()) {
      String about = s.looks().isEmpty() ? s.about() : s.looks().get(0);
      stated(page, s).ifPresent(to -> out.add(new Advice.ToStart(about, to, f.rule())));
    }
    // where neither a computation nor the page knows better, the calm value of the key that fails
    if (out.isEmpty()) {
      f.facts().forEach(s -> calm(s).ifPresent(c -> out.add(new Advice.ToStart(c.about(), c.to(), f.rule()))));
    }
    return out;
  }

  /** The hazard's page names the right value by sign or by rig key, {@code *.key} for any part. */
  private Optional<String> stated(Map<String, Tree> page, Sign s) {
    List<String> keys = new ArrayList<>(List.of(s.about()));
    for (String look : s.looks()) {
      String byRole = Walk.byRole(situation, look);
      keys.add(byRole);
      keys.add("*" + byRole.substring(Math.max(0, byRole.indexOf('.'))));
    }
    return keys.stream().filter(page::containsKey).findFirst().flatMap(k -> page.get(k).text());
  }

  private Optional<Change> calm(Sign s) {
    if (s.looks().isEmpty()) {
      return Optional.empty();
    }
    String look = s.looks().get(0);
    String byRole = Walk.byRole(situation, look);
    int dot = byRole.indexOf('.');
    Key key = Vocabulary.get().facts().get(look);
    if (key == null && dot > 0) {
      String owner = byRole.substring(0, dot);
      key = owner.equals("joint") ? Vocabulary.get().jointKeys().get(byRole.substring(dot + 1)) : Vocabulary.get().keysOfRole(owner).get(byRole.substring(dot + 1));
    }
    return Optional.ofNullable(key).filter(Key::closed).map(k -> new Change(look, k.values().get(0), ""));
  }
}
