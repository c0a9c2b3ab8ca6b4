package stillwarden.cli;

import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Policy;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.show.JsonView;
import stillwarden.show.TextView;

/** Rigs read, judged and shown in the order given; the worst gives the exit status. */
record Inspection(Desk desk, List<Path> rigs, Policy policy, boolean json, Optional<OffsetDateTime> at) {
  Exit run() {
    List<JsonView.Item> items = new ArrayList<>();
    for (Path rig : rigs) {
      items.add(inspect(rig));
    }
    show(items);
    return items.stream().map(Inspection::exit).reduce(Exit.NOTHING_TO_DO, Exit::worse);
  }

  private JsonView.Item inspect(Path file) {
    try {
      Advice advice = desk.engine().inspect(desk.engine().rig(file), policy, at);
      return new JsonView.Item(file.toString(), Optional.of(advice), List.of());
    } catch (Unusable u) {
      desk.defects(u.defects());
      return new JsonView.Item(file.toString(), Optional.empty(), u.defects());
    }
  }

  private void show(List<JsonView.Item> items) {
    if (json && items.size() > 1) {
      desk.answer(JsonView.of(items));
      return;
    }
    String between = "";
    for (JsonView.Item item : items) {
      if (item.advice().isPresent()) {
        Advice advice = item.advice().get();
        desk.answer(between + (json ? JsonView.of(advice) : TextView.of(advice)));
        between = "\n" + "=".repeat(72) + "\n";
      }
    }
  }

  private static Exit exit(JsonView.Item item) {
    return item.advice().map(a -> Exit.of(a.exit())).orElse(Exit.UNUSABLE);
  }
}
