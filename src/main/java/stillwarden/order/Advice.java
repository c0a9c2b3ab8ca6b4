package stillwarden.order;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import stillwarden.derive.Estimate;

/**
 * The answer, complete and ordered: what every view shows. Field by field as in the printed schema `advice`.
 *
 * @param at RFC 3339 text in the log's offset, or empty when nothing is dated
 * @param more due steps not listed (only {@code advise} caps its list)
 * @param lookedAt gate items looked at, of {@code gateItems} in all (set-up only)
 * @param waivers loosened limits in force, in words
 */
public record Advice(
    String rig,
    String at,
    String stage,
    String verdict,
    List<Action> actions,
    int more,
    List<Ban> doNot,
    List<Question> ask,
    List<Estimate> numbers,
    List<ToStart> toStart,
    List<String> leftOut,
    List<String> notes,
    int lookedAt,
    int gateItems,
    List<String> waivers,
    String defersTo) {

  /**
   * One deed to do.
   *
   * @param iff the sign in words on which it depends while that is unknown
   * @param state {@code due} or {@code confirm}
   */
  public record Action(
      int order,
      String act,
      String part,
      String say,
      String signal,
      Optional<Duration> within,
      String state,
      Optional<String> iff,
      List<Because> because,
      List<String> cautions,
      String doneWhen) {}

  /** Why: one rule with the facts it matched. */
  public record Because(String rule, String hazard, List<String> facts, String source) {}

  /** What a person might reach for and must not; {@code until} is an action id or a sign, or empty. */
  public record Ban(String act, String say, String until, List<String> because) {}

  /** One look or one fact that is needed. */
  public record Question(String about, String say, Optional<Duration> within, List<String> unlocks, String station) {}

  /** One change that would clear a failed item of the start gate. */
  public record ToStart(String about, String to, String why) {}

  /** Exit status of `inspect` and `advise`: 0 nothing to do, 1 something to do or to find out. */
  public int exit() {
    return verdict.equals("start") || verdict.equals("carry-on") ? 0 : 1;
  }
}
