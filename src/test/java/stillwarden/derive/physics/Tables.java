package stillwarden.derive.physics;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** Reads the check tables beside the tests; lines with # are comments. */
final class Tables {
  private Tables() {}

  static List<String[]> rows(String name) {
    try (BufferedReader in = new BufferedReader(new InputStreamReader(Tables.class.getResourceAsStream(name), StandardCharsets.UTF_8))) {
      return in.lines().filter(l -> !l.startsWith("#")).map(l -> l.split(";", -1)).toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
