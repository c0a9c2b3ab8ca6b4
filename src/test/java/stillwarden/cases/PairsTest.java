package stillwarden.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import stillwarden.derive.Situation;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;

/**
 * Any two faults of a run at once, taken from the cases beside the rules: whatever the two are, the principles hold.
 * A sample of the pairs by default; {@code -Dpairs=all} runs every one.
 */
class PairsTest {
  private static final int SAMPLE = 900;

  @TempDir
  Path folder;

  /** One fault of a run, or two at once. */
  record Fault(String title, Map<String, Object> rig, Map<String, Object> policy, List<String> log, List<String> silent) {
    double end() {
      return log.stream().map(Bench::line).mapToDouble(Bench.Line::minute).max().orElse(0);
    }
  }

  @Test
  void principlesHoldForEveryPair() throws Exception {
    List<Fault> faults = faults();
    List<Fault> pairs = pairs(faults);
    Map<String, Judged> alone = new LinkedHashMap<>();
    for (Fault f : faults) {
      alone.put(f.title(), judged(f));
    }
    Map<String, List<String>> wrong = new TreeMap<>();
    for (Fault p : pairs) {
      String[] two = p.title().split(" \\+ ");
      Judged both = judged(p);
      for (String w : PairPrinciples.broken(alone.get(two[0]), alone.get(two[1]), both)) {
        wrong.computeIfAbsent(w.split(":")[0], k -> new ArrayList<>()).add(p.title() + " -> " + w + "\n" + p.rig() + p.policy() + p.log() + "\n" + Told.whole(both.advice()));
      }
    }
    System.out.println("pairs of faults: " + pairs.size() + " of " + faults.size() + " faults; broken principles: " + count(wrong));
    assertThat(pairs.size()).isGreaterThan(500);
    assertThat(wrong).as(() -> first(wrong)).isEmpty();
  }

  private static Map<String, Integer> count(Map<String, List<String>> wrong) {
    Map<String, Integer> out = new TreeMap<>();
    wrong.forEach((k, v) -> out.put(k, v.size()));
    return out;
  }

  private static String first(Map<String, List<String>> wrong) {
    StringBuilder b = new StringBuilder();
    wrong.forEach((k, v) -> v.stream().limit(Integer.getInteger("show", 6)).forEach(x -> b.append("\n\n").append(x)));
    return b.toString();
  }

  /** @param facts the state behind the advice */
  record Judged(Advice advice, Situation facts) {}

  private Judged judged(Fault f) throws Exception {
    Rig rig = Bench.rig(f.rig(), folder);
    Policy policy = Bench.policy(f.policy(), folder);
    RunLog log = Bench.log(f.log(), f.silent()).orElseThrow();
    Advice a = Advisor.advise(rig, policy, log, Optional.empty());
    var when = log.entries().stream().map(e -> e.when()).max(java.time.OffsetDateTime::compareTo).orElseThrow();
    return new Judged(a, Advisor.situation(rig, policy, log, when));
  }

  /** Every "fires" case of a hazard that speaks in a run. */
  private static List<Fault> faults() throws IOException {
    Set<String> setUp = beforeStart();
    List<Fault> out = new ArrayList<>();
    Map<String, Integer> seen = new TreeMap<>();
    for (CaseFile.Case c : CaseFile.all()) {
      boolean fires = c.word("fires").equals("yes") && c.has("log") && !setUp.contains(c.hazard()) && !c.word("case").startsWith("another hazard");
      if (fires) {
        int n = seen.merge(c.hazard(), 1, Integer::sum);
        out.add(new Fault(c.hazard() + " " + n, c.map("rig"), c.map("policy"), c.list("log"), c.list("silent")));
      }
    }
    return out;
  }

  private static Set<String> beforeStart() throws IOException {
    Set<String> out = new LinkedHashSet<>();
    try (var pages = Files.walk(Path.of("rules", "hazards"), 3)) {
      for (Path p : pages.filter(x -> x.endsWith("why.md")).toList()) {
        if (Files.readString(p).contains("\nurgency: before-start")) {
          out.add(p.getParent().getFileName().toString());
        }
      }
    }
    return out;
  }

  private static List<Fault> pairs(List<Fault> faults) {
    List<Fault> out = new ArrayList<>();
    for (int i = 0; i < faults.size(); i++) {
      for (int j = i + 1; j < faults.size(); j++) {
        join(faults.get(i), faults.get(j)).ifPresent(out::add);
      }
    }
    if ("all".equals(System.getProperty("pairs"))) {
      return out;
    }
    int step = Math.max(1, out.size() / SAMPLE);
    List<Fault> some = new ArrayList<>();
    for (int i = 0; i < out.size(); i += step) {
      some.add(out.get(i));
    }
    return some;
  }

  /** Both at once, where they do not contradict each other and come within two minutes. */
  private static Optional<Fault> join(Fault a, Fault b) {
    boolean apart = Math.abs(a.end() - b.end()) > 2 || name(a).equals(name(b));
    if (apart || clash(a.rig(), b.rig()) || clash(a.policy(), b.policy()) || otherwise(a.log(), b.log()) || otherwise(b.log(), a.log()) || silenced(a, b) || silenced(b, a)) {
      return Optional.empty();
    }
    Set<String> log = new LinkedHashSet<>(a.log());
    log.addAll(b.log());
    Set<String> silent = new LinkedHashSet<>(a.silent());
    silent.addAll(b.silent());
    return Optional.of(new Fault(a.title() + " + " + b.title(), both(a.rig(), b.rig()), both(a.policy(), b.policy()), List.copyOf(log), List.copyOf(silent)));
  }

  private static String name(Fault f) {
    return f.title().split(" ")[0];
  }

  private static Map<String, Object> both(Map<String, Object> a, Map<String, Object> b) {
    Map<String, Object> out = new LinkedHashMap<>(a);
    out.putAll(b);
    return out;
  }

  private static boolean clash(Map<String, Object> a, Map<String, Object> b) {
    return a.keySet().stream().anyMatch(x -> b.keySet().stream().anyMatch(y -> x.equals(y) ? !a.get(x).equals(b.get(y)) : x.startsWith(y + ".") || y.startsWith(x + ".")));
  }

  /** One sees what the other sees otherwise, or has done what changes it. */
  private static boolean otherwise(List<String> a, List<String> b) {
    return a.stream().map(Bench::line).anyMatch(x -> b.stream().map(Bench::line).anyMatch(y ->
        x.verb().equals("saw") && y.verb().equals("saw") && x.id().equals(y.id()) && !x.value().equals(y.value())
            || x.verb().equals("did") && List.of("end-run", "cut-power", "isolate-remote", "coolant-stop", "heat-on", "set-heat").contains(x.id())));
  }

  /** What one does not look at the other sees. */
  private static boolean silenced(Fault a, Fault b) {
    return !a.silent().isEmpty() && b.log().stream().map(Bench::line).anyMatch(l -> a.silent().contains(l.id()) || a.silent().contains("path"));
  }
}
