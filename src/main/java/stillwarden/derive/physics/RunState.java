package stillwarden.derive.physics;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import stillwarden.describe.Dimension;
import stillwarden.describe.Entry;

/**
 * What the log says about the run so far, up to one instant. Nothing is computed here.
 *
 * @param heatSince first time heat went on
 * @param heatOn whether the last word about the heater is that it is on
 * @param setting dial, as a share of full scale
 * @param settingSince when it was last changed
 * @param watts power measured at the heater
 * @param boilingSince first drop, or first sight of boiling or of drops
 * @param feeds water fed, each with its time, m3
 * @param swapped m3 taken off with earlier receivers
 */
record RunState(
    Instant at,
    Optional<Instant> heatSince,
    boolean heatOn,
    Optional<Double> setting,
    Optional<Instant> settingSince,
    Optional<Double> watts,
    Optional<Instant> boilingSince,
    List<Amount> feeds,
    double swapped,
    Optional<Look> flask,
    Optional<Look> reservoir,
    Optional<Look> receiver,
    List<Amount> collected,
    List<Amount> flaskReadings,
    Optional<Double> supply,
    Optional<Double> flow,
    Optional<Double> room,
    Optional<Double> barometer,
    Optional<Amount> flaskTemperature) {

  /** A look at a level: its word or its quantity. */
  record Look(Instant at, String word, Optional<Double> volume) {}

  /** A volume (m3) or a temperature (K) at a time. */
  record Amount(Instant at, double si) {}

  private static final Set<String> CUTS = Set.of("cut-power", "isolate-remote", "isolate-auto", "close-gas", "keep-heat-off", "lower-heat");
  private static final Set<String> HEATS = Set.of("heat-on", "set-heat", "reduce-heat", "raise-heat", "restart-low");

  static RunState of(List<Entry> entries, Instant at) {
    Reader r = new Reader(at);
    entries.stream().filter(e -> at == null || !e.at().isAfter(at)).forEach(r::take);
    return r.state();
  }

  boolean started() {
    return heatSince.isPresent();
  }

  double fed() {
    return feeds.stream().mapToDouble(Amount::si).sum();
  }

  double fedSince(Instant t) {
    return feeds.stream().filter(f -> f.at().isAfter(t)).mapToDouble(Amount::si).sum();
  }

  double secondsSince(Instant t) {
    return Math.max(0, Duration.between(t, at).toMillis() / 1000.0);
  }

  /** Reads the lines one by one. */
  private static final class Reader {
    private final Instant at;
    private Instant heatSince;
    private boolean heatOn;
    private Double setting;
    private Instant settingSince;
    private Double watts;
    private Instant boilingSince;
    private final List<Amount> feeds = new ArrayList<>();
    private double swapped;
    private Look flask;
    private Look reservoir;
    private Look receiver;
    private final List<Amount> collected = new ArrayList<>();
    private final List<Amount> flaskReadings = new ArrayList<>();
    private Double supply;
    private Double flow;
    private Double room;
    private Double barometer;
    private Amount flaskTemperature;

    Reader(Instant at) {
      this.at = at;
    }

    void take(Entry e) {
      if (e.verb() == Entry.Verb.DID) {
        did(e);
      } else if (!e.text().equals("not-sure")) {
        saw(e);
      }
    }

    private void did(Entry e) {
      if (HEATS.contains(e.id())) {
        heatOn = true;
        heatSince = heatSince == null ? e.at() : heatSince;
        settingSince = e.at();
        si(e, Dimension.FRACTION).ifPresent(v -> setting = v);
        watts = null;
      } else if (CUTS.contains(e.id())) {
        heatOn = false;
        settingSince = e.at();
      } else if (e.id().equals("feed") || e.id().equals("feed-slow")) {
        si(e, Dimension.VOLUME).ifPresent(v -> feeds.add(new Amount(e.at(), v)));
      } else if (e.id().equals("swap-receiver")) {
        swapped += si(e, Dimension.VOLUME).orElseGet(() -> receiver == null ? 0 : receiver.volume().orElse(0.0));
        receiver = new Look(e.at(), "empty", Optional.of(0.0));
      } else if (e.id().equals("set-coolant")) {
        flow = si(e, Dimension.VOLUME_FLOW).orElse(flow);
      } else if (e.id().equals("refill-reservoir")) {
        reservoir = new Look(e.at(), "full", si(e, Dimension.VOLUME));
      }
    }

    private void saw(Entry e) {
      switch (e.id()) {
        case "heat-setting" -> {
          // a dial read at nought is heat off, but nobody has seen a switch
          setting = si(e, Dimension.FRACTION).orElse(setting);
          settingSince = settingSince == null ? e.at() : settingSince;
        }
        case "heater-power" -> watts = si(e, Dimension.POWER).orElse(watts);
        case "first-drop" -> boils(e);
        case "boiling", "drip" -> {
          if (!e.text().equals("none")) {
            boils(e);
          }
        }
        case "flask-level" -> {
          flask = look(e);
          flask.volume().ifPresent(v -> flaskReadings.add(new Amount(e.at(), v)));
        }
        case "reservoir-level" -> reservoir = look(e);
        case "receiver-level" -> {
          receiver = look(e);
          receiver.volume().ifPresent(v -> collected.add(new Amount(e.at(), v + swapped)));
        }
        case "coolant-supply-temperature" -> supply = si(e, Dimension.TEMPERATURE).orElse(supply);
        case "coolant-flow" -> flow = si(e, Dimension.VOLUME_FLOW).orElse(flow);
        case "flask-temperature" -> flaskTemperature = si(e, Dimension.TEMPERATURE).map(t -> new Amount(e.at(), t)).orElse(flaskTemperature);
        case "room-temperature" -> room = si(e, Dimension.TEMPERATURE).orElse(room);
        case "barometer" -> barometer = si(e, Dimension.PRESSURE).orElse(barometer);
        case "power" -> heatOn = heatOn && !e.text().equals("lost");
        default -> { }
      }
    }

    private void boils(Entry e) {
      boilingSince = boilingSince == null ? e.at() : boilingSince;
      if (heatSince == null) {
        // it boils, so it is heated, whoever forgot to write that down
        heatSince = e.at();
        heatOn = true;
      }
    }

    private static Look look(Entry e) {
      return new Look(e.at(), e.text(), si(e, Dimension.VOLUME));
    }

    private static Optional<Double> si(Entry e, Dimension d) {
      return e.measured().filter(q -> q.dimension() == d).map(q -> q.si());
    }

    RunState state() {
      Instant now = at != null ? at : heatSince;
      return new RunState(now, Optional.ofNullable(heatSince), heatOn, Optional.ofNullable(setting), Optional.ofNullable(settingSince),
          Optional.ofNullable(watts), Optional.ofNullable(boilingSince), List.copyOf(feeds), swapped, Optional.ofNullable(flask),
          Optional.ofNullable(reservoir), Optional.ofNullable(receiver), List.copyOf(collected), List.copyOf(flaskReadings),
          Optional.ofNullable(supply), Optional.ofNullable(flow), Optional.ofNullable(room), Optional.ofNullable(barometer),
          Optional.ofNullable(flaskTemperature));
    }
  }
}
