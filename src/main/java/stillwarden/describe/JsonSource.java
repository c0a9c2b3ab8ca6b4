package stillwarden.describe;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;
import tools.jackson.core.ObjectReadContext;
import tools.jackson.core.StreamReadConstraints;
import tools.jackson.core.TokenStreamLocation;
import tools.jackson.core.json.JsonFactory;

/** JSON to {@link Node}: strict JSON only, one value, numbers as written. */
final class JsonSource {
  /** Depth and string length are checked here as well, with words of ours; these are the net under them. */
  private static final JsonFactory FACTORY = JsonFactory.builder()
      .streamReadConstraints(StreamReadConstraints.builder().maxNestingDepth(64).maxStringLength(64 * 1024).maxNumberLength(100).build())
      .build();

  private static final Pattern CHARACTER = Pattern.compile("^Unexpected character \\('(.)'");
  private static final Pattern TOKEN = Pattern.compile("^(?:Unrecognized|Non-standard) token '([^']*)'");

  private final String file;
  private final int firstLine;
  private final Limits limits;
  private final Defects defects;
  private final JsonParser parser;

  private JsonSource(String file, int firstLine, JsonParser parser, Limits limits, Defects defects) {
    this.file = file;
    this.firstLine = firstLine;
    this.parser = parser;
    this.limits = limits;
    this.defects = defects;
  }

  /** @param firstLine line of the file where the text begins, from 1 */
  static Node read(String file, int firstLine, String text, Limits limits, Defects defects) throws Unusable {
    if (text.isBlank()) {
      throw new Unusable(new Spot(file, firstLine, 0), "is empty");
    }
    try (JsonParser p = FACTORY.createParser(ObjectReadContext.empty(), text)) {
      return new JsonSource(file, firstLine, p, limits, defects).document();
    } catch (JacksonException e) {
      TokenStreamLocation at = e.getLocation();
      Spot spot = at == null ? Spot.of(file) : new Spot(file, firstLine + at.getLineNr() - 1, Math.max(at.getColumnNr(), 0));
      defects.add(spot, "is not JSON: " + wording(e));
      throw defects.unusable();
    }
  }

  /** The parser's message in our words where it is one of the usual ones; always lower case and on one line. */
  private static String wording(JacksonException e) {
    String said = e.getOriginalMessage().replaceAll("\\s+", " ");
    Matcher character = CHARACTER.matcher(said);
    Matcher token = TOKEN.matcher(said);
    if (said.contains("end-of-input")) {
      return "it ends too early";
    }
    if (character.find()) {
      return Words.quote(character.group(1)) + " can't stand here" + (said.contains("double-quote") ? "; keys stand in double quotes" : "");
    }
    if (token.find()) {
      return Words.quote(token.group(1)) + " is no JSON value; words stand in double quotes";
    }
    return Words.quote(said.replaceAll("\\(.*", "").strip()).replace("`", "").toLowerCase(Locale.ROOT);
  }

  private Node document() throws Unusable {
    parser.nextToken();
    Node root = node(1);
    if (parser.nextToken() != null) {
      defects.add(spot(), "something follows the end of the JSON value");
    }
    return root;
  }

  private Node node(int depth) throws Unusable {
    Spot spot = spot();
    limits.depth(depth, spot);
    return switch (parser.currentToken()) {
      case START_OBJECT -> map(spot, depth);
      case START_ARRAY -> list(spot, depth);
      case VALUE_STRING -> string(spot);
      case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> Node.scalar(Node.Kind.NUMBER, parser.getString(), spot);
      case VALUE_TRUE -> Node.scalar(Node.Kind.TRUE, "true", spot);
      case VALUE_FALSE -> Node.scalar(Node.Kind.FALSE, "false", spot);
      default -> Node.scalar(Node.Kind.EMPTY, "null", spot);
    };
  }

  private Node string(Spot spot) throws Unusable {
    String text = parser.getString();
    limits.string(text, spot);
    return Node.scalar(text.isBlank() ? Node.Kind.EMPTY : Node.Kind.QUOTED, text, spot);
  }

  private Node map(Spot spot, int depth) throws Unusable {
    List<Node.Field> fields = new ArrayList<>();
    while (parser.nextToken() != JsonToken.END_OBJECT) {
      Node key = Node.scalar(Node.Kind.QUOTED, parser.currentName(), spot());
      limits.string(key.text(), key.spot());
      parser.nextToken();
      Fields.add(fields, key, node(depth + 1), false, defects);
      limits.entries(fields.size(), spot);
    }
    return Node.map(List.copyOf(fields), spot, false);
  }

  private Node list(Spot spot, int depth) throws Unusable {
    List<Node> items = new ArrayList<>();
    while (parser.nextToken() != JsonToken.END_ARRAY) {
      items.add(node(depth + 1));
      limits.entries(items.size(), spot);
    }
    return Node.list(List.copyOf(items), spot, false);
  }

  private Spot spot() {
    TokenStreamLocation at = parser.currentTokenLocation();
    return new Spot(file, firstLine + at.getLineNr() - 1, at.getColumnNr());
  }
}
