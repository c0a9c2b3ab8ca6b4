package stillwarden.describe;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;
import tools.jackson.core.ObjectReadContext;
import tools.jackson.core.json.JsonFactory;

/**
 * The project's own rule data ({@code rules/} and {@code checklists/}), bundled to JSON when the project is built
 * (see {@link Bundler}) so that no command reads YAML of ours at run time.
 *
 * <p>Sections: {@code limits, words, actions, substances, plants, sources, hazards, pages, checklists}.
 */
public final class Knowledge {
  private static final Map<String, Tree> SECTIONS = new ConcurrentHashMap<>();

  private Knowledge() {}

  /** One section, loaded on first use. */
  public static Tree section(String name) {
    return SECTIONS.computeIfAbsent(name, Knowledge::load);
  }

  private static Tree load(String name) {
    try (InputStream in = Knowledge.class.getResourceAsStream("/stillwarden/knowledge/" + name + ".json")) {
      if (in == null) {
        throw new IllegalStateException("no bundled section `" + name + "`: was the project built with Maven?");
      }
      return readJson(in);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static Tree readJson(InputStream in) {
    try (JsonParser p = new JsonFactory().createParser(ObjectReadContext.empty(), in)) {
      p.nextToken();
      return new Tree(value(p));
    }
  }

  private static Object value(JsonParser p) {
    JsonToken t = p.currentToken();
    if (t == JsonToken.START_OBJECT) {
      Map<String, Object> m = new LinkedHashMap<>();
      while (p.nextToken() != JsonToken.END_OBJECT) {
        String key = p.currentName();
        p.nextToken();
        m.put(key, value(p));
      }
      return m;
    }
    if (t == JsonToken.START_ARRAY) {
      List<Object> l = new ArrayList<>();
      while (p.nextToken() != JsonToken.END_ARRAY) {
        l.add(value(p));
      }
      return l;
    }
    if (t == JsonToken.VALUE_NUMBER_INT || t == JsonToken.VALUE_NUMBER_FLOAT) {
      return new BigDecimal(p.getString());
    }
    return t == JsonToken.VALUE_TRUE ? Boolean.TRUE : t == JsonToken.VALUE_FALSE ? Boolean.FALSE : p.getString();
  }
}
