package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import stillwarden.derive.physics.Numbers;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/**
 * One rig at one moment: all that rules and views need.
 *
 * @param run what the log says; without lines before heat
 * @param numbers computed, in the order of the contract
 */
public record Situation(
    Rig rig, Policy policy, Roles roles, RunState run, Timeline time, List<Sign> signs, Numbers numbers, PathFinding path, boolean withRun) {

  public Situation {
    signs = List.copyOf(signs);
  }

  /** Before heat: what the rig file says. */
  public static Situation inspection(Rig rig, Policy policy, Optional<Instant> at, ZoneOffset offset) {
    // with no date in the file nothing dated is in force
    return derive(new Ground(rig, policy), List.of(), at.orElse(Instant.EPOCH), offset, false);
  }

  /** Mid-run: what the rig file says and what was seen and done up to {@code at}. */
  public static Situation run(Rig rig, Policy policy, List<Entry> lines, Instant at, ZoneOffset offset) {
    return run(new Ground(rig, policy), lines, at, offset);
  }

  /** The same for one of many moments of a run: what stands between them is kept in {@code ground}. */
  public static Situation run(Ground ground, List<Entry> lines, Instant at, ZoneOffset offset) {
    return derive(ground, lines, at, offset, true);
  }

  private static Situation derive(Ground ground, List<Entry> lines, Instant at, ZoneOffset offset, boolean withRun) {
    Policy policy = ground.policy();
    Duration hold = Duration.ofMillis(Math.round(Limits.of(policy, "head-hold") * 1000));
    RunState run = lines.isEmpty() ? RunState.none(at, offset) : RunState.of(lines, at, hold);
    Numbers numbers = ground.numbers(run.entries(), at);
    Figures figures = new Figures(ground.rig(), policy, ground.roles(), numbers, run);
    Timeline time = Timeline.of(run, heatUpLow(numbers), Duration.ofMillis(Math.round(Limits.of(policy, "residual-boil-max") * 1000)),
        figures.coolingTime().orElse(Duration.ofMillis(Math.round(Limits.of(policy, "cooling-time-unknown") * 1000))));
    Scene scene = new Scene(ground, run, figures, time, new Looks(run));
    SignSet out = new SignSet(time.live());
    PathFinding path = signs(scene, out, withRun);
    return new Situation(ground.rig(), policy, ground.roles(), run, time, out.all(), numbers, path, withRun);
  }

  private static Duration heatUpLow(Numbers numbers) {
    Estimate e = numbers.get("heat-up-time");
    return e.known() ? Duration.ofMillis(Math.round(e.low() * 60_000)) : null;
  }

  private static PathFinding signs(Scene scene, SignSet out, boolean withRun) {
    out.addAll(scene.ground().block("set-up", RigSigns.madeFrom(scene), () -> setUp(scene)));
    new FigureSigns(scene, out).make();
    new HeatSigns(scene, out).make();
    PathFinding path = new PathSigns(scene, out).make();
    boolean run = withRun && scene.time().heatOn().isPresent();
    new SetupExtras(scene, out).make();
    new CondenserSigns(scene, out).make(run);
    new TipSigns(scene, out).make();
    if (run) {
      new WaterSigns(scene, out).make();
      new TemperatureSigns(scene, out).make();
      new EndSigns(scene, out).make();
    }
    if (withRun) {
      new EventSigns(scene, out).make();
      new RunExtras(scene, out).make();
    }
    new PeopleSigns(scene, out).make();
    overCheck(scene, out);
    return path;
  }

  /** What the rig file alone says, but for what {@link RigSigns#madeFrom} names. */
  private static List<Sign> setUp(Scene scene) {
    SignSet out = new SignSet(scene.live());
    new RigSigns(scene, out).make();
    SetupSigns setup = new SetupSigns(scene, out);
    setup.make();
    setup.ports();
    return List.copyOf(out.all());
  }

  /** Any look that matters and is past its time: something of it stands counted or possible. */
  private static void overCheck(Scene scene, SignSet out) {
    Optional<Sign> late = out.all().stream().filter(s -> s.standing() != Standing.SEEN && LOOKS.contains(s.about())).findFirst();
    boolean over = scene.live() && late.isPresent();
    out.seen("over-check", over ? "yes" : "no", over ? late.get().evidence() : "every look that matters is fresh");
  }

  /** Signs of looks that matter: one past its time keeps a run from being calm. */
  public static final List<String> LOOKS =
      List.of("path", "flask-level", "tip", "coolant", "vapour-out", "hood", "flow", "reservoir-level", "receiver-level", "crystals");

  /** The signs about one thing. */
  public List<Sign> about(String about) {
    return signs.stream().filter(s -> s.about().equals(about)).toList();
  }

  /** Is it surely so? */
  public boolean is(String about, String value) {
    return signs.stream().anyMatch(s -> s.about().equals(about) && s.value().equals(value) && s.isActive());
  }
}
