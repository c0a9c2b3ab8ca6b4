package stillwarden.cli;

import java.time.OffsetDateTime;
import java.util.Optional;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.watch.Watch;

/** The real one: each line is read once, and what a line leaves as it was is not judged again. */
final class LiveRun implements Live {
  private final LogReader reader;
  private final Watch watch;
  private Unusable refused;

  LiveRun(Rig rig, Policy policy, String name) {
    this.reader = new LogReader(name);
    this.watch = new Watch(rig, policy);
  }

  @Override
  public void hear(byte[] text) throws Unusable {
    if (refused != null) {
      throw refused;
    }
    try {
      reader.add(text);
    } catch (Unusable u) {
      // a log of a format that nobody knows gets no better by its later lines
      refused = u;
      throw u;
    }
  }

  @Override
  public Advice answer(Optional<OffsetDateTime> at) throws Unusable {
    if (refused != null) {
      throw refused;
    }
    RunLog log = reader.usable();
    // a machine whose clock is behind the log's must not make the log's last lines vanish
    return watch.log(log, at.filter(now -> log.entries().stream().noneMatch(e -> e.at().isAfter(now.toInstant()))));
  }

  @Override
  public void close() {
    watch.close();
  }
}
