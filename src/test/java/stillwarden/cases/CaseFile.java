package stillwarden.cases;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import tools.jackson.databind.ObjectMapper;
import tools.jackson.dataformat.yaml.YAMLMapper;

/** Reads the cases beside the rules. */
final class CaseFile {
  static final ObjectMapper YAML = YAMLMapper.builder().build();
  private static final List<String> KEYS =
      List.of("case", "rig", "policy", "log", "silent", "fires", "verdict", "actions", "never", "ban", "ask", "first");

  private CaseFile() {}

  /** One case: a sentence, what differs from a good rig or run, what is expected. */
  record Case(String hazard, Map<String, Object> keys) {
    String title() {
      return hazard + ": " + keys.get("case");
    }

    @SuppressWarnings("unchecked")
    List<String> list(String key) {
      Object v = keys.get(key);
      return v == null ? List.of() : ((List<Object>) v).stream().map(Object::toString).toList();
    }

    @SuppressWarnings("unchecked")
    Map<String, Object> map(String key) {
      Object v = keys.get(key);
      return v == null ? Map.of() : (Map<String, Object>) v;
    }

    boolean has(String key) {
      return keys.containsKey(key);
    }

    String word(String key) {
      Object v = keys.get(key);
      return v == null ? "" : v.toString();
    }
  }

  static List<Case> all() {
    List<Case> out = new ArrayList<>();
    try (Stream<Path> files = Files.walk(Path.of("rules", "hazards"), 3)) {
      for (Path f : files.filter(p -> p.endsWith("cases.yaml")).sorted().toList()) {
        String hazard = f.getParent().getFileName().toString();
        for (Object c : YAML.readValue(Files.readString(f), List.class)) {
          out.add(of(hazard, c));
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return out;
  }

  private static Case of(String hazard, Object raw) {
    Map<String, Object> keys = new LinkedHashMap<>();
    ((Map<?, ?>) raw).forEach((k, v) -> keys.put(k.toString(), v));
    List<String> unknown = keys.keySet().stream().filter(k -> !KEYS.contains(k)).toList();
    if (!unknown.isEmpty()) {
      throw new IllegalArgumentException(hazard + ": a case has unknown keys " + unknown);
    }
    return new Case(hazard, keys);
  }
}
