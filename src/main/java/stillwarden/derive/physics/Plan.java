package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.IntStream;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/**
 * The numbers of a rig before its run, and how the run is expected to go, minute by minute from heat-on. Water is taken
 * to be fed from the reservoir as it boils away, until the reservoir is empty.
 *
 * @param curves empty where heat, water or flask are not known
 * @param ends what comes to an end when, in order of time
 */
public record Plan(Numbers numbers, List<Curve> curves, List<End> ends) {
  private static final int STEPS = 60;
  private static final double LONGEST = 24 * 3600;

  public Plan {
    curves = List.copyOf(curves);
    ends = List.copyOf(ends);
  }

  /**
   * One quantity against time.
   *
   * @param unit UCUM
   * @param minutes from heat-on, rising
   * @param low value high of equal length
   */
  public record Curve(String name, String unit, double[] minutes, double[] low, double[] value, double[] high) {}

  /** What ends: {@code target, oil-over, reservoir, minimum-level, full-receiver}; minutes from heat-on. */
  public record End(String what, double minutes) {}

  public static Plan of(Rig rig, Policy policy) {
    Physics.Worked w = Physics.of(new Bench(rig, policy, List.of(), null));
    return Drawing.of(w).map(d -> new Plan(w.numbers(), d.curves(), d.ends())).orElseGet(() -> new Plan(w.numbers(), List.of(), List.of()));
  }

  /** Draws the curves; volumes in m3, times in s. */
  private record Drawing(Bench b, BoilUp rate, Band heatUp, double level, double reservoir, double minimum) {
    static Optional<Drawing> of(Physics.Worked w) {
      Bench b = w.bench();
      if (w.rate().isEmpty() || w.progress().heatUp().isEmpty() || w.progress().flask().isEmpty() || b.volume.isEmpty()) {
        return Optional.empty();
      }
      double reservoir = w.progress().reservoir().map(Band::nominal).orElse(0.0);
      return Optional.of(new Drawing(b, w.rate().get(), w.progress().heatUp().get(), w.progress().flask().get().nominal(), reservoir, b.minimumLevel(b.volume.get())));
    }

    List<End> ends() {
      List<End> ends = new ArrayList<>();
      b.rig.si("target.distillate").ifPresent(v -> ends.add(end("target", v)));
      if (b.course.filter(Fractionation::complete).isPresent() && b.charge.oilAmountKnown()) {
        ends.add(end("oil-over", b.course.get().waterForAll() * b.diffusion().nominal() / WaterSteam.COLD_DENSITY));
      }
      if (reservoir > 0) {
        ends.add(end("reservoir", reservoir / rate.waterShare()));
      }
      ends.add(end("minimum-level", (reservoir + Math.max(0, level - minimum)) / rate.waterShare()));
      b.parts.receiver().flatMap(p -> p.si("volume")).ifPresent(v -> ends.add(end("full-receiver", v * Limits.value("receiver-full-share"))));
      ends.sort((x, y) -> Double.compare(x.minutes(), y.minutes()));
      return ends;
    }

    private End end(String what, double distillate) {
      return new End(what, (heatUp.nominal() + distillate / rate.cubicMetres().nominal()) / 60);
    }

    /** The run is drawn up to its target, else until the oil is over, and never past the minimum level. */
    private double last() {
      List<End> ends = ends();
      double dry = time(ends, "minimum-level").orElseThrow();
      double wanted = time(ends, "target").or(() -> time(ends, "oil-over")).orElse(dry);
      return Math.min(LONGEST, Math.min(dry, wanted) * 60);
    }

    private static Optional<Double> time(List<End> ends, String what) {
      return ends.stream().filter(e -> e.what().equals(what)).map(End::minutes).findFirst();
    }

    List<Curve> curves() {
      double last = last();
      double[] events = ends().stream().mapToDouble(e -> e.minutes() * 60).filter(t -> t < last).toArray();
      double[] grid = IntStream.rangeClosed(0, STEPS).mapToDouble(i -> last * i / STEPS).toArray();
      double[] t = java.util.stream.DoubleStream.concat(java.util.stream.DoubleStream.of(heatUp.nominal()),
          java.util.stream.DoubleStream.concat(Arrays.stream(events), Arrays.stream(grid))).sorted().distinct().toArray();
      List<Curve> out = new ArrayList<>();
      out.add(curve("distillate", "mL", t, this::volume, 1e6));
      out.add(curve("flask-level", "mL", t, s -> volume(s).map(v -> flask(v * rate.waterShare())), 1e6));
      out.add(curve("reservoir-level", "mL", t, s -> volume(s).map(v -> Math.max(0, reservoir - v * rate.waterShare())), 1e6));
      out.add(curve("receiver-level", "mL", t, this::volume, 1e6));
      out.add(curve("head-temperature", "Cel", t, this::head, 1, -273.15));
      if (b.course.isPresent() && b.charge.oilAmountKnown()) {
        oil(t, out);
      }
      return out;
    }

    private void oil(double[] t, List<Curve> out) {
      Fractionation run = b.course.get();
      out.add(curve("oil-collected", "g", t, s -> over(s).map(w -> run.atWater(w).oil()), 1e3));
      // where the melting points of what condenses are not known, there is no such curve rather than a made-up one
      if (run.points().stream().allMatch(x -> Liquidus.of(run.oil().parts(), x.vapour()).kelvin().isPresent())) {
        out.add(curve("freezing-point-of-condensate", "Cel", t, s -> over(s).map(w -> Liquidus.of(run.oil().parts(), run.atWater(w).vapour())
            .kelvin().orElseThrow().nominal()), 1, -273.15));
      }
      for (int i = 0; i < run.oil().parts().size(); i++) {
        int k = i;
        out.add(curve("share-of-condensing-oil." + run.oil().parts().get(i).substance().id(), "%", t, s -> over(s).map(w -> run.atWater(w).vapour()[k]), 100));
      }
    }

    /** m3 of distillate so far. */
    private Band volume(double s) {
      return Band.of(s).minus(heatUp).atLeast(0).times(rate.cubicMetres());
    }

    /** kg of water as it would be in an ideal run. */
    private Band over(double s) {
      return volume(s).times(WaterSteam.COLD_DENSITY * rate.waterShare()).over(b.diffusion());
    }

    private double flask(double boiled) {
      return Math.max(0, level - Math.max(0, boiled - reservoir));
    }

    /** The head follows the boil; before it, it is at the room's temperature. */
    private Band head(double s) {
      if (s < heatUp.nominal()) {
        return Band.of(b.room);
      }
      return b.course.filter(run -> b.charge.oilAmountKnown()).map(run -> over(s).map(w -> w >= run.waterForAll() ? b.water : run.atWater(w).kelvin())).orElse(Band.of(b.boiling()));
    }

    private static Curve curve(String name, String unit, double[] t, java.util.function.DoubleFunction<Band> at, double factor) {
      return curve(name, unit, t, at, factor, 0);
    }

    private static Curve curve(String name, String unit, double[] t, java.util.function.DoubleFunction<Band> at, double factor, double offset) {
      Band[] bands = Arrays.stream(t).mapToObj(at).toArray(Band[]::new);
      DoubleUnaryOperator unitOf = v -> v * factor + offset;
      return new Curve(name, unit, Arrays.stream(t).map(s -> s / 60).toArray(),
          Arrays.stream(bands).mapToDouble(x -> unitOf.applyAsDouble(x.low())).toArray(),
          Arrays.stream(bands).mapToDouble(x -> unitOf.applyAsDouble(x.nominal())).toArray(),
          Arrays.stream(bands).mapToDouble(x -> unitOf.applyAsDouble(x.high())).toArray());
    }
  }
}
