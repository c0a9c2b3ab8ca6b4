package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import stillwarden.describe.Policy;

/**
 * Water before heat, tempered, or held off: decided by the temperature at which the oil condensing along the run begins
 * to freeze, against what the condenser needs and what the site can supply.
 *
 * @param strategy {@code before-heat, tempered, held-off}
 * @param kelvin coolant inlet asked for
 * @param feasible false when the site's supply or policy cannot be met: then {@code reasons} name both sides
 * @param declaredMet whether the coolant as declared does it; empty when plan or supply is not declared
 * @param watchFrom share of the oil over from which the inlet is within the margin of the freezing temperature
 * @param crystalsFrom share from which it is below
 */
public record CoolantChoice(
    String strategy,
    double kelvin,
    boolean feasible,
    Optional<Boolean> declaredMet,
    Optional<Double> watchFrom,
    Optional<Double> crystalsFrom,
    List<String> reasons,
    List<String> alternatives,
    List<String> missing) {

  /**
   * What the choice goes by.
   *
   * @param highest highest freezing temperature along the run, K
   * @param inlet coolant that there is, K: its coldest if only assumed
   * @param warmest warmest coolant the site can supply, K; empty when nobody said
   * @param plan declared plan
   * @param supplyStated whether {@code inlet} is stated
   * @param fits whether the condenser carries its duty with an inlet at this temperature
   * @param airEnough whether the bare jacket carries the duty
   * @param airWatts electrical power at which it would
   */
  record Inputs(
      double highest,
      double inlet,
      boolean supplyStated,
      Optional<Double> warmest,
      Optional<String> plan,
      java.util.function.DoublePredicate fits,
      boolean airEnough,
      Optional<Double> airWatts,
      Policy policy) {}

  static CoolantChoice of(Inputs in, Optional<Double> watchFrom, Optional<Double> crystalsFrom) {
    double need = in.highest() + Limits.value("liquidus-margin");
    boolean tempered = in.plan().filter("tempered"::equals).isPresent();
    double tap = in.supplyStated() && !tempered ? in.inlet() : Math.min(in.inlet(), Limits.band("assumed-supply").nominal());
    Draft d = need <= tap ? cold(in) : need <= in.inlet() ? warmEnough(in) : warm(in, need);
    d.byPolicy(in);
    Optional<Boolean> met = in.plan().isEmpty() || !in.supplyStated() ? Optional.empty() : Optional.of(d.met(in, need));
    return new CoolantChoice(d.strategy, d.kelvin, d.feasible, met, watchFrom, crystalsFrom, List.copyOf(d.reasons), List.copyOf(d.alternatives),
        List.copyOf(d.missing));
  }

  /** The warmest coolant by what the site has. */
  static Optional<Double> warmest(Optional<String> warmWater, double inlet) {
    double most = Limits.value("tempered-max");
    return warmWater.map(w -> switch (w) {
      case "mixer" -> Math.max(inlet, Math.min(most, Limits.value("mixer-supply-max")));
      case "circulator" -> Math.max(inlet, Math.min(most, Limits.value("circulator-supply-max")));
      default -> inlet;
    });
  }

  private static Draft warmEnough(Inputs in) {
    Draft d = new Draft("tempered", in.inlet());
    d.reasons.add(String.format(Locale.ROOT, "the oil condensing begins to freeze at up to %.0f Cel, coolant at %.0f Cel keeps it liquid", c(in.highest()), c(in.inlet())));
    return d;
  }

  private static Draft cold(Inputs in) {
    Draft d = new Draft("before-heat", in.inlet());
    d.reasons.add(String.format(Locale.ROOT, "the oil condensing never freezes above %.0f Cel, coolant enters at %.0f Cel", c(in.highest()), c(in.inlet())));
    return d;
  }

  private static Draft warm(Inputs in, double need) {
    double wanted = 273.15 + Math.ceil(c(need) - 1e-9);
    String freezes = String.format(Locale.ROOT, "the oil condensing begins to freeze at up to %.0f Cel, coolant enters at %.0f Cel", c(in.highest()), c(in.inlet()));
    if (in.warmest().filter(w -> w >= wanted).isPresent()) {
      Draft d = new Draft("tempered", wanted);
      d.reasons.add(freezes);
      d.reasons.add(String.format(Locale.ROOT, "with coolant at %.0f Cel it stays liquid", c(wanted)));
      if (!in.fits().test(wanted)) {
        d.reasons.add(String.format(Locale.ROOT, "at %.0f Cel the condenser is short for this power", c(wanted)));
        d.alternatives.add("power down: see the condenser");
      }
      return d;
    }
    return cannotWarm(in, wanted, freezes);
  }

  private static Draft cannotWarm(Inputs in, double wanted, String freezes) {
    boolean heldOff = in.airEnough() && in.policy().permits("held-off-coolant");
    double warmest = in.warmest().orElse(in.inlet());
    Draft d = new Draft(heldOff ? "held-off" : warmest > in.inlet() ? "tempered" : "before-heat", heldOff ? wanted : warmest);
    d.feasible = heldOff;
    d.reasons.add(freezes);
    if (in.warmest().isEmpty()) {
      d.missing.add("place.warm-water");
      d.reasons.add("whether the site can supply warm coolant is not known");
    } else {
      d.reasons.add(String.format(Locale.ROOT, "%.0f Cel would be wanted, the site supplies at most %.0f Cel", c(wanted), c(in.warmest().get())));
    }
    d.reasons.add(heldOff ? "the bare jacket carries the duty" : "crystals have to be watched for and melted");
    d.alternatives.add(String.format(Locale.ROOT, "coolant warmed to %.0f Cel", c(wanted)));
    in.airWatts().ifPresent(w -> d.alternatives.add(String.format(Locale.ROOT, "coolant held off where the site permits it, power down to %.0f W", w)));
    return d;
  }

  private static double c(double kelvin) {
    return kelvin - 273.15;
  }

  /** A choice in the making. */
  private static final class Draft {
    private String strategy;
    private final double kelvin;
    private boolean feasible = true;
    private final List<String> reasons = new ArrayList<>();
    private final List<String> alternatives = new ArrayList<>();
    private final List<String> missing = new ArrayList<>();

    Draft(String strategy, double kelvin) {
      this.strategy = strategy;
      this.kelvin = kelvin;
    }

    /** A site that wants water before heat wants it at the computed temperature; other wishes are met or named. */
    void byPolicy(Inputs in) {
      String wish = in.policy().coolant().orElse(strategy);
      if (wish.equals("held-off") && !strategy.equals("held-off")) {
        boolean able = in.airEnough() && in.policy().permits("held-off-coolant");
        feasible &= able;
        reasons.add(able ? "the site holds the coolant off" : "the site wants the coolant held off, but the bare jacket cannot carry the duty or the site does not permit it");
        strategy = able ? wish : strategy;
      } else if (!wish.equals(strategy)) {
        reasons.add(String.format(Locale.ROOT, "the site's policy: %s, at %.0f Cel", wish, c(kelvin)));
        strategy = wish;
      }
    }

    boolean met(Inputs in, double need) {
      boolean heldOff = in.plan().filter("held-off"::equals).isPresent();
      if (heldOff) {
        return in.policy().permits("held-off-coolant") && in.airEnough();
      }
      return feasible && in.inlet() >= Math.min(need, kelvin) && !strategy.equals("held-off");
    }
  }
}
