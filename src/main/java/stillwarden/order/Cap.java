package stillwarden.order;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;

/**
 * At most so many steps at once. What is told elsewhere gives its place to what is not: first looks that stand among the
 * questions, then paper, cold work far behind the wait, and the people steps that ride on the first deed as cautions.
 */
final class Cap {
  private Cap() {}

  static List<Advice.Action> most(int most, List<Advice.Action> all, List<Advice.Question> asked) {
    List<Advice.Action> out = new ArrayList<>(all);
    List<Predicate<Advice.Action>> yielding = List.of(
        a -> look(a) && asked.stream().anyMatch(q -> a.act().endsWith(subject(q))),
        a -> Deeds.of(a.act()).kind().equals("paper"),
        a -> Deeds.of(a.act()).cold(),
        Cap::look,
        a -> a.act().equals("stand-clear"),
        a -> a.act().equals("warn-people"));
    // the first is never given up: it carries the cautions
    yielding.forEach(y -> {
      for (int i = out.size() - 1; i > 0 && out.size() > most; i--) {
        if (y.test(out.get(i))) {
          out.remove(i);
        }
      }
    });
    return renumbered(out.subList(0, Math.min(most, out.size())));
  }

  private static boolean look(Advice.Action a) {
    return Deeds.of(a.act()).kind().equals("look");
  }

  /** {@code flask-level} is what {@code verify-level} looks at. */
  private static String subject(Advice.Question q) {
    return q.about().substring(q.about().lastIndexOf('-') + 1);
  }

  private static List<Advice.Action> renumbered(List<Advice.Action> some) {
    List<Advice.Action> out = new ArrayList<>();
    for (Advice.Action a : some) {
      out.add(new Advice.Action(out.size() + 1, a.act(), a.part(), a.say(), a.signal(), a.within(), a.state(), a.iff(), a.because(), a.cautions(), a.doneWhen()));
    }
    return List.copyOf(out);
  }
}
