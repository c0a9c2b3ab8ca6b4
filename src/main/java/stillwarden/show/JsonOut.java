package stillwarden.show;

import java.io.StringWriter;
import java.math.BigDecimal;
import java.time.Duration;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import tools.jackson.core.JsonGenerator;
import tools.jackson.core.ObjectWriteContext;
import tools.jackson.core.PrettyPrinter;
import tools.jackson.core.json.JsonFactory;
import tools.jackson.core.util.DefaultIndenter;
import tools.jackson.core.util.DefaultPrettyPrinter;
import tools.jackson.core.util.Separators;

/** Writes JSON member by member: same calls, same bytes, on any machine (line feeds only, members in the order of the calls). */
final class JsonOut {
  private static final JsonFactory FACTORY = new JsonFactory();

  private final StringWriter text = new StringWriter();
  private final JsonGenerator g;

  /** @param pretty indented by two spaces over several lines; else one line, as JSON Lines want it */
  JsonOut(boolean pretty) {
    g = FACTORY.createGenerator(pretty ? new Indented() : ObjectWriteContext.empty(), text);
  }

  /** The finished text, ending in one line feed. */
  String done() {
    g.close();
    return text + "\n";
  }

  JsonOut object(Consumer<JsonOut> members) {
    g.writeStartObject();
    members.accept(this);
    g.writeEndObject();
    return this;
  }

  JsonOut object(String name, Consumer<JsonOut> members) {
    g.writeName(name);
    return object(members);
  }

  <T> JsonOut array(List<T> items, Consumer<T> each) {
    g.writeStartArray();
    items.forEach(each);
    g.writeEndArray();
    return this;
  }

  <T> JsonOut array(String name, List<T> items, Consumer<T> each) {
    g.writeName(name);
    return array(items, each);
  }

  JsonOut words(String name, List<String> words) {
    return array(name, words, g::writeString);
  }

  JsonOut numbers(String name, List<BigDecimal> numbers) {
    return array(name, numbers, g::writeNumber);
  }

  /** Left out when there are none. */
  JsonOut someWords(String name, List<String> words) {
    return words.isEmpty() ? this : words(name, words);
  }

  JsonOut put(String name, String value) {
    g.writeStringProperty(name, value);
    return this;
  }

  JsonOut put(String name, int value) {
    g.writeName(name);
    g.writeNumber(value);
    return this;
  }

  /** Left out when empty: an absent member says "none". */
  JsonOut putIfAny(String name, String value) {
    return value.isEmpty() ? this : put(name, value);
  }

  JsonOut putIfAny(String name, Optional<Duration> value) {
    return putIfAny(name, value.map(Duration::toString).orElse(""));
  }

  JsonOut putOrNull(String name, String value) {
    return value.isEmpty() ? putNull(name) : put(name, value);
  }

  JsonOut putNull(String name) {
    g.writeName(name);
    g.writeNull();
    return this;
  }

  private static final class Indented extends ObjectWriteContext.Base {
    private final PrettyPrinter printer = printer();

    private static PrettyPrinter printer() {
      Separators separators = Separators.createDefaultInstance()
          .withObjectNameValueSpacing(Separators.Spacing.AFTER)
          .withObjectEmptySeparator("").withArrayEmptySeparator("");
      DefaultIndenter twoSpaces = new DefaultIndenter("  ", "\n");
      return new DefaultPrettyPrinter(separators).withObjectIndenter(twoSpaces).withArrayIndenter(twoSpaces);
    }

    @Override
    public PrettyPrinter getPrettyPrinter() {
      return printer;
    }

    @Override
    public boolean hasPrettyPrinter() {
      return true;
    }
  }
}
