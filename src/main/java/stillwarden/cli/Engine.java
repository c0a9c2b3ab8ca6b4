package stillwarden.cli;

import java.io.InputStream;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.Optional;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.order.Explanation;
import stillwarden.show.PlanSheet;

/** Everything that a command calls, so that the commands can be tried without files and without rules. */
interface Engine {
  Rig rig(Path file) throws Unusable;

  Policy policy(Path file) throws Unusable;

  RunLog log(Path file) throws Unusable;

  /** @param name what the stream is called in messages */
  RunLog log(InputStream in, String name) throws Unusable;

  Advice inspect(Rig rig, Policy policy, Optional<OffsetDateTime> at);

  Advice advise(Rig rig, Policy policy, RunLog log, Optional<OffsetDateTime> at);

  /** @param name what the log is called in messages */
  Live live(Rig rig, Policy policy, String name);

  Explanation explain(String hazard, Rig rig, Policy policy, Optional<RunLog> log, Optional<OffsetDateTime> at);

  PlanSheet plan(Rig rig, Policy policy, Optional<OffsetDateTime> at) throws Unusable;

  /** @param what {@code rig, policy, log} or {@code advice} */
  String schema(String what);
}
