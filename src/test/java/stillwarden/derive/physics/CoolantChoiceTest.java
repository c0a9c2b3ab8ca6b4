package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Policy;

class CoolantChoiceTest {
  private static final String[] LIMONENE = {"charge.oil.makeup.trans-anethole = -", "charge.oil.makeup.estragole = -", "charge.oil.makeup.limonene = 100 %"};

  private static CoolantChoice choice(Policy policy, String... changes) {
    return Physics.numbers(Rigs.fennel(changes), policy, List.of(), null).facts().coolant().orElseThrow();
  }

  private static CoolantChoice choice(String... changes) {
    return choice(Policy.NONE, changes);
  }

  private static String[] with(String[] some, String... more) {
    String[] all = java.util.Arrays.copyOf(some, some.length + more.length);
    System.arraycopy(more, 0, all, some.length, more.length);
    return all;
  }

  @Test
  void anOilThatStaysLiquidGetsWaterBeforeHeat() {
    CoolantChoice c = choice(with(LIMONENE, "condenser.coolant.supply = 12 Cel", "condenser.coolant.plan = before-heat"));
    assertThat(c.strategy()).isEqualTo("before-heat");
    assertThat(c.kelvin() - 273.15).isCloseTo(12, offset(0.01));
    assertThat(c.declaredMet()).contains(true);
    assertThat(c.crystalsFrom()).isEmpty();
  }

  /** Freezing temperature along the run (21.2 degC at 95 % over, see LiquidusTest) + 2 K, rounded up. */
  private static double wanted() {
    double highest = Physics.numbers(Rigs.fennel(), Policy.NONE, List.of(), null).facts().liquidusHighest().orElseThrow().nominal() - 273.15;
    assertThat(highest).isBetween(20.4, 21.9);
    return Math.ceil(highest + 2);
  }

  @Test
  void aFennelOilWithColdWaterIsTempered() {
    CoolantChoice c = choice("condenser.coolant.supply = 12 Cel", "condenser.coolant.plan = before-heat");
    assertThat(c.strategy()).isEqualTo("tempered");
    assertThat(c.kelvin() - 273.15).isCloseTo(wanted(), offset(0.01));
    assertThat(c.declaredMet()).contains(false);
    assertThat(c.crystalsFrom().orElseThrow()).isBetween(0.3, 0.45);
    assertThat(c.watchFrom().orElseThrow()).isLessThan(c.crystalsFrom().orElseThrow());
  }

  @Test
  void declaredTemperedWaterThatIsWarmEnoughIsMet() {
    CoolantChoice c = choice();
    assertThat(c.strategy()).isEqualTo("tempered");
    assertThat(c.kelvin() - 273.15).isCloseTo(28, offset(0.01));
    assertThat(c.declaredMet()).contains(true);
  }

  @Test
  void declaredTemperedWaterThatIsTooColdIsNot() {
    assertThat(choice("condenser.coolant.supply = 20 Cel").declaredMet()).contains(false);
  }

  @Test
  void aSiteWithoutWarmWaterIsToldSoWithTheAlternatives() {
    CoolantChoice c = choice("condenser.coolant.supply = 12 Cel", "place.warm-water = none");
    assertThat(c.feasible()).isFalse();
    assertThat(c.strategy()).isEqualTo("before-heat");
    assertThat(c.reasons()).anyMatch(r -> r.contains(Math.round(wanted()) + " Cel") && r.contains("12 Cel"));
    assertThat(c.alternatives()).hasSize(2);
  }

  @Test
  void whereNobodySaysWhatTheSiteSuppliesItIsAsked() {
    assertThat(choice("condenser.coolant.supply = 12 Cel", "place.warm-water = -").missing()).contains("place.warm-water");
  }

  @Test
  void temperedCoolantIsNeverAskedForAboveWhatTheSiteSupplies() { // thymol alone freezes at 49.6 degC, a mixing tap gives 45
    CoolantChoice c = choice(with(LIMONENE, "charge.oil.makeup.limonene = -", "charge.oil.makeup.thymol = 100 %", "condenser.coolant.supply = 12 Cel", "place.warm-water = mixer"));
    assertThat(c.kelvin() - 273.15).isCloseTo(45, offset(0.01));
    assertThat(c.strategy()).isEqualTo("tempered");
    assertThat(c.feasible()).isFalse();
  }

  @Test
  void camphorAtAFifthDoesNotNeedWarmCoolantAtTheStart() {
    CoolantChoice c = choice(with(LIMONENE, "charge.oil.makeup.limonene = 80 %", "charge.oil.makeup.camphor = 20 %", "condenser.coolant.supply = 12 Cel", "condenser.coolant.plan = before-heat"));
    assertThat(c.kelvin() - 273.15).as("never the melting point of camphor").isLessThan(61);
    assertThat(c.crystalsFrom().orElse(1.0)).isGreaterThan(0.3);
  }

  @Test
  void aPolicyOfWaterBeforeHeatMeansAtTheComputedTemperature() {
    CoolantChoice c = choice(Rigs.policy(Map.of(), Map.of(), "before-heat"), "condenser.coolant.supply = 12 Cel");
    assertThat(c.strategy()).isEqualTo("before-heat");
    assertThat(c.kelvin() - 273.15).isCloseTo(wanted(), offset(0.01));
    assertThat(c.reasons()).anyMatch(r -> r.contains("policy"));
  }

  @Test
  void heldOffNeedsThePermitAndABareJacketThatIsEnough() {
    String[] gentle = {"condenser.coolant.supply = 12 Cel", "place.warm-water = none", "mantle.power = 60 W", "condenser.jacket-length = 600 mm"};
    assertThat(choice(gentle).strategy()).isEqualTo("before-heat");
    CoolantChoice permitted = choice(Rigs.policy(Map.of(), Map.of("held-off-coolant", true), null), gentle);
    assertThat(permitted.strategy()).isEqualTo("held-off");
    assertThat(permitted.feasible()).isTrue();
  }

  @Test
  void aWishForHeldOffThatTheJacketCannotCarryIsNamed() {
    CoolantChoice c = choice(Rigs.policy(Map.of(), Map.of("held-off-coolant", true), "held-off"), "condenser.coolant.supply = 12 Cel");
    assertThat(c.feasible()).isFalse();
    assertThat(c.reasons()).anyMatch(r -> r.contains("held off"));
  }

  @Test
  void aRoomColderThanTheCondensateFreezesItInTheTakeOff() {
    assertThat(Physics.numbers(Rigs.fennel("place.room = 15 Cel"), Policy.NONE, List.of(), null).facts().freezesInTakeOff()).contains(true);
    assertThat(Physics.numbers(Rigs.fennel("place.room = 26 Cel"), Policy.NONE, List.of(), null).facts().freezesInTakeOff()).contains(false);
  }

  @Test
  void anOilOfUnknownMakeupHasNoStrategyAndIsAskedFor() {
    Numbers n = Physics.numbers(
        Rigs.fennel("charge.oil.makeup.trans-anethole = -", "charge.oil.makeup.estragole = -", "charge.oil.makeup.limonene = -"), Policy.NONE, List.of(), null);
    assertThat(n.facts().coolant()).isEmpty();
    assertThat(n.get("coolant-strategy").missing()).contains("charge.oil.makeup");
  }

  @Test
  void crystalsArePredictedAsATimeInTheRun() {
    Numbers n = Physics.numbers(Rigs.fennel("condenser.coolant.supply = 12 Cel"), Policy.NONE, List.of(), null);
    assertThat(n.get("crystals-possible-from").known()).isTrue();
    assertThat(n.get("crystals-possible-from").nominal()).isGreaterThan(n.get("heat-up-time").nominal());
    assertThat(n.words()).containsEntry("coolant-strategy", "tempered");
  }

  @Test
  void whatCondensesNowRisesAlongTheRun() {
    Numbers start = Physics.numbers(Rigs.fennel(), Policy.NONE, List.of(), null);
    Numbers later = Physics.numbers(Rigs.fennel(), Policy.NONE, List.of(Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(40, "receiver-level", "80 mL")), Rigs.at(40));
    assertThat(later.facts().liquidusNow().orElseThrow().nominal()).isGreaterThan(start.facts().liquidusNow().orElseThrow().nominal());
  }
}
