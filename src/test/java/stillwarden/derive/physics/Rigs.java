package stillwarden.derive.physics;

import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import stillwarden.describe.Datum;
import stillwarden.describe.Dimension;
import stillwarden.describe.Entry;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Policy;
import stillwarden.describe.Port;
import stillwarden.describe.Quantity;
import stillwarden.describe.Rig;
import stillwarden.describe.Spot;

/** Builds rigs and log lines for tests from {@code path = value} lines; a part's kind is given as {@code part.kind = ...}. */
final class Rigs {
  static final Instant START = Instant.parse("2026-04-14T09:00:00Z");

  private record Unit(double factor, double offset, Dimension dimension) {}

  private static final Map<String, Unit> UNITS = Map.ofEntries(
      Map.entry("mL", new Unit(1e-6, 0, Dimension.VOLUME)), Map.entry("L", new Unit(1e-3, 0, Dimension.VOLUME)),
      Map.entry("W", new Unit(1, 0, Dimension.POWER)), Map.entry("Cel", new Unit(1, 273.15, Dimension.TEMPERATURE)),
      Map.entry("kPa", new Unit(1e3, 0, Dimension.PRESSURE)), Map.entry("m", new Unit(1, 0, Dimension.LENGTH)),
      Map.entry("mm", new Unit(1e-3, 0, Dimension.LENGTH)), Map.entry("g", new Unit(1e-3, 0, Dimension.MASS)),
      Map.entry("%", new Unit(1e-2, 0, Dimension.FRACTION)), Map.entry("min", new Unit(60, 0, Dimension.TIME)), Map.entry("L/min", new Unit(1e-3 / 60, 0, Dimension.VOLUME_FLOW)));

  private Rigs() {}

  /** The fennel rig of the README, changed by lines; a value of {@code -} takes the key away. */
  static Rig fennel(String... changes) {
    List<String> lines = new ArrayList<>(List.of(
        "place.elevation = 250 m", "place.room = 21 Cel", "place.warm-water = mixer",
        "charge.material = fennel seed, crushed", "charge.material-mass = 60 g", "charge.water = 400 mL", "charge.oil.expected = 1.8 g",
        "charge.oil.makeup.trans-anethole = 80 %", "charge.oil.makeup.estragole = 12 %", "charge.oil.makeup.limonene = 8 %",
        "target.distillate = 150 mL",
        "mantle.kind = heating-mantle", "mantle.power = 380 W", "mantle.fits = 1 L",
        "regulator.kind = power-regulator", "regulator.setting = 0 %", "regulator.setting-means = duty",
        "flask.kind = round-bottom-flask", "flask.volume = 1 L", "flask.minimum-level = 150 mL",
        "claisen.kind = claisen-adapter", "reservoir.kind = separatory-funnel", "reservoir.volume = 250 mL", "reservoir.water = 200 mL",
        "head.kind = still-head", "condenser.kind = liebig-condenser", "condenser.jacket-length = 300 mm", "condenser.tube-bore = 12 mm",
        "condenser.jacket-volume = 95 mL", "condenser.coolant.medium = water", "condenser.coolant.plan = tempered",
        "condenser.coolant.supply = 28 Cel", "condenser.coolant.flow = 0.5 L/min",
        "take-off.kind = vacuum-adapter", "take-off.side-arm = open", "take-off.side-arm-bore = 6 mm",
        "receiver.kind = graduated-receiver", "receiver.volume = 250 mL"));
    for (String c : changes) {
      String key = c.substring(0, c.indexOf('=')).strip();
      lines.removeIf(l -> l.startsWith(key + " ="));
      if (!c.endsWith("= -")) {
        lines.add(c);
      }
    }
    return of(lines);
  }

  static Rig of(List<String> lines) {
    Map<String, Datum> facts = new LinkedHashMap<>();
    Map<String, Map<String, Datum>> parts = new LinkedHashMap<>();
    Map<String, String> kinds = new LinkedHashMap<>();
    for (String line : lines) {
      String[] kv = line.split(" = ", 2);
      if (kv[0].endsWith(".kind")) {
        kinds.put(kv[0].substring(0, kv[0].length() - 5), kv[1]);
      }
    }
    for (String line : lines) {
      String[] kv = line.split(" = ", 2);
      Datum d = new Datum(kv[0], kv[1], quantity(kv[1]), Spot.of("test"));
      int dot = kv[0].indexOf('.');
      String part = kv[0].substring(0, dot);
      if (kinds.containsKey(part)) {
        parts.computeIfAbsent(part, k -> new LinkedHashMap<>()).put(kv[0].substring(dot + 1), d);
      } else {
        facts.put(kv[0], d);
      }
    }
    Map<String, Part> built = new LinkedHashMap<>();
    kinds.forEach((name, kind) -> built.put(name, new Part(name, kind, parts.getOrDefault(name, Map.of()))));
    List<Joint> joints = built.containsKey("claisen")
        ? List.of(new Joint(0, new Port("flask", ""), new Port("claisen", "foot"), Map.of())) : List.of();
    return new Rig("test", "test", "in-flask", facts, built, joints, new TreeMap<>(), "");
  }

  static Entry saw(double minute, String id, String value) {
    return line(minute, Entry.Verb.SAW, id, value);
  }

  static Entry did(double minute, String id, String value) {
    return line(minute, Entry.Verb.DID, id, value);
  }

  static Instant at(double minute) {
    return START.plusMillis((long) (minute * 60_000));
  }

  private static Entry line(double minute, Entry.Verb verb, String id, String value) {
    return new Entry(1, OffsetDateTime.ofInstant(at(minute), ZoneOffset.UTC), "nk", false, verb, id, "", value, quantity(value), Optional.empty(), Optional.empty(), Optional.empty());
  }

  static Policy policy(Map<String, Double> limits, Map<String, Boolean> permits, String coolant) {
    return new Policy("p", "site", Map.of(), limits, Map.of(), permits, Optional.ofNullable(coolant), Map.of(), List.of(), "");
  }

  private static Optional<Quantity> quantity(String text) {
    String[] w = text.split(" ");
    if (w.length != 2 || !UNITS.containsKey(w[1])) {
      return Optional.empty();
    }
    Unit u = UNITS.get(w[1]);
    return Optional.of(new Quantity(Double.parseDouble(w[0]) * u.factor() + u.offset(), u.dimension(), text));
  }
}
