package stillwarden.show;

import java.time.Duration;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.time.format.DateTimeParseException;
import java.util.Optional;

/** Times as people at a rig use them: a clock time in the log's own offset, or "now". */
final class Times {
  private static final DateTimeFormatter CLOCK = DateTimeFormatter.ofPattern("HH:mm:ss");
  private static final Duration NOW = Duration.ofSeconds(5);

  private Times() {}

  /** {@code 10:52:05}, or the text itself when it is no RFC 3339 time. */
  static String clock(String at) {
    return parse(at).map(CLOCK::format).orElse(at);
  }

  /** "now", "by 10:53:05", or "within 1 min" when nothing says what time it is. */
  static String by(String at, Duration within) {
    if (within.compareTo(NOW) <= 0) {
      return "now";
    }
    return parse(at).map(t -> "by " + CLOCK.format(t.plus(within))).orElseGet(() -> "within " + span(within));
  }

  static String span(Duration d) {
    long s = d.toSeconds();
    return s < 60 ? s + " s" : s % 60 == 0 ? s / 60 + " min" : s / 60 + " min " + s % 60 + " s";
  }

  private static Optional<OffsetDateTime> parse(String at) {
    try {
      return Optional.of(OffsetDateTime.parse(at));
    } catch (DateTimeParseException e) {
      return Optional.empty();
    }
  }
}
