package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.time.Duration;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import stillwarden.derive.Estimate;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

class PhysicsTest {
  private static Numbers plan(String... changes) {
    return Physics.numbers(Rigs.fennel(changes), Policy.NONE, List.of(), null);
  }

  private static Numbers run(double minute, Rig rig, Entry... log) {
    return Physics.numbers(rig, Policy.NONE, List.of(log), Rigs.at(minute));
  }

  private static Numbers run(double minute, Entry... log) {
    return run(minute, Rigs.fennel(), log);
  }

  private static double value(Numbers n, String name) {
    Estimate e = n.get(name);
    assertThat(e.known()).as("%s: %s", name, e.reason()).isTrue();
    return e.nominal();
  }

  @Test
  void everyNameIsThereInTheContractsOrder() {
    assertThat(plan().all().keySet()).containsExactlyElementsOf(Numbers.UNITS.keySet()).hasSize(33);
    assertThat(plan().list().get(0).name()).isEqualTo("pressure-here");
  }

  @Test
  void aWellDescribedRigLacksNothingThatItShouldHave() {
    List<String> absent = plan().list().stream().filter(e -> !e.known()).map(Estimate::name).toList();
    assertThat(absent).containsExactlyInAnyOrder("crystals-possible-from", "seal-back-pressure");
  }

  @Test
  void anEmptyRigHasReasonsAndNoNumberItCannotKnow() {
    Numbers n = Physics.numbers(Rigs.of(List.of("place.warm-water = none")), Policy.NONE, List.of(), null);
    assertThat(n.list()).filteredOn(Estimate::known).isEmpty();
    assertThat(n.list()).allSatisfy(e -> assertThat(e.reason()).isNotBlank());
    assertThat(n.get("pressure-here").missing()).contains("place.elevation", "place.barometer");
  }

  @Test
  void missingPathsCarryTheUsersOwnNames() {
    Rig rig = Rigs.of(List.of("pot.kind = round-bottom-flask", "heater.kind = heating-mantle", "charge.water = 400 mL"));
    assertThat(Physics.numbers(rig, Policy.NONE, List.of(), null).get("boil-up-rate").missing()).contains("heater.power", "pot.volume").doesNotContain("charge.water");
  }

  @Test
  void theSameInputGivesTheSameNumbers() {
    assertThat(plan().all()).isEqualTo(plan().all());
  }

  @Test
  void theBoilIsBelowWatersByTheOilsShare() { // water at 98.36 kPa: 99.14 degC (IAPWS-IF97)
    Numbers n = plan();
    assertThat(value(n, "water-boiling-point-here")).isCloseTo(99.14, offset(0.02));
    assertThat(value(n, "boiling-point-here") + value(n, "co-boiling-shift")).isCloseTo(value(n, "water-boiling-point-here"), offset(1e-6));
  }

  @Test
  void aStationBarometerNarrowsTheBand() {
    Estimate byHeight = plan().get("water-boiling-point-here");
    Estimate read = plan("place.barometer = 98.4 kPa", "place.barometer-is = station").get("water-boiling-point-here");
    assertThat(read.high() - read.low()).isLessThan(0.2 * (byHeight.high() - byHeight.low()));
  }

  @Test
  void boilUpIsNetPowerOverLatentHeat() { // 100 W net boil 2.66 g/min of water (IAPWS-IF97); loss and efficiency stated
    Numbers n = plan();
    Heat h = Heat.of(RigParts.of(Rigs.fennel()), RunState.of(List.of(), null), 372, 294.15).orElseThrow();
    assertThat(value(n, "boil-up-rate")).isCloseTo(h.net().nominal() / 100 * 2.66, offset(0.2));
  }

  @Test
  void theTimesFollowFromTheRate() {
    Numbers n = plan();
    double minutes = value(n, "heat-up-time") + 200 * 0.997 / value(n, "boil-up-rate");
    assertThat(value(n, "time-to-reservoir-end")).isCloseTo(minutes, offset(1.0));
    assertThat(value(n, "time-to-minimum-level")).isLessThan(value(n, "time-to-dryness"));
  }

  @Test
  void withoutAStatedPowerTheMantlesSizeGivesABandAndSaysSo() { // 1 L mantle: 300 to 400 W, catalogue practice, scatter 30 %
    Estimate e = plan("mantle.power = -").get("boil-up-rate");
    assertThat(e.notes()).anyMatch(s -> s.contains("not stated"));
    assertThat(e.high() / e.low()).isGreaterThan(2.5);
  }

  @Test
  void aDialOfUnknownMeaningWidensTheRate() {
    Entry on = Rigs.did(0, "heat-on", "60 %");
    Estimate duty = run(1, on).get("boil-up-rate");
    Estimate unknown = run(1, Rigs.fennel("regulator.setting-means = unknown"), on).get("boil-up-rate");
    assertThat(unknown.low()).isLessThan(duty.low());
    assertThat(unknown.high()).isGreaterThan(duty.high());
    assertThat(unknown.notes()).anyMatch(s -> s.contains("dial"));
  }

  @Test
  void readingsReplaceTheAssumedRate() { // 4 mL/min read off three times
    Numbers n = run(50, Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(30, "receiver-level", "40 mL"),
        Rigs.saw(40, "receiver-level", "80 mL"), Rigs.saw(50, "receiver-level", "120 mL"));
    assertThat(n.get("boil-up-rate").method()).contains("fitted");
    assertThat(value(n, "boil-up-rate")).isCloseTo(4 * 0.997, offset(0.03));
    assertThat(value(n, "time-to-target")).isCloseTo(30 / 4.0, offset(0.1));
    assertThat(value(n, "time-to-full-receiver")).isCloseTo(80 / 4.0, offset(0.1));
  }

  @Test
  void scatteredReadingsGiveAWiderBand() {
    Entry on = Rigs.did(0, "heat-on", "60 %");
    Estimate tight = run(50, on, Rigs.saw(20, "first-drop", "yes"), Rigs.saw(30, "receiver-level", "40 mL"), Rigs.saw(40, "receiver-level", "80 mL"), Rigs.saw(50, "receiver-level", "121 mL")).get("boil-up-rate");
    Estimate loose = run(50, on, Rigs.saw(20, "first-drop", "yes"), Rigs.saw(30, "receiver-level", "40 mL"), Rigs.saw(40, "receiver-level", "70 mL"), Rigs.saw(50, "receiver-level", "120 mL")).get("boil-up-rate");
    assertThat(loose.high() - loose.low()).isGreaterThan(2 * (tight.high() - tight.low()));
  }

  @Test
  void readingsBeforeTheHeatWasChangedDoNotCount() {
    Numbers n = run(52, Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(30, "receiver-level", "40 mL"),
        Rigs.saw(40, "receiver-level", "80 mL"), Rigs.saw(50, "receiver-level", "120 mL"), Rigs.did(51, "set-heat", "40 %"));
    assertThat(n.get("boil-up-rate").method()).doesNotContain("fitted");
  }

  @Test
  void aLevelWordCountsFromItsWorseEnd() {
    Entry on = Rigs.did(0, "heat-on", "60 %");
    Numbers low = run(52, on, Rigs.saw(20, "first-drop", "yes"), Rigs.saw(52, "flask-level", "low"));
    assertThat(value(low, "time-to-minimum-level")).isZero();
    assertThat(low.get("time-to-minimum-level").high()).isPositive();
    Numbers ok = run(52, on, Rigs.saw(20, "first-drop", "yes"), Rigs.saw(52, "flask-level", "ok"));
    assertThat(value(ok, "time-to-minimum-level")).isCloseTo(37.5 / value(ok, "boil-up-rate"), offset(1.5));
  }

  @Test
  void aLookIsCarriedForward() {
    Entry[] log = {Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(30, "flask-level", "400 mL")};
    double early = value(run(30, log), "time-to-minimum-level");
    assertThat(value(run(40, log), "time-to-minimum-level")).isCloseTo(early - 10, offset(0.2));
  }

  @Test
  void feedingFillsTheFlaskAndEmptiesTheReservoir() {
    Numbers n = run(30, Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(28, "flask-level", "300 mL"), Rigs.did(29, "feed", "50 mL"));
    assertThat(n.facts().flaskLevel().orElseThrow().nominal() * 1e6).isBetween(335.0, 350.0);
    assertThat(n.facts().reservoirLevel().orElseThrow().nominal() * 1e6).isCloseTo(150, offset(0.1));
    assertThat(n.facts().feedStopsBoil()).isTrue();
    assertThat(Duration.between(Rigs.at(29), n.facts().feedRecovery().orElseThrow()).toSeconds()).isBetween(90L, 150L);
  }

  @Test
  void aFewMillilitresDoNotStopTheBoil() {
    Numbers n = run(30, Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.did(29, "feed", "5 mL"));
    assertThat(n.facts().feedStopsBoil()).isFalse();
  }

  @Test
  void withTheHeatOffNothingRunsOut() {
    Numbers n = run(40, Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.did(39, "cut-power", "yes"));
    assertThat(n.get("time-to-dryness").reason()).isEqualTo("the heat is off");
  }

  @Test
  void moreWaterGoneThanTheHeaterCouldBoilIsAFact() {
    Entry[] log = {Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(25, "flask-level", "150 mL")};
    assertThat(run(25, log).facts().leakSuspected().orElseThrow()).contains("leak");
    Entry[] slow = {Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(60, "flask-level", "300 mL")};
    assertThat(run(60, slow).facts().leakSuspected()).isEmpty();
  }

  @Test
  void whenAsMuchCameOverTheRigFileIsDoubtedInstead() {
    Entry[] log = {Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(25, "receiver-level", "240 mL"), Rigs.saw(25, "flask-level", "150 mL")};
    assertThat(run(25, log).facts().leakSuspected().orElseThrow()).contains("power in the rig file");
  }

  @Test
  void aSolubleOilIsRefusedWithTheReason() {
    Numbers n = plan("charge.oil.makeup.trans-anethole = -", "charge.oil.makeup.estragole = -", "charge.oil.makeup.limonene = -", "charge.oil.makeup.furfural = 100 %");
    assertThat(n.get("mass-ratio-water-to-oil").reason()).contains("dissolve");
    assertThat(n.facts().immiscible().orElseThrow().verdict()).isEqualTo(Immiscibility.Verdict.REFUSED);
    assertThat(n.get("boil-up-rate").known()).as("water still boils").isTrue();
  }

  @Test
  void anOilOfUnknownVolatilityHasNoRatios() {
    Numbers n = plan("charge.oil.makeup.trans-anethole = -", "charge.oil.makeup.estragole = -", "charge.oil.makeup.limonene = -", "charge.oil.makeup.citronellal = 100 %");
    assertThat(n.get("mole-ratio-water-to-oil").reason()).contains("volatility unknown").contains("citronellal");
    assertThat(n.get("water-boiling-point-here").known()).isTrue();
  }

  @Test
  void hardlyVolatileConstituentsAreNamed() { // eugenol 3.3 mmHg and cinnamaldehyde 3.8 mmHg at 100 degC (substance table)
    Numbers n = plan("charge.oil.makeup.limonene = -", "charge.oil.makeup.eugenol = 8 %");
    assertThat(n.facts().hardlyVolatile()).containsExactly("eugenol");
    assertThat(n.get("boiling-point-here").notes()).anyMatch(s -> s.contains("hardly"));
  }

  @Test
  void waterNeededIsTheIdealTimesTheDiffusionBand() {
    Numbers n = plan();
    assertThat(value(n, "water-needed")).isCloseTo(5 * value(n, "water-needed-ideal"), offset(0.1));
    assertThat(n.get("water-needed").notes()).anyMatch(s -> s.contains("diffusion factor"));
  }

  @Test
  void waterInThePlantIsNotThereToBoil() {
    double with = value(plan(), "water-available");
    double without = value(plan("charge.material-mass = 0 g"), "water-available");
    assertThat(with).as("60 g hold about 60 mL, displace 50").isLessThan(without);
  }

  @Test
  void tooLittleWaterNamesBothWaysOut() {
    SideFacts.Shortage s = plan("charge.water = 250 mL", "reservoir.water = 0 mL").facts().waterBudget().orElseThrow();
    assertThat(s.alternatives()).hasSize(2).anyMatch(a -> a.contains("more water")).anyMatch(a -> a.contains("target down"));
    assertThat(plan().facts().waterBudget()).isEmpty();
  }

  @Test
  void fillCountsThePlant() { // 400 mL + 60 g / 1.2 g/mL in 1 L
    assertThat(value(plan(), "flask-fill")).isCloseTo(45, offset(0.1));
    assertThat(plan("charge.solids-volume = 80 mL").get("flask-fill").nominal()).isCloseTo(48, offset(0.01));
  }

  @Test
  void anOverfullFlaskNamesBothWaysOut() {
    SideFacts.Shortage s = plan("charge.water = 700 mL", "charge.foams = strongly").facts().overfull().orElseThrow();
    assertThat(s.alternatives()).hasSize(2);
    assertThat(plan("charge.foams = no").facts().overfull()).isEmpty();
  }

  @Test
  void aShortCondenserSaysHowFarTheHeatMustComeDown() {
    SideFacts.CondenserVerdict v = plan("condenser.jacket-length = 200 mm").facts().condenser().orElseThrow();
    assertThat(v.enough()).isFalse();
    assertThat(v.alternatives()).anyMatch(a -> a.startsWith("power down to"));
    double watts = Double.parseDouble(v.alternatives().get(0).replaceAll("[^0-9]", ""));
    Numbers lower = plan("condenser.jacket-length = 200 mm", "mantle.power = " + watts + " W");
    assertThat(lower.facts().condenser().orElseThrow().enough()).as("and then it is enough").isTrue();
  }

  @Test
  void aLongCondenserIsEnough() {
    assertThat(plan("condenser.jacket-length = 500 mm").facts().condenser().orElseThrow().enough()).isTrue();
  }

  @Test
  void moreCoolantHelpsWhereItIsTheCoolantThatIsShort() {
    SideFacts.CondenserVerdict v = plan("condenser.jacket-length = 500 mm", "condenser.coolant.flow = 0.06 L/min").facts().condenser().orElseThrow();
    String way = v.alternatives().stream().filter(a -> a.startsWith("coolant flow up to")).findFirst().orElseThrow();
    double flow = Double.parseDouble(way.replaceAll("[^0-9.]", ""));
    assertThat(plan("condenser.jacket-length = 500 mm", "condenser.coolant.flow = " + flow + " L/min").facts().condenser().orElseThrow().enough()).isTrue();
  }

  @Test
  void theMantleMustBeTheFlasksSize() {
    assertThat(plan().facts().mantle().orElseThrow().fits()).isTrue();
    assertThat(plan("mantle.fits = 2 L").facts().mantle().orElseThrow().fits()).isFalse();
    assertThat(plan("mantle.heated-up-to = 400 mL").facts().mantle().orElseThrow().why()).contains("minimum level");
  }

  @Test
  void theQuietWaitIsAClockTime() { // 99 to 79 degC: 14 to 28 min for 0.5 kg (computed elsewhere)
    double volume = 4 / 3.0 * Math.PI * Math.pow(Math.sqrt(0.035 / (4 * Math.PI)), 3);
    Band s = ClosedVessel.cooling(Band.of(0.5 * 4186), volume, 372.15, 352.15, 293.15).orElseThrow();
    assertThat(s.low() / 60).isCloseTo(14, offset(1.0));
    assertThat(s.high() / 60).isCloseTo(28, offset(1.5));
    assertThat(plan().facts().coolsToQuiet()).isPresent();
  }

  @Test
  void aBarometerInTheLogStandsBeforeTheRigs() {
    assertThat(value(run(1, Rigs.saw(0, "barometer", "95 kPa")), "pressure-here")).isCloseTo(95, offset(0.01));
  }

  @Test
  void laterLinesAreLeftOut() {
    Entry[] log = {Rigs.did(0, "heat-on", "60 %"), Rigs.saw(30, "flask-level", "dry")};
    assertThat(run(10, log).facts().flaskLevel().orElseThrow().nominal()).isPositive();
  }

  @Test
  void noNumberIsEverNotANumber() {
    for (String change : List.of("mantle.power = 20 W", "charge.water = 0 mL", "condenser.coolant.flow = 0 L/min", "charge.oil.expected = 0 g", "flask.volume = 5 L", "place.room = 40 Cel", "condenser.coolant.supply = 99 Cel")) {
      assertThat(plan(change).list()).as(change).allSatisfy(e -> assertThat(e.low()).isLessThanOrEqualTo(e.high()));
    }
  }

  @Test
  void aSiteMayTightenTheMargin() {
    Policy strict = Rigs.policy(Map.of("condenser-margin-min", 3.0), Map.of(), null);
    assertThat(Physics.numbers(Rigs.fennel("condenser.jacket-length = 500 mm"), strict, List.of(), null).facts().condenser().orElseThrow().enough()).isFalse();
  }

  @Test
  void anUnknownAmountOfOilGivesNoTimeToCrystals() {
    Numbers n = plan("charge.oil.expected = -", "condenser.coolant.supply = 12 Cel");
    assertThat(n.get("crystals-possible-from").known()).isFalse();
    assertThat(n.get("crystals-possible-from").missing()).contains("charge.oil.expected");
    assertThat(n.get("water-needed").missing()).contains("charge.oil.expected");
  }

  @Test
  void aTemperatureReadOnTheWayUpSetsTheRestOfTheHeatUp() { // half way up, half the time is left
    Entry on = Rigs.did(0, "heat-on", "60 %");
    Numbers warm = run(8, on, Rigs.saw(8, "flask-temperature", "59.8 Cel"));
    Numbers boiling = run(8, on, Rigs.saw(8, "first-drop", "yes"));
    double left = value(warm, "time-to-reservoir-end") - value(boiling, "time-to-reservoir-end");
    assertThat(left).isCloseTo(value(warm, "heat-up-time") / 2, offset(0.1));
  }

  @Test
  void aBoilThatNobodyLoggedHeatForIsHeated() {
    assertThat(run(30, Rigs.saw(20, "first-drop", "yes")).get("time-to-dryness").known()).isTrue();
  }

  @Test
  void aPlannedTimeIsATargetWhereNothingElseIs() {
    assertThat(run(30, Rigs.fennel("target.distillate = -", "target.time = 90 min"), Rigs.did(0, "heat-on", "60 %")).get("time-to-target").nominal()).isCloseTo(60, offset(0.01));
  }

  @Test
  void aWordForTheLevelDoesNotBlowUpTheFill() { // 45 % at the start, 20 mL boiled away
    Entry[] log = {Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(25, "flask-level", "ok")};
    Estimate fill = run(25, log).get("flask-fill");
    assertThat(fill.high()).isLessThan(46);
    assertThat(fill.nominal()).isBetween(40.0, 45.0);
  }
}
