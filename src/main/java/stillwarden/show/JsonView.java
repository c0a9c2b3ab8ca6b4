package stillwarden.show;

import java.util.List;
import java.util.Optional;
import stillwarden.derive.Estimate;
import stillwarden.describe.Defect;
import stillwarden.order.Advice;

/** The answer as JSON, `stillwarden/advice/1`: member names and order as in the printed schema `advice`. */
public final class JsonView {
  private JsonView() {}

  /** One rig's answer, or what makes its file unusable. */
  public record Item(String file, Optional<Advice> advice, List<Defect> unusable) {}

  /** Over several indented lines. */
  public static String of(Advice advice) {
    JsonOut out = new JsonOut(true);
    advice(out, advice);
    return out.done();
  }

  /** On one line, for a stream of answers. */
  public static String line(Advice advice) {
    JsonOut out = new JsonOut(false);
    advice(out, advice);
    return out.done();
  }

  /** Several rigs, in the order given. */
  public static String of(List<Item> items) {
    JsonOut out = new JsonOut(true);
    out.array(items, i -> item(out, i));
    return out.done();
  }

  private static void item(JsonOut out, Item i) {
    if (i.advice().isPresent()) {
      advice(out, i.advice().get());
    } else {
      out.object(o -> o.put("file", i.file()).words("unusable", i.unusable().stream().map(Defect::toString).toList()));
    }
  }

  private static void advice(JsonOut out, Advice a) {
    out.object(o -> {
      o.put("format", "stillwarden/advice/1").put("rig", a.rig()).putOrNull("at", a.at());
      o.put("stage", a.stage()).put("verdict", a.verdict());
      o.array("actions", a.actions(), x -> action(o, x)).put("more", a.more());
      o.array("do-not", a.doNot(), b -> ban(o, b)).array("ask", a.ask(), q -> question(o, q));
      o.array("numbers", a.numbers(), n -> number(o, n)).array("to-start", a.toStart(), t -> toStart(o, t));
      if (a.gateItems() > 0) {
        o.object("gate", g -> g.put("looked-at", a.lookedAt()).put("items", a.gateItems()));
      }
      o.someWords("waivers", a.waivers()).someWords("notes", a.notes());
      o.words("left-out", a.leftOut()).put("defers-to", a.defersTo());
    });
  }

  private static void action(JsonOut out, Advice.Action a) {
    out.object(o -> o
        .put("order", a.order()).put("do", a.act()).putIfAny("part", a.part()).put("say", a.say())
        .put("signal", a.signal()).putIfAny("within", a.within()).put("state", a.state()).putIfAny("if", a.iff().orElse(""))
        .array("because", a.because(), b -> because(o, b))
        .words("cautions", a.cautions()).put("done-when", a.doneWhen()));
  }

  private static void because(JsonOut out, Advice.Because b) {
    out.object(o -> o.put("rule", b.rule()).put("hazard", b.hazard()).words("facts", b.facts()).put("source", b.source()));
  }

  private static void ban(JsonOut out, Advice.Ban b) {
    out.object(o -> o.put("do", b.act()).put("say", b.say()).putIfAny("until", b.until()).words("because", b.because()));
  }

  private static void question(JsonOut out, Advice.Question q) {
    out.object(o -> o.put("about", q.about()).put("say", q.say()).putIfAny("within", q.within()).words("unlocks", q.unlocks()));
  }

  private static void toStart(JsonOut out, Advice.ToStart t) {
    out.object(o -> o.put("about", t.about()).put("to", t.to()).put("why", t.why()));
  }

  /** Without a value the number stays in its place: null, and the reason. */
  static void number(JsonOut out, Estimate e) {
    out.object(o -> {
      o.put("name", e.name());
      if (!e.known()) {
        o.putNull("value").put("reason", e.reason()).someWords("missing", e.missing());
        return;
      }
      if (Figures.isWord(e)) {
        o.put("value", e.method()).put("method", String.join("; ", e.notes())).put("source", e.source());
        return;
      }
      o.put("value", Figures.ucum(e.nominal(), e.unit())).put("low", Figures.ucum(e.low(), e.unit()));
      o.put("high", Figures.ucum(e.high(), e.unit())).put("method", e.method()).put("source", e.source());
      o.someWords("notes", e.notes());
    });
  }
}
