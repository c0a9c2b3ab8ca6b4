package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;
import static org.assertj.core.data.Percentage.withPercentage;

import java.util.LinkedHashMap;
import java.util.Map;
import org.junit.jupiter.api.Test;

class FractionationTest {
  private static Oil oil(Object... pairs) {
    Map<String, Double> m = new LinkedHashMap<>();
    for (int i = 0; i < pairs.length; i += 2) {
      m.put((String) pairs[i], (Double) pairs[i + 1]);
    }
    return Oil.ofMassShares(m, 0.010);
  }

  @Test
  void aPureOilComesOverAtOneRatioToTheEnd() {
    Fractionation f = Fractionation.of(oil("limonene", 1.0), 101_325, 0.99);
    double ratio = TwoLiquids.at(101_325, oil("limonene", 1.0)).massRatio();
    assertThat(f.complete()).isTrue();
    assertThat(f.waterForAll()).isCloseTo(0.99 * 0.010 * ratio, withPercentage(0.01));
    assertThat(f.atShare(0.5).water()).isCloseTo(0.5 * 0.010 * ratio, withPercentage(0.01));
  }

  /** Rayleigh: ln(n1/n1') / ln(n2/n2') is the ratio of the vapour pressures, nearly constant where the temperature is. */
  @Test
  void twoConstituentsFollowRayleigh() {
    Oil o = oil("trans-anethole", 0.5, "estragole", 0.5);
    Fractionation f = Fractionation.of(o, 101_325, 0.99);
    Fractionation.Point p = f.atShare(0.7);
    double measured = Math.log(o.parts().get(1).moles() / p.left()[1]) / Math.log(o.parts().get(0).moles() / p.left()[0]);
    double t = p.kelvin();
    double ratio = o.parts().get(1).substance().vapourPressure(t).orElseThrow().pascal() / o.parts().get(0).substance().vapourPressure(t).orElseThrow().pascal();
    assertThat(measured).isCloseTo(ratio, withPercentage(0.3));
  }

  @Test
  void theHeadCreepsTowardsWatersBoilingPoint() { // rule of the trade: the head creeps up as the oil is exhausted (common practice)
    Fractionation f = Fractionation.of(oil("limonene", 0.5, "eugenol", 0.5), 95_000, 0.99);
    for (int i = 1; i < f.points().size(); i++) {
      assertThat(f.points().get(i).kelvin()).isGreaterThanOrEqualTo(f.points().get(i - 1).kelvin() - 1e-6);
    }
    assertThat(f.points().get(f.points().size() - 1).kelvin()).isLessThan(WaterSteam.boilingPoint(95_000));
  }

  @Test
  void massIsKept() {
    Oil o = oil("limonene", 0.3, "cineole", 0.4, "camphor", 0.3);
    Fractionation f = Fractionation.of(o, 90_000, 0.99);
    for (Fractionation.Point p : f.points()) {
      double left = 0;
      for (int i = 0; i < p.left().length; i++) {
        left += p.left()[i] * o.parts().get(i).substance().molarMass();
      }
      assertThat(left + p.oil()).isCloseTo(o.mass(), offset(1e-9));
    }
  }

  @Test
  void theLightestGoesFirst() {
    Fractionation f = Fractionation.of(oil("alpha-pinene", 0.2, "limonene", 0.2, "anethole", 0.6), 101_325, 0.99);
    assertThat(f.points().get(0).vapour()[0]).isGreaterThan(0.2);
    assertThat(f.atShare(0.9).vapour()[2]).isGreaterThan(0.95);
  }

  @Test
  void whatHardlyComesOverIsNotCalledComplete() { // vanillin: practically not steam-volatile (substance table)
    Fractionation f = Fractionation.of(oil("vanillin", 1.0), 101_325, 0.99);
    assertThat(f.complete() ? f.waterForAll() / 0.010 : 2000).isGreaterThan(100);
  }

  @Test
  void aConstituentOfUnknownVolatilityStaysBehind() {
    Fractionation f = Fractionation.of(oil("limonene", 0.7, "beta-caryophyllene", 0.3), 101_325, 0.99);
    Fractionation.Point end = f.points().get(f.points().size() - 1);
    assertThat(end.left()[1]).isEqualTo(f.oil().parts().get(1).moles());
    assertThat(end.share()).isCloseTo(0.99, offset(1e-4));
  }

  @Test
  void onARunItIsQuick() {
    Oil o = oil("trans-anethole", 0.8, "estragole", 0.12, "limonene", 0.08);
    for (int i = 0; i < 50; i++) {
      Fractionation.of(o, 98_000 + i, 0.99);
    }
    long start = System.nanoTime();
    for (int i = 0; i < 20; i++) {
      Fractionation.of(o, 97_000 + i, 0.99);
    }
    assertThat((System.nanoTime() - start) / 20e6).as("ms a run, warm").isLessThan(50);
  }
}
