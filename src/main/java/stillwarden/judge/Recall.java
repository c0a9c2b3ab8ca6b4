package stillwarden.judge;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import stillwarden.derive.Sign;

/**
 * One judgement kept, and the short cut: rules see of a sign only what it is about, its part, its value and its
 * standing. Signs equal in these give the same findings, with the new evidence in the place of the old.
 */
final class Recall {
  private final List<Finding> said;
  private final int[][] places;
  private List<Sign> asked;
  private List<Finding> told;
  private Judgement last;

  /** @param said what the rules say of the bare signs */
  Recall(List<Sign> asked, List<Sign> bare, List<Finding> said) {
    this.said = said;
    this.places = places(bare, said);
    this.asked = asked;
    this.told = new ArrayList<>(said);
    for (int i = 0; i < said.size(); i++) {
      told.set(i, tell(i, asked));
    }
    this.last = new Judgement(told, List.of());
  }

  /** What the rules see of each sign; of several that look the same to them each stays one fact. */
  static List<Sign> bare(List<Sign> signs) {
    Map<Sign, Integer> alike = new HashMap<>();
    List<Sign> out = new ArrayList<>(signs.size());
    for (Sign s : signs) {
      Sign plain = new Sign(s.about(), s.part(), s.value(), s.standing(), "", null, List.of());
      int before = alike.merge(plain, 1, Integer::sum) - 1;
      out.add(before == 0 ? plain : new Sign(s.about(), s.part(), s.value(), s.standing(), "#" + before, null, List.of()));
    }
    return out;
  }

  /** Do the rules see no difference? */
  boolean covers(List<Sign> signs) {
    if (signs.size() != asked.size()) {
      return false;
    }
    for (int i = 0; i < signs.size(); i++) {
      if (!alike(signs.get(i), asked.get(i))) {
        return false;
      }
    }
    return true;
  }

  private static boolean alike(Sign a, Sign b) {
    return a == b || a.standing() == b.standing() && a.about().equals(b.about()) && a.value().equals(b.value()) && a.part().equals(b.part());
  }

  /** The judgement of signs that this covers. */
  Judgement judgement(List<Sign> signs) {
    boolean[] moved = moved(signs);
    List<Finding> now = new ArrayList<>(told.size());
    boolean changed = false;
    for (int i = 0; i < told.size(); i++) {
      boolean touched = touched(places[i], moved);
      changed |= touched;
      now.add(touched ? tell(i, signs) : told.get(i));
    }
    asked = signs;
    told = now;
    last = changed ? new Judgement(now, List.of()) : last;
    return last;
  }

  private boolean[] moved(List<Sign> signs) {
    boolean[] out = new boolean[signs.size()];
    for (int i = 0; i < out.length; i++) {
      out[i] = signs.get(i) != asked.get(i) && !signs.get(i).equals(asked.get(i));
    }
    return out;
  }

  private static boolean touched(int[] at, boolean[] moved) {
    for (int i : at) {
      if (moved[i]) {
        return true;
      }
    }
    return false;
  }

  private Finding tell(int i, List<Sign> signs) {
    List<Sign> facts = new ArrayList<>(places[i].length);
    for (int place : places[i]) {
      facts.add(signs.get(place));
    }
    return said.get(i).withFacts(facts);
  }

  private static int[][] places(List<Sign> bare, List<Finding> said) {
    Map<Sign, Integer> index = new HashMap<>();
    for (int i = 0; i < bare.size(); i++) {
      index.put(bare.get(i), i);
    }
    int[][] out = new int[said.size()][];
    for (int i = 0; i < out.length; i++) {
      out[i] = said.get(i).facts().stream().mapToInt(index::get).toArray();
    }
    return out;
  }

  Judgement last() {
    return last;
  }

}
