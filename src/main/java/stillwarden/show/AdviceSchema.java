package stillwarden.show;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;

/** The JSON Schema (2020-12) of the answer, as printed by {@code schema advice}. */
public final class AdviceSchema {
  private AdviceSchema() {}

  public static String text() {
    try (InputStream in = AdviceSchema.class.getResourceAsStream("advice.schema.json")) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
