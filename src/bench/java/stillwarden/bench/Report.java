package stillwarden.bench;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.openjdk.jmh.results.Result;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.VerboseMode;

/** Everything that is promised about speed, measured in one run and printed as one table. */
public final class Report {
  private static final int TURNS = 3;
  private static final int STARTS = 11;
  private static final String[] WAYS = {"judgePlain", "judgeEngine", "judgeShortCut"};
  private static final Path LAUNCHER = Path.of("target", "stillwarden", "bin", "stillwarden");

  private Report() {}

  public static void main(String[] args) throws Exception {
    System.out.println("Measuring for some four minutes; the machine's other work shows in the times, less in the ratios.");
    Map<String, List<Double>> judged = judging();
    Result<?> decision = run("decision").getPrimaryResult();
    Map<String, Double> live = Processes.figures(
        Processes.java("-XX:+UseSerialGC", "-Xmx1g", "-cp", System.getProperty("java.class.path"), LiveRigs.class.getName()));
    decisions(decision, live);
    ratios(judged);
    memory(live);
    coldStart();
  }

  /** The three ways by turns, each time in a process of its own. */
  private static Map<String, List<Double>> judging() throws RunnerException {
    Map<String, List<Double>> out = new HashMap<>();
    for (int turn = 0; turn < TURNS; turn++) {
      for (String way : WAYS) {
        out.computeIfAbsent(way, k -> new ArrayList<>()).add(run(way).getPrimaryResult().getScore());
      }
    }
    return out;
  }

  private static RunResult run(String benchmark) throws RunnerException {
    return new Runner(new OptionsBuilder().include(Steps.class.getName() + "\\." + benchmark + "$").verbosity(VerboseMode.SILENT).build()).runSingle();
  }

  private static void decisions(Result<?> hot, Map<String, Double> live) {
    head("Decisions: a line in, the whole ordered advice with all its numbers out; an ordinary run of 90 minutes with five upsets");
    row("one hot rig", "%.0f a second, p50 %.0f us, p99 %.0f us", 1e6 / hot.getScore(), hot.getStatistics().getPercentile(50), hot.getStatistics().getPercentile(99));
    row("1,000 rigs in turn, one thread", "%.0f a second, p50 %.0f us, p99 %.0f us", live.get("round-robin-per-second"),
        live.get("round-robin-p50-us"), live.get("round-robin-p99-us"));
    bound("deriving signs and numbers anew from the log; judging is a small part");
  }

  private static void ratios(Map<String, List<Double>> judged) {
    double plain = median(judged.get(WAYS[0]));
    double engine = median(judged.get(WAYS[1]));
    double quick = median(judged.get(WAYS[2]));
    head("Judging alone: the same 20 rules by hand, by the engine, and by the engine with the short cut; results equal at every line");
    row("by hand", "%.2f us", plain);
    row("by the engine", "%.2f us: %.2f of the speed by hand (goal 0.1), %.1f times its time", engine, plain / engine, engine / plain);
    row("with the short cut", "%.2f us: %.2f of the speed by hand (goal 0.3), %.1f times its time", quick, plain / quick, quick / plain);
    bound("without the short cut the engine's insert, delete and fire; with it one comparison of every sign with the one before");
  }

  private static void memory(Map<String, Double> live) {
    double lines = live.get("kilobytes-of-its-log");
    double rig = live.get("kilobytes-a-rig");
    head("Memory after collection, and collections (serial collector, 1 GB)");
    row("a live rig", "%.0f KB besides its log (goal 100), %.0f KB with a whole log of its own", rig, rig + lines);
    row("longest collection", "%.0f ms, with 1,000 rigs live", live.get("longest-collection-ms"));
    bound("not broken down here: the engine's session, the signs with their evidence, the last two judgements, the last numbers");
  }

  private static void coldStart() throws IOException, InterruptedException {
    List<String> inspect = List.of(LAUNCHER.toString(), "inspect", Material.RIG.toString());
    String classes = Path.of("target", "test-classes").toString();
    List<String> hello = Processes.java("-cp", classes, Hello.class.getName());
    Processes.milliseconds(inspect); // the first run leaves the archive of classes
    List<List<Double>> times = Processes.byTurns(STARTS, List.of(hello, inspect));
    head("Cold start by whole processes, " + STARTS + " rounds by turns: least, median");
    row("a bare Java hello", "%.0f ms, %.0f ms", times.get(0).get(0), median(times.get(0)));
    row("stillwarden inspect", "%.0f ms, %.0f ms: %.1f and %.1f times (goal 3)", times.get(1).get(0), median(times.get(1)),
        times.get(1).get(0) / times.get(0).get(0), median(times.get(1)) / median(times.get(0)));
    bound("the start of the rule engine, of the readers and of the numbers, most of it in code not yet compiled by the JVM");
  }

  private static double median(List<Double> some) {
    List<Double> sorted = new ArrayList<>(some);
    Collections.sort(sorted);
    return sorted.get(sorted.size() / 2);
  }

  private static void head(String text) {
    System.out.println("\n" + text);
  }

  private static void row(String what, String format, Object... values) {
    System.out.println(String.format(Locale.ROOT, "  %-32s", what) + String.format(Locale.ROOT, format, values));
  }

  private static void bound(String by) {
    row("bounded by", "%s", by);
  }
}
