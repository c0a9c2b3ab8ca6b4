package stillwarden.judge;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.kie.api.event.rule.DefaultRuleRuntimeEventListener;
import org.kie.api.event.rule.ObjectDeletedEvent;
import org.kie.api.event.rule.ObjectInsertedEvent;
import org.kie.api.runtime.KieSession;
import org.kie.api.runtime.rule.AgendaFilter;
import org.kie.api.runtime.rule.FactHandle;
import stillwarden.derive.Sign;

/**
 * The engine's working memory of one judge: for each sign in order one bare fact, which has only what rules see (about,
 * part, value, standing). Of several signs that look the same to the rules each is a fact of its own, told apart by a tag.
 */
final class Facts {
  private static final class Place {
    final Sign bare;
    FactHandle handle;
    int index;

    Place(Sign bare) {
      this.bare = bare;
    }
  }

  private final KieSession session;
  private final Map<Sign, Place> byFact = new HashMap<>();
  private final Map<Finding, Finding> findings = new LinkedHashMap<>();
  private List<Place> places = new ArrayList<>();

  Facts(KieSession session) {
    this.session = session;
    session.addEventListener(new DefaultRuleRuntimeEventListener() {
      @Override
      public void objectInserted(ObjectInsertedEvent e) {
        if (e.getObject() instanceof Finding f) {
          findings.put(f, f);
        }
      }

      @Override
      public void objectDeleted(ObjectDeletedEvent e) {
        if (e.getOldObject() instanceof Finding f) {
          findings.remove(f);
        }
      }
    });
  }

  /** Do the rules see no difference between the two? */
  static boolean alike(Sign a, Sign b) {
    return a == b || a.standing() == b.standing() && a.about().equals(b.about()) && a.value().equals(b.value()) && a.part().equals(b.part());
  }

  /** Only what differs between the first and the last difference is handed over. */
  void update(List<Sign> signs) {
    int most = Math.min(signs.size(), places.size());
    int head = 0;
    while (head < most && alike(signs.get(head), places.get(head).bare)) {
      head++;
    }
    int tail = 0;
    while (tail < most - head && alike(signs.get(signs.size() - 1 - tail), places.get(places.size() - 1 - tail).bare)) {
      tail++;
    }
    if (head + tail < Math.max(signs.size(), places.size())) {
      replace(signs, head, tail);
    }
  }

  private void replace(List<Sign> signs, int head, int tail) {
    Map<Sign, Place> old = new LinkedHashMap<>();
    places.subList(head, places.size() - tail).forEach(p -> old.put(p.bare, p));
    List<Place> now = new ArrayList<>(places.subList(0, head));
    for (Sign s : signs.subList(head, signs.size() - tail)) {
      Place kept = old.remove(bare(s, ""));
      now.add(kept == null ? new Place(s) : kept);
    }
    now.addAll(places.subList(places.size() - tail, places.size()));
    for (Place gone : old.values()) {
      byFact.remove(gone.bare);
      session.delete(gone.handle);
    }
    for (int i = head; i < now.size(); i++) {
      now.set(i, placed(now.get(i), i));
    }
    places = now;
  }

  private Place placed(Place p, int index) {
    Place in = p.handle != null ? p : insert(p.bare);
    in.index = index;
    return in;
  }

  private Place insert(Sign s) {
    Sign bare = bare(s, "");
    for (int n = 1; byFact.containsKey(bare); n++) {
      bare = bare(s, "#" + n);
    }
    Place p = new Place(bare);
    p.handle = session.insert(bare);
    byFact.put(bare, p);
    return p;
  }

  private static Sign bare(Sign s, String tag) {
    return new Sign(s.about(), s.part(), s.value(), s.standing(), tag, null, List.of());
  }

  int fire(AgendaFilter filter, int most) {
    return session.fireAllRules(filter, most);
  }

  /** What the rules say now of the bare facts. */
  List<Finding> findings() {
    return List.copyOf(findings.values());
  }

  /** Where in the list of signs the facts of a finding stand. */
  int[] places(Finding f) {
    int[] out = new int[f.facts().size()];
    for (int i = 0; i < out.length; i++) {
      out[i] = byFact.get(f.facts().get(i)).index;
    }
    return out;
  }

  void dispose() {
    session.dispose();
  }
}
