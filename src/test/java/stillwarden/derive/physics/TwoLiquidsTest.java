package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class TwoLiquidsTest {
  /** Sources stand in the table's own rows. */
  static List<List<String>> published() {
    return Tables.rows("heteroazeotropes.csv").stream().map(List::of).toList();
  }

  private static List<List<String>> rows(String use) {
    return published().stream().filter(r -> r.get(5).startsWith(use)).toList();
  }

  static List<List<String>> checks() {
    return rows("check");
  }

  static List<List<String>> controls() {
    return rows("control");
  }

  static List<List<String>> suspects() {
    return rows("suspect");
  }

  private static TwoLiquids boil(List<String> row) {
    return TwoLiquids.at(Double.parseDouble(row.get(1)) * 1000, oil(row.get(0)));
  }

  private static Oil oil(String name) {
    return Oil.pure(Substances.find(name).orElseThrow(), 1);
  }

  private static double off(List<String> row) {
    return boil(row).kelvin() - 273.15 - Double.parseDouble(row.get(2));
  }

  private static double offMass(List<String> row) {
    return 100 * boil(row).oilMassShare() - Double.parseDouble(row.get(3));
  }

  @ParameterizedTest
  @MethodSource("checks")
  void meetsThePublishedBoilingPointAndComposition(List<String> row) {
    assertThat(off(row)).as("%s, %s", row.get(0), row.get(6)).isBetween(-0.7, 0.7);
    if (!row.get(3).isEmpty()) {
      assertThat(Math.abs(offMass(row))).as("%s mass share, %s", row.get(0), row.get(6)).isLessThanOrEqualTo(Double.parseDouble(row.get(4)));
    }
  }

  @ParameterizedTest
  @MethodSource("controls")
  void aLiquidThatMixesIsFlagged(List<String> row) {
    Immiscibility i = Immiscibility.of(oil(row.get(0)));
    assertThat(i.verdict()).as(row.get(0)).isNotEqualTo(Immiscibility.Verdict.IMMISCIBLE);
    assertThat(i.reason()).isNotEmpty();
  }

  @ParameterizedTest
  @MethodSource("checks")
  void aCheckedLiquidIsNotRefused(List<String> row) {
    assertThat(Immiscibility.of(oil(row.get(0))).verdict()).as(row.get(0)).isNotEqualTo(Immiscibility.Verdict.REFUSED);
  }

  /** A suspect row contradicts measured vapour pressures where its use says so, and each carries its note. */
  @ParameterizedTest
  @MethodSource("suspects")
  void aSuspectRowIsSuspectWhereItSaysSo(List<String> row) {
    boolean temperature = Math.abs(off(row)) > 0.45;
    boolean mass = Math.abs(offMass(row)) > Double.parseDouble(row.get(4));
    assertThat(row.get(7)).as("note of %s", row.get(0)).isNotEmpty();
    assertThat(switch (row.get(5)) {
      case "suspect-t" -> temperature;
      case "suspect-wt" -> mass && !temperature;
      default -> temperature || mass;
    }).as("%s: %.2f K, %.2f %%", row.get(0), off(row), offMass(row)).isTrue();
  }

  @Test
  void ethylanilineCarriesAsPrinted() { // Treybal, Illustration 9.2: 2.77 mol of water take 0.086 mol
    TwoLiquids t = TwoLiquids.at(101_325, oil("N-ethylaniline"));
    assertThat(2.77 / t.moleRatio()).isCloseTo(0.086, offset(0.001));
  }

  @Test
  void ratiosFollowFromThePrintedPressures() {
    // exercise after Atkins: 97.7 kPa of water, 3.6 kPa of nitrobenzene give 20.11 % by mass
    assertThat(100 * share(97_700, 3600, "nitrobenzene")).isCloseTo(20.11, offset(0.02));
    // student report: 525.8 and 234.2 mmHg of chlorobenzene give 73.6 % by mass
    assertThat(100 * share(525.8, 234.2, "chlorobenzene")).isCloseTo(73.6, offset(0.1));
    // exercise: 760 and 4 torr of eugenol give 4.6 % by mass
    assertThat(100 * share(760, 4, "eugenol")).isCloseTo(4.6, offset(0.05));
    // exercise: 100 kPa, 29 kPa of chlorobenzene: 140 g of distillate for 100 g
    assertThat(100 / share(71, 29, "chlorobenzene")).isCloseTo(139.2, offset(0.1));
  }

  private static double share(double water, double organic, String name) {
    return new TwoLiquids(oil(name), 370, water, new double[] {organic}, List.of(), List.of(), 0).oilMassShare();
  }

  @Test
  void narayanansMoleShareOfWater() { // Narayanan, Chemical Engineering Thermodynamics, example 8.27: 88.5 and 4.80 kPa
    double ratio = new TwoLiquids(oil("aniline"), 368.24, 88_500, new double[] {4800}, List.of(), List.of(), 0).moleRatio();
    assertThat(100 * ratio / (1 + ratio)).isCloseTo(94.86, offset(0.01));
  }

  @Test
  void anOilThatAddsHalfAKilopascalShiftsTheBoilByAFewTenths() { // cinnamaldehyde 0.50 kPa at 100 degC: 0.14 K (computed elsewhere)
    assertThat(WaterSteam.boilingPoint(101_325) - TwoLiquids.at(101_325, oil("cinnamaldehyde")).kelvin()).isCloseTo(0.14, offset(0.01));
  }

  @Test
  void pressuresAddUpToThatOfThePlace() {
    Oil oil = Oil.ofMassShares(Map.of("limonene", 0.3, "cineole", 0.4, "camphor", 0.3), 0.01);
    for (double p : new double[] {70_000, 84_500, 101_325}) {
      TwoLiquids t = TwoLiquids.at(p, oil);
      assertThat(t.waterPascal() + t.oilTotal()).isCloseTo(p, offset(0.5));
      assertThat(t.kelvin()).isLessThan(WaterSteam.boilingPoint(p));
    }
  }

  @Test
  void whatIsUnknownAddsNothingAndIsNamed() {
    TwoLiquids t = TwoLiquids.at(101_325, Oil.ofMassShares(Map.of("limonene", 0.6, "terpinen-4-ol", 0.3, "unobtainium oil", 0.1), 0.01));
    assertThat(t.unknown()).contains("terpinen-4-ol", "unobtainium oil");
    assertThat(t.unknownShare()).isBetween(0.3, 0.45);
  }
}
