package stillwarden.describe;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import tools.jackson.databind.ObjectMapper;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.dataformat.yaml.YAMLMapper;

/** Runs when the project is built: reads {@code rules/} and {@code checklists/}, writes one JSON file a section. */
public final class Bundler {
  private static final ObjectMapper YAML = YAMLMapper.builder().build();
  private static final ObjectMapper JSON = JsonMapper.builder().build();
  private static final Pattern RULE =
      Pattern.compile("^rule\\s+\"([^\"]+)\"(.*?)^when(.*?)^then", Pattern.DOTALL | Pattern.MULTILINE);
  private static final Pattern SOURCE = Pattern.compile("@source\\(\"([^\"]*)\"\\)");
  private static final Pattern SIGN = Pattern.compile("Sign\\(\\s*about\\s*==\\s*\"([^\"]+)\"");

  private Bundler() {}

  /** @param args rules folder, checklists folder, output folder */
  public static void main(String[] args) throws IOException {
    Path rules = Path.of(args[0]);
    Path out = Files.createDirectories(Path.of(args[2]));
    Map<String, Object> sections = new LinkedHashMap<>();
    sections.put("limits", merged(rules.resolve("limits")));
    sections.put("words", byFile(rules.resolve("words")));
    sections.put("substances", byFile(rules.resolve("substances")));
    sections.put("plants", byFile(rules.resolve("plants")));
    sections.put("actions", yaml(rules.resolve("actions.yaml")));
    sections.put("groups", yaml(rules.resolve("groups.yaml")));
    sections.put("sources", yaml(rules.resolve("sources.yaml")));
    hazards(rules, sections);
    Map<String, Object> languages = new TreeMap<>();
    for (Path language : sorted(Path.of(args[1]), 1)) {
      if (Files.isDirectory(language) && !language.equals(Path.of(args[1]))) {
        languages.put(language.getFileName().toString(), byFile(language));
      }
    }
    sections.put("checklists", languages);
    for (Map.Entry<String, Object> s : sections.entrySet()) {
      Files.writeString(out.resolve(s.getKey() + ".json"), JSON.writeValueAsString(s.getValue()));
    }
  }

  private static void hazards(Path rules, Map<String, Object> sections) throws IOException {
    Map<String, Object> hazards = new TreeMap<>();
    Map<String, Object> pages = new TreeMap<>();
    for (String folder : List.of("hazards", "principles")) {
      for (Path page : sorted(rules.resolve(folder), 3)) {
        if (!page.getFileName().toString().equals("why.md")) {
          continue;
        }
        String id = page.getParent().getFileName().toString();
        String text = Files.readString(page);
        int end = text.startsWith("---\n") ? text.indexOf("\n---\n", 4) : -1;
        if (end < 0) {
          throw new IOException(page + ": wants a front matter between two lines of ---");
        }
        @SuppressWarnings("unchecked")
        Map<String, Object> front = new LinkedHashMap<>(YAML.readValue(text.substring(4, end + 1), Map.class));
        front.put("family", page.getParent().getParent().getFileName().toString());
        Path drl = page.resolveSibling("rule.drl");
        front.put("rules", Files.exists(drl) ? rulesOf(Files.readString(drl)) : List.of());
        hazards.put(id, front);
        pages.put(id, text.substring(end + 5).strip());
      }
    }
    sections.put("hazards", hazards);
    sections.put("pages", pages);
  }

  /** Name, source and the signs each rule names, read off the rule text. */
  static List<Map<String, Object>> rulesOf(String drl) {
    List<Map<String, Object>> out = new ArrayList<>();
    Matcher m = RULE.matcher(drl);
    while (m.find()) {
      Map<String, Object> r = new LinkedHashMap<>();
      r.put("name", m.group(1));
      Matcher source = SOURCE.matcher(m.group(2));
      List<String> sources = new ArrayList<>();
      while (source.find()) {
        sources.add(source.group(1));
      }
      r.put("source", sources);
      List<String> signs = new ArrayList<>();
      Matcher sign = SIGN.matcher(m.group(3));
      while (sign.find()) {
        signs.add(sign.group(1));
      }
      r.put("signs", signs);
      r.put("when", m.group(3).strip());
      out.add(r);
    }
    return out;
  }

  private static Object yaml(Path file) throws IOException {
    return Files.exists(file) ? YAML.readValue(Files.readString(file), Object.class) : Map.of();
  }

  private static Map<String, Object> byFile(Path folder) throws IOException {
    Map<String, Object> out = new TreeMap<>();
    for (Path f : sorted(folder, 2)) {
      String name = f.getFileName().toString();
      if (name.endsWith(".yaml")) {
        out.put(name.substring(0, name.length() - 5), yaml(f));
      }
    }
    return out;
  }

  private static Map<String, Object> merged(Path folder) throws IOException {
    Map<String, Object> out = new TreeMap<>();
    for (Object file : byFile(folder).values()) {
      for (Map.Entry<?, ?> e : ((Map<?, ?>) file).entrySet()) {
        if (out.put(e.getKey().toString(), e.getValue()) != null) {
          throw new IOException("rules/limits: `" + e.getKey() + "` stands twice");
        }
      }
    }
    return out;
  }

  private static List<Path> sorted(Path folder, int depth) throws IOException {
    if (!Files.isDirectory(folder)) {
      return List.of();
    }
    try (Stream<Path> s = Files.walk(folder, depth)) {
      return s.sorted().toList();
    }
  }
}
