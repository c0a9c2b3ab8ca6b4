package stillwarden.derive.physics;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hipparchus.stat.regression.SimpleRegression;

/**
 * How fast it boils: from the heat, or, when the log has enough readings since the heat was last changed, fitted to them.
 *
 * @param kilograms distillate, kg/s
 * @param cubicMetres distillate at room temperature, m3/s
 * @param waterShare mass share of water in it
 * @param latent J/kg of distillate
 * @param fitted true when measured
 */
record BoilUp(Band kilograms, Band cubicMetres, double waterShare, double latent, boolean fitted, List<String> notes) {
  private static final double R = 8.314462618;
  private static final double ALPHA = 0.1;

  BoilUp {
    notes = List.copyOf(notes);
  }

  /** Empty when no heat is known and nothing was measured. */
  static Optional<BoilUp> of(Bench b) {
    double oilShare = b.two.filter(t -> t.oilTotal() > 0 && Bench.tooMuchUnknown(t).isEmpty())
        .map(t -> t.oilMassShare() / b.diffusion().nominal()).orElse(0.0);
    double boiling = b.boiling();
    double latent = (1 - oilShare) * WaterSteam.latentHeat(boiling) + oilShare * b.two.map(BoilUp::oilLatent).orElse(0.0);
    double density = 1 / ((1 - oilShare) / WaterSteam.COLD_DENSITY + oilShare / b.charge.oil().flatMap(Oil::density).orElseGet(() -> Limits.value("oil-density-default")));
    Optional<Band> assumed = b.heat.map(h -> h.net().times(1 / latent)).filter(k -> k.nominal() > 0)
        .map(k -> new Band(Math.max(k.low(), slowest() * k.nominal()), k.nominal(), k.high()));
    Optional<Band> measured = fit(b);
    List<String> notes = new ArrayList<>();
    if (measured.isPresent()) {
      notes.add("rate fitted to the readings of this run");
      return Optional.of(new BoilUp(measured.get().times(density), measured.get(), 1 - oilShare, latent, true, notes));
    }
    b.heat.ifPresent(h -> notes.addAll(h.notes()));
    return assumed.map(k -> new BoilUp(k, k.times(1 / density), 1 - oilShare, latent, false, notes));
  }

  /** The slow end of a rate stays above this share of its nominal value, or times would have no end. */
  static double slowest() {
    return Limits.value("slowest-share");
  }

  /** W into the boil: measured where the rate is, else by the heater. */
  static Optional<Band> net(Bench b, Optional<BoilUp> rate) {
    return rate.filter(BoilUp::fitted).map(r -> r.kilograms().times(r.latent())).or(() -> b.heat.map(Heat::net));
  }

  /** Latent heat of what comes over of the oil, J/kg, by Clausius and Clapeyron from its own vapour pressures. */
  static double oilLatent(TwoLiquids t) {
    double heat = 0;
    double mass = 0;
    for (int i = 0; i < t.oilPascal().length; i++) {
      if (t.oilPascal()[i] > 0) {
        Substance s = t.oil().parts().get(i).substance();
        VapourPressure v = VapourPressure.best(s.equations(), t.kelvin()).orElseThrow().by();
        double slope = (Math.log(v.formula(t.kelvin() + 0.5)) - Math.log(v.formula(t.kelvin() - 0.5)));
        heat += t.oilPascal()[i] * R * t.kelvin() * t.kelvin() * slope;
        mass += t.oilPascal()[i] * s.molarMass();
      }
    }
    return mass > 0 ? heat / mass : 0;
  }

  /** m3/s over the recent window, with its spread; empty with too few readings. */
  static Optional<Band> fit(Bench b) {
    RunState run = b.run;
    if (run.at() == null || !run.heatOn()) {
      return Optional.empty();
    }
    Instant from = run.at().minusSeconds((long) Limits.value("fit-window"));
    Instant since = run.settingSince().filter(s -> s.isAfter(from)).orElse(from);
    Instant start = run.boilingSince().filter(s -> s.isAfter(since)).orElse(since);
    Optional<Band> collected = slope(run.collected(), start);
    return collected.isPresent() ? collected : slope(boiledAway(run), start);
  }

  /** Flask readings as water gone: less what was fed since. */
  private static List<RunState.Amount> boiledAway(RunState run) {
    return run.flaskReadings().stream()
        .map(r -> new RunState.Amount(r.at(), run.fed() - run.fedSince(r.at()) - r.si())).toList();
  }

  static Optional<Band> slope(List<RunState.Amount> readings, Instant from) {
    SimpleRegression line = new SimpleRegression();
    readings.stream().filter(r -> !r.at().isBefore(from)).forEach(r -> line.addData((r.at().toEpochMilli() - from.toEpochMilli()) / 1000.0, r.si()));
    if (line.getN() < Limits.value("fit-points-min") || line.getXSumSquares() <= 0 || !(line.getSlope() > 0)) {
      return Optional.empty();
    }
    double slope = line.getSlope();
    double spread = line.getSlopeConfidenceInterval(ALPHA);
    double half = Double.isFinite(spread) ? spread : 0;
    return Optional.of(new Band(Math.max(slowest() * slope, slope - half), slope, slope + half));
  }
}
