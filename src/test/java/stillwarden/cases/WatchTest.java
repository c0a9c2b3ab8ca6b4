package stillwarden.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.regex.Pattern;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;
import stillwarden.describe.Entry;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.judge.Judge;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.show.JsonView;
import stillwarden.watch.Watch;

/** A live run says at every step what a fresh judgement says, to the byte, with the short cut and without. */
class WatchTest {
  private static final int RUNS = 16;
  private static final int LINES = 40;

  @TempDir
  Path folder;

  @TestFactory
  Stream<DynamicTest> aKeptRunSaysWhatAFreshOneSays() {
    List<CaseFile.Case> cases = CaseFile.all();
    return LongStream.range(0, RUNS).mapToObj(seed -> DynamicTest.dynamicTest("seed " + seed, () -> compare(cases, new Random(seed))));
  }

  private void compare(List<CaseFile.Case> cases, Random random) throws Exception {
    CaseFile.Case own = cases.get(random.nextInt(cases.size()));
    Rig rig = Bench.rig(own.map("rig"), folder);
    Policy policy = Bench.policy(own.map("policy"), folder);
    LogReader reader = new LogReader("random.run.jsonl");
    try (Watch quick = new Watch(rig, policy); Watch slow = new Watch(rig, policy, Judge.withoutShortCut())) {
      for (String line : lines(cases, random)) {
        Optional<Entry> entry = reader.add(line);
        if (entry.isPresent()) {
          String fresh = said(Advisor.advise(rig, policy, reader.log(), Optional.empty()));
          Watch restarted = random.nextInt(8) == 0 ? restart(rig, policy, reader.log()) : quick;
          assertThat(said(quick.log(reader.log(), Optional.empty()))).as(line).isEqualTo(fresh);
          assertThat(said(slow.log(reader.log(), Optional.empty()))).as(line).isEqualTo(fresh);
          assertThat(said(restarted.log(reader.log(), Optional.empty()))).as("after a restart: " + line).isEqualTo(fresh);
          tick(quick, slow, rig, policy, reader.log(), random);
        }
      }
    }
    assertThat(reader.log().entries()).hasSizeGreaterThan(LINES / 2);
  }

  private static Watch restart(Rig rig, Policy policy, RunLog log) {
    Watch w = new Watch(rig, policy);
    w.log(log, Optional.empty());
    return w;
  }

  /** Silence of some seconds or of more than any shelf life. */
  private static void tick(Watch quick, Watch slow, Rig rig, Policy policy, RunLog log, Random random) {
    if (random.nextInt(4) == 0) {
      OffsetDateTime last = log.entries().stream().map(Entry::when).max(Comparator.naturalOrder()).orElseThrow();
      OffsetDateTime now = last.plusSeconds(random.nextInt(3) == 0 ? random.nextInt(4000) : random.nextInt(40));
      String fresh = said(Advisor.advise(rig, policy, log, Optional.of(now)));
      assertThat(said(quick.tick(now))).as("tick " + now).isEqualTo(fresh);
      assertThat(said(slow.tick(now))).as("tick " + now).isEqualTo(fresh);
    }
  }

  private static String said(Advice a) {
    return JsonView.of(a);
  }

  /** Lines of many cases and of the good run mixed, mostly in order of time, by people and by an instrument. */
  private static List<String> lines(List<CaseFile.Case> cases, Random random) {
    List<String> own = cases.stream().flatMap(c -> c.list("log").stream()).toList();
    List<Bench.Line> out = new ArrayList<>();
    for (int i = 0; i < LINES; i++) {
      String text = random.nextInt(3) == 0 ? own.get(random.nextInt(own.size())) : ordinary(random);
      String words = text.strip().split("\\s+", 2)[1].replaceAll(" (id|corrects)=\\S+", "");
      boolean read = random.nextInt(6) == 0 && !words.contains("by=") && words.startsWith("saw");
      out.add(Bench.line(random.nextInt(1, 900) / 10.0 + " " + words + (read ? " from=tc-1" : "")));
    }
    out.sort(Comparator.comparingDouble(Bench.Line::minute));
    int late = random.nextInt(out.size() - 6);
    out.add(late + 5, out.remove(late));
    List<String> json = new ArrayList<>(out.stream().map(Bench.Line::json).toList());
    json.add(0, Bench.line("0 did heat-on 60 %").json());
    json.add(random.nextInt(json.size()), "{\"at\":\"2026-05-12T09:01:00Z\",\"by\":\"nk\",\"saw\":\"flask-level\",\"value\":\"340\"}");
    return json;
  }

  private static String ordinary(Random random) {
    String[] lines = {
      "1 saw path open", "1 saw foam none", "1 saw hood running", "1 saw tip clear", "1 saw coolant-running", "1 saw flask-level 330 mL",
      "1 saw flask-level 300 mL", "1 saw reservoir-level 200 mL", "1 saw condenser-solids none", "1 saw vapour-past-condenser none",
      "1 saw boiling gentle", "1 saw drip drops", "1 saw head-temperature 98.6 Cel", "1 saw head-temperature 98.4 Cel", "1 saw receiver-level 60 mL"
    };
    return lines[random.nextInt(lines.length)];
  }

  @Test
  void theRulesAreCompiled() {
    assertThat(Judge.ruleCount()).isGreaterThan(150);
  }

  /** The short cut holds only while no rule looks at the evidence, the time or the questions of a sign. */
  @Test
  void noRuleLooksAtWhatTheShortCutLeavesOut() throws IOException {
    Pattern forbidden = Pattern.compile("\\b(evidence|since|looks|getEvidence|getSince|getLooks|withFacts)\\b");
    try (Stream<Path> files = Files.walk(Path.of("rules"))) {
      for (Path f : files.filter(p -> p.toString().endsWith(".drl")).toList()) {
        for (String line : Files.readString(f, StandardCharsets.UTF_8).lines().toList()) {
          boolean text = line.strip().startsWith("//") || line.strip().startsWith("rule \"");
          assertThat(!text && forbidden.matcher(line).find()).as(f + ": " + line).isFalse();
        }
      }
    }
  }

  @Test
  void linesMayComeOneByOne() throws Exception {
    Rig rig = Bench.rig(java.util.Map.of(), folder);
    RunLog log = Bench.log(List.of("30 saw foam rising"), List.of()).orElseThrow();
    try (Watch watch = new Watch(rig, Policy.NONE)) {
      Advice last = null;
      for (Entry e : log.entries()) {
        last = watch.add(e);
      }
      assertThat(last).isEqualTo(Advisor.advise(rig, Policy.NONE, log, Optional.empty()));
      OffsetDateTime later = OffsetDateTime.ofInstant(Bench.HEAT_ON.plusSeconds(5400), ZoneOffset.UTC);
      assertThat(watch.tick(later)).isEqualTo(Advisor.advise(rig, Policy.NONE, log, Optional.of(later)));
    }
  }
}
