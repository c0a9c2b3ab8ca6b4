package stillwarden.cli;

import java.io.InputStream;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.Optional;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.PolicyReader;
import stillwarden.describe.Rig;
import stillwarden.describe.RigReader;
import stillwarden.describe.RunLog;
import stillwarden.describe.SchemaWriter;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.order.Explanation;
import stillwarden.show.AdviceSchema;
import stillwarden.show.PlanSheet;

/** The real readers and the real judgement. */
final class LiveEngine implements Engine {
  @Override
  public Rig rig(Path file) throws Unusable {
    return RigReader.read(file);
  }

  @Override
  public Policy policy(Path file) throws Unusable {
    return PolicyReader.read(file);
  }

  @Override
  public RunLog log(Path file) throws Unusable {
    return LogReader.read(file);
  }

  @Override
  public RunLog log(InputStream in, String name) throws Unusable {
    return LogReader.read(in, name);
  }

  @Override
  public Advice inspect(Rig rig, Policy policy, Optional<OffsetDateTime> at) {
    return Advisor.inspect(rig, policy, at);
  }

  @Override
  public Advice advise(Rig rig, Policy policy, RunLog log, Optional<OffsetDateTime> at) {
    return Advisor.advise(rig, policy, log, at);
  }

  @Override
  public Live live(Rig rig, Policy policy, String name) {
    return new LiveRun(rig, policy, name);
  }

  @Override
  public Explanation explain(String hazard, Rig rig, Policy policy, Optional<RunLog> log, Optional<OffsetDateTime> at) {
    return Advisor.explain(hazard, rig, policy, log, at);
  }

  @Override
  public PlanSheet plan(Rig rig, Policy policy, Optional<OffsetDateTime> at) throws Unusable {
    return PlanAdapter.sheet(rig, policy, at);
  }

  @Override
  public String schema(String what) {
    return what.equals("advice") ? AdviceSchema.text() : SchemaWriter.schema(what);
  }
}
