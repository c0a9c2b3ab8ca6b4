package stillwarden.judge;

import java.util.ArrayList;
import java.util.List;
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

  /**
   * @param said what the rules say of the bare signs
   * @param places for each finding where in {@code asked} its facts stand
   */
  Recall(List<Sign> asked, List<Finding> said, int[][] places) {
    this.said = said;
    this.places = places;
    this.asked = asked;
    this.told = new ArrayList<>(said);
    for (int i = 0; i < said.size(); i++) {
      told.set(i, tell(i, asked));
    }
    this.last = new Judgement(told, List.of());
  }

  /** Do the rules see no difference? */
  boolean covers(List<Sign> signs) {
    if (signs.size() != asked.size()) {
      return false;
    }
    for (int i = 0; i < signs.size(); i++) {
      if (!Facts.alike(signs.get(i), asked.get(i))) {
        return false;
      }
    }
    return true;
  }

  /** The judgement of signs that this covers. */
  Judgement judgement(List<Sign> signs) {
    List<Finding> now = told;
    for (int i = 0; i < told.size(); i++) {
      if (moved(places[i], signs)) {
        now = now == told ? new ArrayList<>(told) : now;
        now.set(i, tell(i, signs));
      }
    }
    asked = signs;
    last = now == told ? last : new Judgement(now, List.of());
    told = now;
    return last;
  }

  private boolean moved(int[] at, List<Sign> signs) {
    for (int i : at) {
      if (!signs.get(i).equals(asked.get(i))) {
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

  Judgement last() {
    return last;
  }

}
