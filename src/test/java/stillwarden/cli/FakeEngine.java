package stillwarden.cli;

import java.io.BufferedReader;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import stillwarden.describe.Defect;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.describe.Spot;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.order.Explanation;
import stillwarden.show.PlanSheet;

/**
 * Judges by name, so that commands can be tried alone: the rig's file name is its verdict ({@code bad} is unusable,
 * {@code broken} makes the program fail); each log line is {@code TIME VERDICT}.
 */
final class FakeEngine implements Engine {
  final List<Optional<OffsetDateTime>> asked = new ArrayList<>();

  @Override
  public Rig rig(Path file) throws Unusable {
    String name = file.getFileName().toString();
    if (name.equals("bad")) {
      throw new Unusable(List.of(new Defect(new Spot("bad", 3, 5), "unknown key `volum`"), new Defect(new Spot("bad", 9, 1), "empty value")));
    }
    return new Rig(name, name, "in-flask", Map.of(), Map.of(), List.of(), new TreeMap<>(), "");
  }

  @Override
  public Policy policy(Path file) throws Unusable {
    throw new Unusable(Spot.of(file.toString()), "want a policy");
  }

  @Override
  public RunLog log(Path file) throws Unusable {
    throw new Unusable(Spot.of(file.toString()), "no such log");
  }

  @Override
  public RunLog log(InputStream in, String name) throws Unusable {
    List<Entry> entries = new ArrayList<>();
    new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8)).lines().filter(l -> l.contains(" ")).forEach(l -> {
      String[] words = l.split(" ");
      entries.add(new Entry(entries.size() + 1, OffsetDateTime.parse(words[0]), "nk", false, Entry.Verb.SAW, words[1], "", "yes",
          Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty()));
    });
    if (entries.isEmpty()) {
      throw new Unusable(Spot.of(name), "no usable line");
    }
    return new RunLog(name, Map.of(), entries, List.of());
  }

  @Override
  public Advice inspect(Rig rig, Policy policy, Optional<OffsetDateTime> at) {
    asked.add(at);
    if (rig.name().equals("broken")) {
      throw new IllegalStateException("a\nbug");
    }
    if (rig.name().equals("unlinked")) {
      throw new NoClassDefFoundError("a class");
    }
    return advice(rig.name(), rig.name(), at);
  }

  @Override
  public Advice advise(Rig rig, Policy policy, RunLog log, Optional<OffsetDateTime> at) {
    asked.add(at);
    Entry last = log.entries().get(log.entries().size() - 1);
    return advice(rig.name(), last.id(), Optional.of(at.orElse(last.when())));
  }

  private static Advice advice(String rig, String verdict, Optional<OffsetDateTime> at) {
    return new Advice(rig, at.map(OffsetDateTime::toString).orElse(""), "running", verdict, List.of(), 0, List.of(), List.of(), List.of(),
        List.of(), List.of(), List.of(), 41, 41, List.of(), "The site decides.");
  }

  @Override
  public Live live(Rig rig, Policy policy, String name) {
    ByteArrayOutputStream all = new ByteArrayOutputStream();
    return new Live() {
      @Override
      public void hear(byte[] text) {
        all.writeBytes(text);
      }

      @Override
      public Advice answer(Optional<OffsetDateTime> at) throws Unusable {
        return advise(rig, policy, log(new ByteArrayInputStream(all.toByteArray()), name), at);
      }

      @Override
      public void close() {
        all.reset();
      }
    };
  }

  @Override
  public Explanation explain(String hazard, Rig rig, Policy policy, Optional<RunLog> log, Optional<OffsetDateTime> at) {
    return new Explanation(hazard, List.of());
  }

  @Override
  public PlanSheet plan(Rig rig, Policy policy, Optional<OffsetDateTime> at) {
    return new PlanSheet(rig.name(), "", List.of(), List.of(), List.of(), List.of(), List.of(), "The site decides.");
  }

  @Override
  public String schema(String what) {
    return "{\"title\": \"" + what + "\"}";
  }
}
