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
    for (Joint j : joints) {
      joined(j.a(), parts, j, defects);
      joined(j.b(), parts, j, defects);
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

  /** A part that is said to stand free or open at a port can't hang on a joint there. */
  private static void joined(Port port, Map<String, Part> parts, Joint j, Defects defects) {
    Map<String, Datum> keys = parts.get(port.part()).keys();
    String key = switch (port.port()) {
      case "mouth" -> "held";
      case "side-arm" -> "side-arm";
      case "top" -> "stopper";
      default -> "";
    };
    Datum said = keys.get(key);
    if (said != null && List.of("free", "open", "stoppered", "on").contains(said.text())) {
      defects.add(said.spot(), Words.quote(said.path()) + " is `" + said.text() + "`, but " + Words.quote(port.toString()) + " is in joint " + (j.index() + 1));
    }
  }

  private static void pair(Datum a, String said, Datum b, List<String> against, Defects defects) {
    if (a != null && b != null && a.text().equals(said) && against.contains(b.text())) {
      defects.add(b.spot(), Words.quote(b.path()) + " is `" + b.text() + "`, but " + Words.quote(a.path()) + " is `" + said + "` in line " + a.spot().line());
    }
  }
}
