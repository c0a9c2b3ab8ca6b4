package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Part;
import stillwarden.describe.Rig;

/**
 * Energy into the flask, W: power of the heater x what its dial means x efficiency, less what bare glass loses.
 *
 * @param full electrical power at full setting
 * @param setting share of full power that the dial stands for
 * @param efficiency share of it that enters the flask
 * @param loss at the boil
 * @param net into the boiling liquid
 * @param measured true when the electrical power was read, not assumed
 */
public record Heat(Band full, Band setting, Band efficiency, Band loss, Band net, boolean measured, List<String> notes) {
  public Heat {
    notes = List.copyOf(notes);
  }

  /** Empty when neither a power nor a flask size is known. */
  static Optional<Heat> of(RigParts parts, RunState run, double boiling, double room) {
    List<String> notes = new ArrayList<>();
    Optional<Double> volume = parts.flask().flatMap(f -> f.si("volume"));
    Optional<Band> full = full(parts, volume, notes);
    if (full.isEmpty()) {
      return Optional.empty();
    }
    boolean measured = run.watts().isPresent() && run.heatOn();
    Band electrical = measured ? Band.of(run.watts().get()) : full.get().times(setting(parts, run, notes));
    Band setting = measured ? Band.of(1) : electrical.nominal() > 0 ? electrical.over(full.get()).atMost(1) : Band.of(0);
    Band efficiency = Limits.band("heater-efficiency");
    Band loss = loss(volume.orElse(0.0), boiling, room);
    notes.add("heater efficiency: default band");
    Band net = electrical.times(efficiency).minus(loss).atLeast(0);
    return Optional.of(new Heat(full.get(), setting, efficiency, loss, net, measured, notes));
  }

  private static Optional<Band> full(RigParts parts, Optional<Double> volume, List<String> notes) {
    Optional<Part> heater = parts.heater();
    Optional<Double> stated = heater.flatMap(h -> h.si("power"));
    if (stated.isPresent()) {
      return stated.map(Band::of);
    }
    Optional<Double> size = heater.flatMap(h -> h.si("fits")).or(() -> volume);
    if (size.isEmpty() || heater.filter(h -> h.kind().equals("gas-burner")).isPresent()) {
      return Optional.empty();
    }
    notes.add("power of the heater not stated: default band for its size");
    double scatter = Limits.value("mantle-power-source");
    Band catalogue = Limits.byFlask("mantle-watts-per-flask", size.get(), 1);
    return Optional.of(new Band(catalogue.low() * (1 - scatter), catalogue.nominal(), catalogue.high() * (1 + scatter)));
  }

  private static Band setting(RigParts parts, RunState run, List<String> notes) {
    Optional<Part> regulator = parts.regulator();
    Optional<Double> dial = run.setting().filter(s -> s > 0);
    if (dial.isEmpty()) {
      dial = regulator.flatMap(r -> r.si("setting")).filter(s -> s > 0);
    }
    if (dial.isEmpty()) {
      notes.add(run.started() ? "dial not read: full power assumed" : "at full power: the dial is not set yet");
      return Band.of(1);
    }
    String means = regulator.flatMap(r -> r.word("setting-means")).orElse("unknown");
    if (means.equals("unknown")) {
      notes.add("nobody says what the dial controls: the band of duty, voltage and phase control");
    }
    return meaning(dial.get(), means);
  }

  /**
   * Share of full power at a dial position, by kind of control. Duty switches whole cycles; voltage goes with the
   * square; phase cuts a share of each half wave.
   */
  public static Band meaning(double dial, String control) {
    double cut = Math.PI * (1 - dial);
    double phase = dial + Math.sin(2 * cut) / (2 * Math.PI);
    double voltage = dial * dial;
    return switch (control) {
      case "duty" -> Band.of(dial);
      case "voltage" -> Band.of(voltage);
      case "phase" -> Band.of(phase);
      default -> new Band(Math.min(voltage, phase), dial, Math.max(dial, phase));
    };
  }

  static Band loss(double volume, double boiling, double room) {
    double area = Limits.value("bare-glass-factor") * 2 * Math.PI * Math.pow(3 * volume / (4 * Math.PI), 2 / 3.0);
    return Limits.band("heat-loss-coefficient").times(area * Math.max(0, boiling - room));
  }

  /** Electrical watts that put {@code net} watts into the boil. */
  double electrical(double net) {
    return (net + loss.nominal()) / efficiency.nominal();
  }

  static double room(Rig rig, RunState run, List<String> notes) {
    Optional<Double> room = run.room().or(() -> rig.si("place.room"));
    if (room.isEmpty()) {
      notes.add("room temperature not stated: assumed");
    }
    return room.orElseGet(() -> Limits.value("assumed-room"));
  }

  /** Heat that the charge takes a kelvin, J/K. */
  static Band capacity(Charge charge, double water, Optional<Double> flaskVolume) {
    Band glass = flaskVolume.map(v -> Limits.byFlask("glass-mass", v, 1e-3)).orElse(Band.of(0));
    double liquid = water * WaterSteam.COLD_DENSITY * WaterSteam.liquidHeatCapacity(333, 101_325);
    double plant = charge.plantMass() * Limits.value("plant-heat-capacity");
    double oil = charge.dispersed() ? 0 : charge.oilMass().map(Band::nominal).orElse(0.0) * Limits.value("oil-heat-capacity");
    return glass.times(Limits.value("glass-heat-capacity")).plus(Band.of(liquid + plant + oil));
  }
}
