package stillwarden.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Defect;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.Spot;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.show.JsonView;
import stillwarden.show.TextView;

/**
 * A live run: judges again on each line as of that log's latest time, and on the machine's clock between lines. Prints
 * only what changes the person's next move.
 */
final class Follow {
  private final Desk desk;
  private final Rig rig;
  private final Policy policy;
  private final boolean json;
  private Optional<Advice> last = Optional.empty();
  private List<Defect> unusable = List.of();

  Follow(Desk desk, Rig rig, Policy policy, boolean json) {
    this.desk = desk;
    this.rig = rig;
    this.policy = policy;
    this.json = json;
  }

  /** Until the input ends; a file never does. A log without one usable line by then is unusable. */
  Exit run(String log) throws IOException, InterruptedException, Unusable {
    try (Lines lines = open(log); Live live = desk.engine().live(rig, policy, log)) {
      Lines.News news;
      do {
        news = lines.next();
        take(live, news);
      } while (news.open());
    }
    if (last.isEmpty()) {
      desk.defects(unusable);
    }
    return last.map(a -> Exit.of(a.exit())).orElse(Exit.UNUSABLE);
  }

  private Lines open(String log) throws IOException, Unusable {
    if (log.equals("-")) {
      return Lines.of(desk.in());
    }
    if (!Files.isReadable(Path.of(log)) || Files.isDirectory(Path.of(log))) {
      throw new Unusable(Spot.of(log), "want a run log that can be read");
    }
    return Lines.growing(Path.of(log));
  }

  private void take(Live live, Lines.News news) {
    boolean silent = news.text().length == 0;
    if (!silent || news.open() || last.isEmpty()) {
      judge(live, news.text(), silent && news.open() ? Optional.of(OffsetDateTime.now(desk.clock())) : Optional.empty());
    }
  }

  private void judge(Live live, byte[] text, Optional<OffsetDateTime> at) {
    try {
      live.hear(text);
      show(live.answer(at));
    } catch (Unusable u) {
      unusable = u.defects(); // the first usable line may still come
    }
  }

  private void show(Advice now) {
    if (last.isEmpty() || changed(last.get(), now)) {
      desk.answer(json ? JsonView.line(now) : TextView.of(now) + "\n");
    }
    last = Optional.of(now);
  }

  /** Ages in the reasons and numbers move all the time; what the person has to do, not do or look at is what counts. */
  static boolean changed(Advice a, Advice b) {
    return !(a.verdict().equals(b.verdict()) && a.stage().equals(b.stage())
        && deeds(a).equals(deeds(b)) && bans(a).equals(bans(b)) && asks(a).equals(asks(b)));
  }

  private static List<List<String>> deeds(Advice a) {
    return a.actions().stream().map(x -> List.of(x.act(), x.part(), x.say(), x.signal(), x.state(), x.iff().orElse(""))).toList();
  }

  private static List<List<String>> bans(Advice a) {
    return a.doNot().stream().map(b -> List.of(b.act(), b.until())).toList();
  }

  private static List<String> asks(Advice a) {
    return a.ask().stream().map(Advice.Question::about).toList();
  }
}
