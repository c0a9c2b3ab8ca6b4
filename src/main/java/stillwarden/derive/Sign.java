package stillwarden.derive;

import java.time.Instant;
import java.util.List;
import java.util.Objects;

/**
 * One small qualitative fact that rules can match: {@code flask-level is low}. An unknown is not one sign but
 * several with standing POSSIBLE, one for each value it could have: so a rule that matches only positive signs
 * tells by itself what could be hidden by what nobody has looked at.
 *
 * @param about the observation id, the rig key by role ({@code flask.cracks}) or a derived word of {@code rules/words}
 * @param part the user's name of the part (or joint or port) concerned, or empty
 * @param value a word of the closed list of {@code about}
 * @param evidence in words: {@code flask level low, seen 10:52:00 by nk}
 * @param since when it came to be so, or null when it always was
 * @param looks what to ask when it is not SEEN: rig paths or observation ids
 */
public record Sign(
    String about, String part, String value, Standing standing, String evidence, Instant since, List<String> looks) {

  public Sign {
    looks = List.copyOf(looks);
  }

  /** By hand: compared and hashed all the time, and what the compiler writes for records is built anew at every start. */
  @Override
  public boolean equals(Object o) {
    return this == o
        || o instanceof Sign s && standing == s.standing && about.equals(s.about) && value.equals(s.value) && part.equals(s.part)
            && evidence.equals(s.evidence) && Objects.equals(since, s.since) && looks.equals(s.looks);
  }

  @Override
  public int hashCode() {
    return ((about.hashCode() * 31 + part.hashCode()) * 31 + value.hashCode()) * 31 + evidence.hashCode();
  }

  /** Acted on: seen, or counted as worst. */
  public boolean isActive() {
    return standing != Standing.POSSIBLE;
  }

  public boolean isSeen() {
    return standing == Standing.SEEN;
  }
}
