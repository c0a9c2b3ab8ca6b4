package stillwarden.bench;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import stillwarden.derive.Ground;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.describe.Entry;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RigReader;
import stillwarden.describe.RunLog;
import stillwarden.describe.Unusable;

/** What is measured on: the demo rig and its ordinary run of 90 minutes, with a few upsets that pass. */
final class Material {
  static final Path RIG = Path.of("demo-data", "rigs", "fennel-bench.rig.yaml");
  private static final Path RUN = Path.of("demo-data", "runs", "nominal-90-min.run.jsonl");
  private static final String[] UPSETS = {
    "09:31:01 foam rising", "09:33:01 foam none", "09:45:01 coolant-running no", "09:46:01 coolant-running yes",
    "09:52:01 vapour-past-condenser wisps", "09:53:01 vapour-past-condenser none", "10:01:01 reservoir-level empty",
    "10:03:01 reservoir-level full", "10:10:01 smoke yes", "10:11:01 smoke no"
  };

  private Material() {}

  static Rig rig() {
    try {
      return RigReader.read(RIG);
    } catch (Unusable u) {
      throw new IllegalStateException(u);
    }
  }

  static RunLog run() {
    try {
      String text = String.join("\n", lines()) + "\n";
      RunLog log = LogReader.read(new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)), "bench");
      if (!log.leftOut().isEmpty()) {
        throw new IllegalStateException(log.leftOut().toString());
      }
      return log;
    } catch (Unusable | IOException e) {
      throw new IllegalStateException(e);
    }
  }

  private static List<String> lines() throws IOException {
    List<String> out = new ArrayList<>(Files.readAllLines(RUN).stream().filter(l -> l.contains("\"at\"")).toList());
    String day = out.get(0).replaceAll(".*\"at\":\"([^T]+)T.*", "$1");
    Stream.of(UPSETS).map(u -> u.split(" ")).forEach(u -> out.add(
        "{\"at\":\"" + day + "T" + u[0] + "Z\",\"by\":\"mr\",\"saw\":\"" + u[1] + "\",\"value\":\"" + u[2] + "\"}"));
    out.sort(Comparator.comparing(l -> OffsetDateTime.parse(l.replaceAll(".*\"at\":\"([^\"]+)\".*", "$1"))));
    return out;
  }

  /** The signs after each line. */
  static List<List<Sign>> signs(Rig rig, RunLog run) {
    Ground ground = new Ground(rig, Policy.NONE);
    List<List<Sign>> out = new ArrayList<>();
    for (int i = 0; i < run.entries().size(); i++) {
      Entry last = run.entries().get(i);
      out.add(Situation.run(ground, run.entries().subList(0, i + 1), last.at(), last.when().getOffset()).signs());
    }
    return out;
  }
}
