package stillwarden.cli;

import java.time.OffsetDateTime;
import java.util.Optional;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;

/** One log that is followed: text goes in as it comes, the answer as of now comes out. */
interface Live extends AutoCloseable {
  /** @param text whole lines, or the unfinished last one of a log that ended */
  void hear(byte[] text) throws Unusable;

  /**
   * @param at now, or the latest time in the log; a time that the log is ahead of counts as the latter
   * @throws Unusable while the log has no line that can be used
   */
  Advice answer(Optional<OffsetDateTime> at) throws Unusable;

  @Override
  void close();
}
