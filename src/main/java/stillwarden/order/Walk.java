package stillwarden.order;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import stillwarden.derive.RigNames;
import stillwarden.derive.Situation;
import stillwarden.describe.Joint;
import stillwarden.describe.Knowledge;
import stillwarden.judge.Finding;

/** The walk round the bench: where each question stands on it, and how a rig path reads by role. */
final class Walk {
  private static final String OPENINGS = "openings.";
  private static final Pattern JOINT = Pattern.compile("joints\\[(\\d+)\\]\\.(.+)");
  private static final Map<String, Integer> PLACES = places();

  private Walk() {}

  private static Map<String, Integer> places() {
    Map<String, Integer> out = new HashMap<>();
    List<String> stations = new ArrayList<>();
    var walk = Knowledge.section("checklists").get("en").get("walk-round");
    walk.get("stations").items().forEach(s -> stations.add(s.text("id").orElse("")));
    int n = 0;
    for (Map.Entry<String, stillwarden.describe.Tree> e : walk.get("asks").fields().entrySet()) {
      int station = stations.indexOf(e.getValue().text("station").orElse(""));
      out.put(e.getKey(), (station < 0 ? stations.size() : station) * 1000 + n++);
    }
    return out;
  }

  /** {@code my-flask.cracks} reads as {@code flask.cracks}; {@code joints[3].clipped} as {@code joint.clipped}. */
  static String byRole(Situation s, String about) {
    Matcher joint = JOINT.matcher(about);
    if (joint.matches()) {
      return "joint." + joint.group(2);
    }
    int dot = about.indexOf('.');
    if (dot < 0) {
      return about;
    }
    String key = about.substring(dot);
    // a bare role asks whether there is such a part
    return RigNames.role(s.rig(), s.roles(), about.substring(0, dot)).map(r -> key.equals(".kind") ? r : r + key).orElse(about);
  }

  static int place(Situation s, String about) {
    Integer exact = PLACES.get(byRole(s, about));
    return exact != null ? exact * 100 + index(about) : 9_999_999;
  }

  /** Where on the walk round the first of the things behind these findings stands. */
  static int first(Situation s, List<Finding> reasons) {
    return reasons.stream().flatMap(f -> f.facts().stream()).flatMap(x -> x.looks().stream()).mapToInt(l -> place(s, l)).min().orElse(Integer.MAX_VALUE);
  }

  private static int index(String about) {
    Matcher joint = JOINT.matcher(about);
    return joint.matches() ? Math.min(99, Integer.parseInt(joint.group(1))) : 0;
  }

  /** The question, with the part or the joint in the user's own words where there could be a doubt. */
  static String say(Situation s, String about, String key) {
    String words = Wording.english().question(key);
    Matcher m = JOINT.matcher(about);
    if (m.matches()) {
      int i = Integer.parseInt(m.group(1));
      Optional<Joint> j = s.rig().joints().stream().filter(x -> x.index() == i).findFirst();
      return j.map(x -> x + ": " + words).orElse(words);
    }
    if (about.startsWith(OPENINGS)) {
      return Wording.english().question("openings").replace("This opening", "Opening " + about.substring(OPENINGS.length()));
    }
    int dot = about.indexOf('.');
    boolean part = dot > 0 && s.rig().parts().containsKey(about.substring(0, dot));
    return part && !key.startsWith(about.substring(0, dot) + ".") ? about.substring(0, dot) + ": " + words : words;
  }

  /** Where a deed on a part comes in walking order: by the role of the part. */
  static int station(Situation s, String part) {
    return part.isEmpty() ? 0 : place(s, part + ".kind");
  }
}
