package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import stillwarden.describe.Entry;

/** Who is there, whether the hood runs, whether something poisonous is out. */
final class PeopleSigns {
  private final Scene scene;
  private final SignSet out;

  PeopleSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  // bitter almond: hydrogen cyanide; rotten eggs: hydrogen sulfide; mustard: isothiocyanates
  private static final Set<String> WARNING_SMELLS = Set.of("almond", "rotten-eggs", "mustard");

  void make() {
    attendance();
    handover();
    hood();
    toxicRelease();
    flames();
  }

  private Duration checkEvery() {
    Duration limit = scene.limitTime("check-every");
    return scene.rig().si("target.check-every").map(s -> Duration.ofMillis(Math.round(s * 1000))).filter(d -> d.compareTo(limit) < 0).orElse(limit);
  }

  private void attendance() {
    if (!scene.live()) {
      out.seen("attendance", "present", "no heat in");
      return;
    }
    Optional<Entry> person = scene.run().lastSaw("person");
    Optional<Instant> seen = scene.run().entries().stream().filter(e -> !e.instrument()).map(Entry::at).max(Instant::compareTo);
    boolean gone = person.filter(e -> e.text().equals("left")).isPresent() && alone();
    boolean late = seen.isEmpty() || Duration.between(seen.get(), scene.at()).compareTo(checkEvery()) > 0;
    if (gone) {
      out.seen("attendance", "", "nobody", scene.told(person.get()), person.get().at(), "person");
    } else if (late) {
      out.seen("attendance", "", "overdue", "no person's look since " + seen.map(scene::clock).orElse("heat came on"), seen.orElse(null), "person");
    } else {
      out.seen("attendance", "present", "a person looked " + scene.clock(seen.get()));
    }
    arrival();
  }

  /** Nobody but the one who left. */
  private boolean alone() {
    double there = scene.rig().si("people.people-at-rig").orElse(1.0);
    for (Entry e : scene.run().saw("person")) {
      there += e.text().equals("arrived") ? 1 : e.text().equals("left") ? -1 : 0;
    }
    return there <= 0;
  }

  private void arrival() {
    Optional<Duration> within = scene.rig().si("people.arrives-within").map(s -> Duration.ofMillis(Math.round(s * 1000)));
    Optional<Duration> harm = scene.low("time-to-minimum-level");
    if (within.isPresent() && harm.isPresent()) {
      out.seen("arrival-in-time", within.get().compareTo(harm.get()) < 0 ? "yes" : "no", "help within " + within.get().toMinutes() + " min, harm after " + harm.get().toMinutes() + " min at the earliest");
    } else {
      out.counted("arrival-in-time", "no", "nobody has said how soon help is there: counts as too late", "people.arrives-within");
    }
  }

  private void handover() {
    Optional<Entry> change = scene.run().lastSaw("person").filter(e -> Set.of("left", "arrived").contains(e.text()));
    Optional<Entry> done = scene.run().lastDid("handover");
    boolean late = change.isPresent() && scene.run().age(change.get()).compareTo(Duration.ofMinutes(15)) > 0;
    boolean near = change.isPresent() && done.filter(d -> Duration.between(d.at(), change.get().at()).abs().compareTo(Duration.ofMinutes(15)) <= 0).isPresent();
    if (scene.live() && late && !near) {
      out.seen("handover", "", "missing", scene.told(change.get()) + ", no handover logged", change.get().at(), "person");
    } else {
      out.seen("handover", "done", "no change of people without a handover");
    }
  }

  private void hood() {
    Looks.Look l = scene.looks().at("hood", Shelves.of(scene.policy(), "hood"), stated() ? scene.time().heatOn().orElse(null) : null, null);
    Optional<String> word = l.word();
    if (word.filter(w -> !w.equals("running")).isPresent() || word.isPresent() && l.fresh()) {
      out.seen("hood", "", word.get(), scene.told(l.entry().get()), l.entry().get().at(), "hood");
    } else if (word.isEmpty() && scene.time().heatOn().isEmpty()) {
      return;
    } else if (word.isEmpty() && l.fresh()) {
      out.seen("hood", "running", "hood running, by the rig file");
    } else {
      out.possible("hood", l.entry().map(scene::told).orElse("nobody has looked at the hood's indicator lately"), "hood");
    }
  }

  private boolean stated() {
    return scene.says("place.hood.running", "yes");
  }

  /** Poison counts once vapour, liquid or smoke is out, or what holds it is lost; identified merely absent does not. */
  private void toxicRelease() {
    boolean bad = out.all().stream().anyMatch(s -> s.isActive() && (s.about().equals("charge-toxic") && s.value().equals("yes") || s.about().equals("charge-identified") && s.value().equals("no")));
    Stream<Entry> events = Stream.of("smoke", "vapour-from-joint", "joint-apart", "crack", "leak-under", "vapour-past-condenser", "spill", "hood", "symptoms", "gas-without-liquid", "smell")
        .flatMap(id -> scene.run().lastSaw(id).stream()).filter(e -> !Set.of("no", "none", "running", Looks.NOT_SURE).contains(e.text()));
    Optional<Entry> out1 = events.max(java.util.Comparator.comparing(Entry::at));
    Optional<Entry> warning = scene.run().lastSaw("smell").filter(e -> WARNING_SMELLS.contains(e.text()));
    if (warning.isPresent()) {
      out.seen("toxic-release", "", "yes", scene.told(warning.get()) + ", a smell that warns of poison whatever the charge is", warning.get().at(), "smell");
    } else if (bad && out1.isPresent()) {
      out.seen("toxic-release", "", "yes", scene.told(out1.get()) + ", and the charge is toxic or not identified", out1.get().at(), "symptoms");
    } else {
      out.seen("toxic-release", "no", bad ? "nothing is out" : "the charge is not known to be toxic");
    }
  }

  private void flames() {
    Optional<String> word = scene.rig().word("place.flames-within-3-m");
    boolean burner = scene.roles().one(Role.HEATER).filter(h -> h.kind().equals("gas-burner")).isPresent();
    if (burner) {
      out.seen("flame-near", "", "yes", "a gas burner heats the flask", null, "place.flames-within-3-m");
    } else if (word.isPresent()) {
      out.seen("flame-near", "", word.get(), "flames within 3 m " + word.get() + ", by the rig file", null, "place.flames-within-3-m");
    } else {
      out.unknown("flame-near", "yes", "nobody has said whether a flame burns within 3 m", "place.flames-within-3-m");
    }
  }
}
