package stillwarden.order;

import java.time.OffsetDateTime;
import java.util.Optional;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;

// replaced at merge
public final class Advisor {
  private Advisor() {}

  public static Advice inspect(Rig rig, Policy policy, Optional<OffsetDateTime> at) {
    throw new IllegalStateException("no judgement in this build");
  }

  public static Advice advise(Rig rig, Policy policy, RunLog log, Optional<OffsetDateTime> at) {
    throw new IllegalStateException("no judgement in this build");
  }

  public static Explanation explain(String hazard, Rig rig, Policy policy, Optional<RunLog> log, Optional<OffsetDateTime> at) {
    throw new IllegalStateException("no judgement in this build");
  }
}
