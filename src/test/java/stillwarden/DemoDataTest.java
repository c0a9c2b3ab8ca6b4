package stillwarden;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import stillwarden.cli.InProcess;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/**
 * The demo data and the answers printed for them: what stands in {@code demo-data/expected} is what the program prints, byte for byte.
 *
 * <p>{@code -Dstillwarden.rewrite=true} writes the answers anew instead of comparing them; what changed is then read before it is committed.
 */
class DemoDataTest {
  private static final Path DEMO = Path.of("demo-data");
  private static final Path EXPECTED = DEMO.resolve("expected");
  private static final boolean REWRITE = Boolean.getBoolean("stillwarden.rewrite");

  /** Rigs that are right: nothing is found against starting, and the plan is printed too. */
  private static final List<String> CORRECT = List.of("fennel-bench", "caraway-long", "clove-bench", "eucalyptus-high");

  /** Rigs that are worth reading under a site's policy as well. */
  private static final List<String> UNDER_POLICY = List.of("fixed-heater+lower-mill", "fixed-heater+upper-mill", "aniseed-cold-water+lower-mill");

  /** One call of the program and the name of its answer, without the ending. */
  private record Call(String answer, List<String> words) {}

  @TestFactory
  Stream<DynamicTest> everyAnswerIsPrintedAsItStands() throws IOException {
    return calls().stream().flatMap(c -> Stream.of("text", "json").map(f -> DynamicTest.dynamicTest(c.answer() + " " + f, () -> compare(c, f))));
  }

  @Test
  void nothingStandsThereThatNobodyPrints() throws IOException {
    Set<String> wanted = new TreeSet<>();
    calls().forEach(c -> wanted.addAll(List.of(c.answer() + ".txt", c.answer() + ".json")));
    assertThat(wanted).hasSize(2 * calls().size());
    assertThat(names("expected", "")).containsExactlyInAnyOrderElementsOf(wanted);
  }

  @Test
  void theCorrectRigsMayStart() {
    for (String stem : CORRECT) {
      assertThat(InProcess.run("inspect", rig(stem)).status()).as(stem).isZero();
    }
  }

  @Test
  void everyOtherRigIsHeld() throws IOException {
    for (String stem : stems("rigs", ".rig.yaml")) {
      assertThat(InProcess.run("inspect", rig(stem)).status()).as(stem).isEqualTo(CORRECT.contains(stem) ? 0 : 1);
    }
  }

  @Test
  void everyFileHasItsLineInTheReadme() throws IOException {
    String readme = Files.readString(DEMO.resolve("README.md"), StandardCharsets.UTF_8);
    for (String folder : List.of("rigs", "policies", "runs")) {
      for (String name : names(folder, "")) {
        assertThat(readme).contains("`" + name.replaceFirst("\\.(rig|policy|run)\\..*", "") + "`");
      }
    }
  }

  private static void compare(Call call, String format) throws IOException {
    List<String> words = new ArrayList<>(call.words());
    words.addAll(List.of("--format", format));
    InProcess.Result said = InProcess.run(words.toArray(String[]::new));
    assertThat(said.status()).as(said.err()).isLessThan(2);
    Path file = EXPECTED.resolve(call.answer() + (format.equals("json") ? ".json" : ".txt"));
    if (REWRITE) {
      Files.createDirectories(EXPECTED);
      Files.writeString(file, said.out(), StandardCharsets.UTF_8);
    }
    assertThat(said.out()).isEqualTo(Files.readString(file, StandardCharsets.UTF_8));
  }

  private static List<Call> calls() throws IOException {
    List<Call> out = new ArrayList<>();
    stems("rigs", ".rig.yaml").forEach(s -> out.add(new Call(s, List.of("inspect", rig(s)))));
    CORRECT.forEach(s -> out.add(new Call(s + ".plan", List.of("plan", rig(s)))));
    UNDER_POLICY.forEach(s -> out.add(underPolicy(s)));
    for (String s : stems("runs", ".run.jsonl")) {
      Path log = DEMO.resolve("runs").resolve(s + ".run.jsonl");
      out.add(new Call(s, List.of("advise", rigOf(log), log.toString())));
    }
    return out;
  }

  private static Call underPolicy(String pair) {
    String[] names = pair.split("\\+");
    return new Call(pair, List.of("inspect", rig(names[0]), "--policy", DEMO.resolve("policies").resolve(names[1] + ".policy.yaml").toString()));
  }

  /** The rig that a log names in its first line, as a path from where the log stands. */
  private static String rigOf(Path log) throws IOException {
    JsonNode header = JsonMapper.shared().readTree(Files.readAllLines(log, StandardCharsets.UTF_8).get(0));
    return log.resolveSibling(header.get("rig").asString()).normalize().toString();
  }

  private static String rig(String stem) {
    return DEMO.resolve("rigs").resolve(stem + ".rig.yaml").toString();
  }

  private static List<String> stems(String folder, String ending) throws IOException {
    return names(folder, ending).stream().map(n -> n.substring(0, n.length() - ending.length())).toList();
  }

  private static List<String> names(String folder, String ending) throws IOException {
    try (Stream<Path> files = Files.list(DEMO.resolve(folder))) {
      return files.map(p -> p.getFileName().toString()).filter(n -> n.endsWith(ending)).sorted().toList();
    }
  }
}
