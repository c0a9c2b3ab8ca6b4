package stillwarden.describe;

import java.util.List;
import java.util.Map;
import java.util.SortedMap;

/** One thing said twice and differently in one file: nobody can know which was meant, so neither is taken. */
final class Contradictions {
  private Contradictions() {}

  static void check(Map<String, Part> parts, List<Joint> joints, SortedMap<Port, Datum> openings, Defects defects) {
    for (Joint j : joints) {
      pair(j.keys().get("greased"), "no", j.keys().get("grease"), List.of("thin", "too-much", "tape", "sleeve"), defects);
      pair(j.keys().get("greased"), "yes", j.keys().get("grease"), List.of("none"), defects);
      pair(j.keys().get("clipped"), "no", j.keys().get("held-by"), List.of("clip"), defects);
      pair(j.keys().get("clipped"), "yes", j.keys().get("held-by"), List.of("nothing"), defects);
    }
    for (Part p : parts.values()) {
      Datum arm = openings.get(new Port(p.name(), "side-arm"));
      pair(p.keys().get("side-arm"), "open", arm, List.of("stoppered", "capped"), defects);
      pair(p.keys().get("side-arm"), "stoppered", arm, List.of("open", "tube"), defects);
      Datum top = openings.get(new Port(p.name(), "top"));
      pair(p.keys().get("stopper"), "off", top, List.of("stoppered", "capped"), defects);
      pair(p.keys().get("stopper"), "on", top, List.of("open", "tube"), defects);
    }
  }

  private static void pair(Datum a, String said, Datum b, List<String> against, Defects defects) {
    if (a != null && b != null && a.text().equals(said) && against.contains(b.text())) {
      defects.add(b.spot(), Words.quote(b.path()) + " is `" + b.text() + "`, but " + Words.quote(a.path()) + " is `" + said + "` in line " + a.spot().line());
    }
  }
}
