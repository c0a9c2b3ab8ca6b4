package stillwarden.describe;

import java.util.ArrayList;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.NoSuchElementException;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.events.CollectionStartEvent;
import org.snakeyaml.engine.v2.events.DocumentStartEvent;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.events.MappingStartEvent;
import org.snakeyaml.engine.v2.events.NodeEvent;
import org.snakeyaml.engine.v2.events.ScalarEvent;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;

/**
 * YAML to {@link Node}, event by event, because everything that makes a YAML file mean something else than it says
 * (aliases, anchors, merge keys, tags, a second document, a repeated key) can only be refused there.
 */
final class YamlSource {
  /** What the parser says, and what it means to somebody who writes a rig file; the first that fits. */
  private static final Map<String, String> WORDINGS = wordings();

  private final String file;
  private final Limits limits;
  private final Defects defects;
  private final Iterator<Event> events;

  private YamlSource(String file, String text, Limits limits, Defects defects) {
    this.file = file;
    this.limits = limits;
    this.defects = defects;
    LoadSettings settings = LoadSettings.builder().setLabel(file).setAllowDuplicateKeys(true).setParseComments(false).build();
    events = new Parse(settings).parseString(text).iterator();
  }

  private static Map<String, String> wordings() {
    Map<String, String> out = new LinkedHashMap<>();
    out.put("TAB", "a tab where spaces are wanted");
    out.put("\\t", "a tab where spaces are wanted");
    out.put("mapping values are not allowed", "a `:` where none can be; put the value in quotes if the colon belongs to it");
    out.put("quoted scalar", "a quote is not closed");
    out.put("expected <block end>", "the indentation does not fit the lines above");
    out.put("flow mapping", "a `,` or a closing `}` is missing");
    out.put("flow sequence", "a `,` or a closing `]` is missing");
    out.put("could not find expected ':'", "a `:` is missing after a key");
    out.put("cannot start any token", "a value begins with a character that YAML keeps for itself; put it in quotes");
    out.put("special characters are not allowed", "a character that can't be printed");
    return out;
  }

  /** The one document of the text; what is wrong but leaves it readable goes to {@code defects}. */
  static Node read(String file, String text, Limits limits, Defects defects) throws Unusable {
    try {
      return new YamlSource(file, text, limits, defects).document();
    } catch (MarkedYamlEngineException e) {
      defects.add(spot(file, e.getProblemMark().or(e::getContextMark)), "is not YAML: " + wording(e));
    } catch (YamlEngineException | NoSuchElementException e) {
      defects.add(Spot.of(file), "is not YAML");
    }
    throw defects.unusable();
  }

  private static String wording(MarkedYamlEngineException e) {
    String problem = (e.getContext() + " " + e.getProblem()).replaceAll("\\s+", " ");
    return WORDINGS.entrySet().stream().filter(w -> problem.contains(w.getKey())).map(Map.Entry::getValue).findFirst()
        .orElse(Words.quote(String.valueOf(e.getProblem())).replace("`", "").toLowerCase(Locale.ROOT));
  }

  private Node document() throws Unusable {
    Event e = events.next();
    while (!(e instanceof DocumentStartEvent)) {
      if (!events.hasNext()) {
        throw new Unusable(Spot.of(file), "is empty");
      }
      e = events.next();
    }
    DocumentStartEvent start = (DocumentStartEvent) e;
    if (start.getSpecVersion().isPresent() || !start.getTags().isEmpty()) {
      defects.add(spot(e), "a `%` line has no place here");
    }
    Node root = node(events.next(), 1);
    events.next();
    if (events.next() instanceof DocumentStartEvent second) {
      defects.add(spot(second), "a second document begins here; one file holds one");
    }
    return root;
  }

  private Node node(Event e, int depth) throws Unusable {
    limits.depth(depth, spot(e));
    refuseMagic(e);
    if (e instanceof ScalarEvent s) {
      limits.string(s.getValue(), spot(e));
      return s.isPlain() ? Node.plain(s.getValue(), spot(e)) : Node.scalar(quoted(s), s.getValue(), spot(e));
    }
    if (e instanceof CollectionStartEvent c) {
      return c instanceof MappingStartEvent ? map(c, depth) : list(c, depth);
    }
    return Node.scalar(Node.Kind.WORD, "", spot(e));
  }

  private static Node.Kind quoted(ScalarEvent s) {
    return s.getValue().isBlank() ? Node.Kind.EMPTY : Node.Kind.QUOTED;
  }

  private void refuseMagic(Event e) {
    if (e.getEventId() == Event.ID.Alias) {
      defects.add(spot(e), "an alias (`*`) has no place here: write the value out");
      return;
    }
    if (e instanceof NodeEvent n && n.getAnchor().isPresent()) {
      defects.add(spot(e), "an anchor (`&`) has no place here: remove it");
    }
    Optional<String> tag = e instanceof ScalarEvent s ? s.getTag() : e instanceof CollectionStartEvent c ? c.getTag() : Optional.empty();
    if (tag.isPresent()) {
      defects.add(spot(e), "a tag (`!`) has no place here: remove it");
    }
  }

  private Node map(CollectionStartEvent start, int depth) throws Unusable {
    List<Node.Field> fields = new ArrayList<>();
    for (Event e = events.next(); e.getEventId() != Event.ID.MappingEnd; e = events.next()) {
      Node key = node(e, depth + 1);
      Node value = node(events.next(), depth + 1);
      Fields.add(fields, key, value, start.isFlow(), defects);
      limits.entries(fields.size(), spot(start));
    }
    return Node.map(List.copyOf(fields), spot(start), start.isFlow());
  }

  private Node list(CollectionStartEvent start, int depth) throws Unusable {
    List<Node> items = new ArrayList<>();
    for (Event e = events.next(); e.getEventId() != Event.ID.SequenceEnd; e = events.next()) {
      items.add(node(e, depth + 1));
      limits.entries(items.size(), spot(start));
    }
    return Node.list(List.copyOf(items), spot(start), start.isFlow());
  }

  private Spot spot(Event e) {
    return spot(file, e.getStartMark());
  }

  private static Spot spot(String file, Optional<org.snakeyaml.engine.v2.exceptions.Mark> mark) {
    return mark.map(m -> new Spot(file, m.getLine() + 1, m.getColumn() + 1)).orElse(Spot.of(file));
  }
}
