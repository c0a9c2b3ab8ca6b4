package stillwarden.derive;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import stillwarden.describe.Entry;
import stillwarden.describe.Key;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Observation;
import stillwarden.describe.Vocabulary;

/**
 * What happened, as told: smoke, a crack, a fire. An event stands until the same thing, on the same part, is seen
 * otherwise. "Not sure" of an event counts as its worst value.
 */
final class EventSigns {
  /** Observations that have a derived sign of the same name, made elsewhere. */
  private static final Set<String> DERIVED_ELSEWHERE = Set.of(
      "flask-level", "reservoir-level", "receiver-level", "path", "tip", "hood", "power", "foam", "boiling", "drip",
      "vapour-past-condenser", "condenser-solids", "coolant-running", "head-temperature", "barometer");

  private final Scene scene;
  private final SignSet out;

  EventSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    for (Observation o : Vocabulary.get().observations().values()) {
      if (!DERIVED_ELSEWHERE.contains(o.id()) && (o.key().closed() || o.key().type() == Key.Type.LEVEL)) {
        lastByPart(o).values().forEach(e -> sign(o, e));
      }
    }
  }

  private Map<String, Entry> lastByPart(Observation o) {
    Map<String, Entry> out = new LinkedHashMap<>();
    List<String> values = o.key().values();
    for (Entry e : scene.run().saw(o.id())) {
      out.merge(e.part(), e, (a, b) -> a.at().equals(b.at()) && values.indexOf(a.text()) > values.indexOf(b.text()) ? a : b);
      if (e.part().isEmpty() && values.indexOf(e.text()) == 0) {
        // said of no part in particular: it clears what was said of any
        out.replaceAll((p, old) -> e);
      }
    }
    return out;
  }

  private void sign(Observation o, Entry e) {
    List<String> values = o.key().values();
    if (e.text().equals(Looks.NOT_SURE)) {
      notSure(o, e);
      return;
    }
    String value = e.measured().isPresent() && !values.contains(e.text()) ? (e.measured().get().si() > 0 ? "yes" : "no") : e.text();
    out.seen(o.id(), e.part(), value, scene.told(e), since(o, e), o.id());
    if (o.id().equals("smell") && value.equals("burnt")) {
      // what is burning is taken to be the charge until somebody finds otherwise
      out.seen("scorching", "", "smell", scene.told(e), since(o, e), "scorching");
    }
  }

  /** A yes or no that nobody is sure of counts as the worse; of several words the one that the vocabulary names, else all are asked. */
  private void notSure(Observation o, Entry e) {
    List<String> values = o.key().values();
    String counts = Knowledge.section("words").get("log").get("saw").get(o.id()).text("not-sure").orElse(o.key().type() == Key.Type.TRI ? values.get(values.size() - 1) : "");
    if (counts.isEmpty() || counts.equals("ask")) {
      out.possible(o.id(), e.part(), values, scene.told(e), List.of(o.id()));
    } else {
      out.counted(o.id(), counts, scene.told(e) + ", counts as " + counts, o.id());
      out.possible(o.id(), e.part(), values.subList(1, values.size()).stream().filter(v -> !v.equals(counts)).toList(), scene.told(e), List.of(o.id()));
    }
  }

  /** When the value began that holds now. */
  private java.time.Instant since(Observation o, Entry e) {
    java.time.Instant since = e.at();
    List<Entry> all = scene.run().saw(o.id());
    for (int i = all.size() - 1; i >= 0; i--) {
      Entry x = all.get(i);
      if (x.part().equals(e.part())) {
        if (!x.text().equals(e.text())) {
          break;
        }
        since = x.at();
      }
    }
    return since;
  }
}
