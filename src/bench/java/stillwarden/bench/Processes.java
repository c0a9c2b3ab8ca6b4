package stillwarden.bench;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Whole processes: their output, and how long they take from call to exit. */
final class Processes {
  private static final String JAVA = Path.of(System.getProperty("java.home"), "bin", "java").toString();

  private Processes() {}

  static List<String> java(String... optionsAndClass) {
    List<String> out = new ArrayList<>(List.of(JAVA));
    out.addAll(Arrays.asList(optionsAndClass));
    return out;
  }

  /** Lines {@code name=value} of a process. */
  static Map<String, Double> figures(List<String> command) throws IOException, InterruptedException {
    Process p = new ProcessBuilder(command).redirectError(ProcessBuilder.Redirect.INHERIT).start();
    Map<String, Double> out = new HashMap<>();
    new String(p.getInputStream().readAllBytes(), java.nio.charset.StandardCharsets.UTF_8).lines().map(l -> l.split("="))
        .forEach(l -> out.put(l[0], Double.valueOf(l[1])));
    if (p.waitFor() != 0) {
      throw new IllegalStateException("`" + command + "` failed");
    }
    return out;
  }

  /** Milliseconds of each command, by turns. */
  static List<List<Double>> byTurns(int rounds, List<List<String>> commands) throws IOException, InterruptedException {
    List<List<Double>> out = new ArrayList<>();
    commands.forEach(c -> out.add(new ArrayList<>()));
    for (int r = 0; r < rounds; r++) {
      for (int i = 0; i < commands.size(); i++) {
        out.get(i).add(milliseconds(commands.get(i)));
      }
    }
    out.forEach(Collections::sort);
    return out;
  }

  static double milliseconds(List<String> command) throws IOException, InterruptedException {
    long start = System.nanoTime();
    Process p = new ProcessBuilder(command).redirectErrorStream(true).redirectOutput(ProcessBuilder.Redirect.DISCARD).start();
    int status = p.waitFor();
    if (status > 1) {
      throw new IllegalStateException("`" + command + "` ended with " + status);
    }
    return (System.nanoTime() - start) / 1e6;
  }
}
