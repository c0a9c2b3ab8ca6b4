package stillwarden.bench;

import java.util.List;
import java.util.Set;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.openjdk.jmh.annotations.Warmup;
import stillwarden.derive.Sign;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.judge.Judge;
import stillwarden.judge.Judgement;
import stillwarden.judge.SubsetJudge;
import stillwarden.order.Advice;
import stillwarden.watch.Watch;

/** One observation after the other of one hot rig: the whole decision, and the judging alone in three ways. */
@State(Scope.Thread)
@Fork(value = 1, jvmArgsAppend = {"-XX:+UseSerialGC", "-Xmx512m"})
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 4, time = 1)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class Steps {
  private final PlainRules plain = new PlainRules();
  private Rig rig;
  private RunLog run;
  private List<List<Sign>> signs;
  private Judge engine;
  private Judge shortCut;
  private Watch watch;
  private int next;

  /** Reads the material and proves that all three judge alike. */
  @Setup
  public void read() {
    rig = Material.rig();
    run = Material.run();
    signs = Material.signs(rig, run);
    Set<String> names = plain.names();
    engine = SubsetJudge.of(names, false);
    shortCut = SubsetJudge.of(names, true);
    watch = new Watch(rig, Policy.NONE);
    compare(signs, plain, engine, shortCut);
  }

  /** @return findings in all steps, so that nobody compares nothing with nothing */
  static int compare(List<List<Sign>> signs, PlainRules plain, Judge engine, Judge shortCut) {
    int findings = 0;
    for (List<Sign> step : signs) {
      Judgement want = plain.judge(step);
      if (!want.equals(engine.judge(step)) || !want.equals(shortCut.judge(step))) {
        throw new IllegalStateException("the rules by hand and the rules by the engine disagree at " + step);
      }
      findings += want.findings().size();
    }
    if (findings == 0) {
      throw new IllegalStateException("no finding in the whole run");
    }
    return findings;
  }

  @TearDown
  public void close() {
    engine.close();
    shortCut.close();
    watch.close();
  }

  /** One whole decision: line in, ordered advice out. A run that is over begins anew. */
  @Benchmark
  @BenchmarkMode(Mode.SampleTime)
  public Advice decision() {
    if (next == run.entries().size()) {
      watch.close();
      watch = new Watch(rig, Policy.NONE);
      next = 0;
    }
    Entry line = run.entries().get(next++);
    return watch.add(line);
  }

  @Benchmark
  @BenchmarkMode(Mode.AverageTime)
  public Judgement judgePlain() {
    return plain.judge(step());
  }

  @Benchmark
  @BenchmarkMode(Mode.AverageTime)
  public Judgement judgeEngine() {
    return engine.judge(step());
  }

  @Benchmark
  @BenchmarkMode(Mode.AverageTime)
  public Judgement judgeShortCut() {
    return shortCut.judge(step());
  }

  private List<Sign> step() {
    next = next == signs.size() - 1 ? 0 : next + 1;
    return signs.get(next);
  }
}
