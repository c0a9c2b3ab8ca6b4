package stillwarden.describe;

import java.util.List;
import java.util.Map;

/**
 * A run log: its usable lines in file order (not yet sorted, corrections not yet applied), and the lines left out.
 *
 * @param header the first line's {@code rig, rig-digest, policy-digest, rules}, where written
 * @param leftOut lines that could not be used, each with line number and reason
 */
public record RunLog(String file, Map<String, String> header, List<Entry> entries, List<LeftOut> leftOut) {
  /**
   * A line that does not count.
   *
   * @param about the observation or part id it seems to concern, or empty
   * @param at its time as RFC 3339 text, or empty
   * @param torn true for an unfinished last line
   */
  public record LeftOut(int line, String reason, String about, String at, boolean torn) {}
}
