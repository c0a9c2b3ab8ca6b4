package stillwarden.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RigReader;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;

/** From a rig that may not start to one that may: by answering what is asked, and by making the changes that are named. */
class WayToStartTest {
  private static final Pattern JOINT = Pattern.compile("joints\\[(\\d+)\\](?:\\.(.+))?");
  /** A poisonous or reactive charge has no change that makes it fit to start but another charge or a written approval. */
  private static final Set<String> NO_CHANGE = Set.of("charge-makes-toxic-gas", "charge-reacts-water", "part-unknown", "claisen-missing", "claisen-layout-wrong");

  @TempDir
  Path folder;

  @Test
  void anEmptyRigEndsInStartWhenItsQuestionsAreAnsweredOneByOne() throws Exception {
    Map<String, Object> good = yaml(Bench.GOOD);
    Map<String, Object> rig = new LinkedHashMap<>(Map.of("format", "stillwarden/rig/1", "name", "empty", "method", "in-flask"));
    Set<String> asked = new LinkedHashSet<>();
    for (int i = 0; i < 300; i++) {
      Advice a = inspect(rig);
      if (a.verdict().equals("start")) {
        System.out.println("an empty rig reaches start after " + asked.size() + " answers");
        assertThat(asked.size()).isGreaterThan(40);
        return;
      }
      List<String> open = a.ask().stream().map(Advice.Question::about).filter(q -> !asked.contains(q)).toList();
      assertThat(open).as("still not-yet, and nothing new to answer; asked last: " + a.ask().stream().map(Advice.Question::about).toList() + " because of "
          + a.actions().stream().map(x -> x.because().toString()).toList()).isNotEmpty();
      asked.add(open.get(0));
      answer(rig, good, open.get(0));
    }
    assertThat(asked).as("questions without end").isEmpty();
  }

  @TestFactory
  Stream<DynamicTest> theNamedChangesTogetherGiveStart() {
    return CaseFile.all().stream()
        .filter(c -> !c.has("log") && c.word("fires").equals("yes") && !NO_CHANGE.contains(c.hazard()) && c.map("rig").keySet().stream().noneMatch(k -> k.equals("joints") || k.equals("charge.plant")))
        .map(c -> DynamicTest.dynamicTest(c.title(), () -> changed(c)));
  }

  private void changed(CaseFile.Case c) throws Exception {
    Bench.rig(c.map("rig"), folder);
    Map<String, Object> tree = yaml(folder.resolve("case.rig.yaml"));
    Policy policy = Bench.policy(c.map("policy"), folder);
    List<String> history = new ArrayList<>();
    // a change may bring out what it hid: a few rounds, each making everything that is named
    for (int round = 0; round < 4; round++) {
      Advice a = inspect(tree, policy);
      if (a.verdict().equals("start") || !a.verdict().equals("not-yet")) {
        return;
      }
      history.add(a.toStart().toString());
      boolean onlyUnknown = a.toStart().isEmpty() && !a.ask().isEmpty();
      if (onlyUnknown) {
        return;
      }
      a.toStart().forEach(t -> set(tree, t.about(), t.to()));
    }
    Advice last = inspect(tree, policy);
    assertThat(last.verdict()).as("after " + history + ": " + last.actions().stream().map(x -> x.because().toString()).toList() + last.ask()).isEqualTo("start");
  }

  private Advice inspect(Map<String, Object> tree) throws Exception {
    return inspect(tree, Policy.NONE);
  }

  private Advice inspect(Map<String, Object> tree, Policy policy) throws Exception {
    Path file = folder.resolve("way.rig.yaml");
    Files.writeString(file, CaseFile.YAML.writeValueAsString(tree));
    Rig rig = RigReader.read(file);
    return Advisor.inspect(rig, policy, Optional.empty());
  }

  @SuppressWarnings("unchecked")
  private static Map<String, Object> yaml(Path file) throws Exception {
    return CaseFile.YAML.readValue(Files.readString(file), Map.class);
  }

  /** The answer that the good rig's file would give. */
  private static void answer(Map<String, Object> rig, Map<String, Object> good, String about) {
    Object value = get(good, about);
    if (value != null) {
      set(rig, about, value);
    }
  }

  private static final Set<String> TOP = Set.of("place", "charge", "target", "people", "emergency", "seen", "nothing-else", "joints", "openings");

  @SuppressWarnings("unchecked")
  private static Object get(Map<String, Object> tree, String path) {
    Matcher j = JOINT.matcher(path);
    if (j.matches()) {
      Object one = ((List<Object>) tree.get("joints")).get(Integer.parseInt(j.group(1)));
      return j.group(2) == null ? one : ((Map<String, Object>) one).get(j.group(2));
    }
    Object at = TOP.contains(path.split("\\.")[0]) ? tree : tree.get("parts");
    for (String step : path.split("\\.")) {
      at = at instanceof Map<?, ?> m ? m.get(step) : null;
    }
    return at;
  }

  @SuppressWarnings("unchecked")
  private static void set(Map<String, Object> tree, String path, Object value) {
    Matcher j = JOINT.matcher(path);
    if (j.matches()) {
      ((Map<String, Object>) ((List<Object>) tree.get("joints")).get(Integer.parseInt(j.group(1)))).put(j.group(2), value);
      return;
    }
    if (path.startsWith("openings.")) {
      ((Map<String, Object>) tree.computeIfAbsent("openings", k -> new LinkedHashMap<>())).put(path.substring(9), value);
      return;
    }
    String[] steps = path.split("\\.");
    Map<String, Object> at = TOP.contains(steps[0]) ? tree : (Map<String, Object>) tree.computeIfAbsent("parts", k -> new LinkedHashMap<>());
    for (int i = 0; i < steps.length - 1; i++) {
      at = (Map<String, Object>) at.computeIfAbsent(steps[i], k -> new LinkedHashMap<>());
    }
    at.put(steps[steps.length - 1], value);
  }
}
