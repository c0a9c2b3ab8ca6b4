package stillwarden.watch;

import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.derive.Ground;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.judge.Judge;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;

/**
 * One live run. Says at every step what {@link Advisor#advise} says of the same rig, policy and lines, to the byte; what
 * is kept between steps only saves work. Not for several threads at once; to be closed, since a kept session holds
 * memory.
 */
public final class Watch implements AutoCloseable {
  private final Ground ground;
  private final Judge judge;
  private final List<Entry> entries = new ArrayList<>();
  private List<RunLog.LeftOut> leftOut = List.of();

  public Watch(Rig rig, Policy policy) {
    this(rig, policy, Judge.forRuns());
  }

  /** @param judge closed with the watch */
  public Watch(Rig rig, Policy policy, Judge judge) {
    this.ground = new Ground(rig, policy);
    this.judge = judge;
  }

  /** One more line; the answer is as of the latest line so far. */
  public Advice add(Entry line) {
    entries.add(line);
    return now(Optional.empty());
  }

  /** Time passes and nothing is heard. */
  public Advice tick(OffsetDateTime now) {
    return now(Optional.of(now));
  }

  /** A log read so far, with lines left out; its lines must begin with those heard already. */
  public Advice log(RunLog log, Optional<OffsetDateTime> at) {
    entries.addAll(log.entries().subList(entries.size(), log.entries().size()));
    leftOut = log.leftOut();
    return now(at);
  }

  private Advice now(Optional<OffsetDateTime> at) {
    RunLog log = new RunLog("", Map.of(), Collections.unmodifiableList(entries), leftOut);
    return Advisor.advise(ground, log, at, judge);
  }

  @Override
  public void close() {
    judge.close();
  }
}
