package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.Map;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Rig;
import stillwarden.describe.Tree;

class ChargeTest {
  private static final String[] UNSTATED = {"charge.oil.expected = -", "charge.oil.makeup.trans-anethole = -", "charge.oil.makeup.estragole = -", "charge.oil.makeup.limonene = -"};

  private static Object n(double v) {
    return BigDecimal.valueOf(v);
  }

  private static Tree plant(double anethole, double limonene) {
    Map<String, Object> makeup = new LinkedHashMap<>();
    makeup.put("trans-anethole", Map.of("low", n(0.5), "nominal", n(anethole), "high", n(0.9)));
    makeup.put("limonene", Map.of("low", n(0.01), "nominal", n(limonene), "high", n(0.3)));
    return new Tree(Map.of("name", "seed", "oil-share", Map.of("low", n(0.02), "high", n(0.06)), "makeup", makeup, "foams", "some",
        "water-uptake", Map.of("low", n(0.5), "high", n(1.8)), "solids-volume", Map.of("low", n(0.7), "high", n(1.1))));
  }

  private static Rig rig() {
    return Rigs.fennel(UNSTATED);
  }

  @Test
  void whatTheRigDoesNotSayComesFromThePlantsBandsAndIsSaid() {
    Charge c = Charge.of(rig(), plant(0.8, 0.2));
    assertThat(c.oilMass().orElseThrow().low()).isCloseTo(0.060 * 0.02, offset(1e-9));
    assertThat(c.oilMass().orElseThrow().high()).isCloseTo(0.060 * 0.06, offset(1e-9));
    assertThat(c.uptake().high()).isCloseTo(0.060 * 1.8e-3, offset(1e-9));
    assertThat(c.displaced().nominal()).isCloseTo(0.060 * 0.9e-3, offset(1e-9));
    assertThat(c.foams()).contains("some");
    assertThat(c.notes()).anyMatch(s -> s.contains("make-up")).anyMatch(s -> s.contains("oil expected")).anyMatch(s -> s.contains("takes up"));
  }

  @Test
  void whatTheRigSaysStandsBeforeThePlant() {
    Charge c = Charge.of(Rigs.fennel(), plant(0.1, 0.9));
    assertThat(c.oilMass().orElseThrow().high()).isCloseTo(0.0018, offset(1e-9));
    assertThat(c.oil().orElseThrow().parts()).hasSize(3);
  }

  @Test
  void whatAMakeUpLeavesUnsaidIsOfUnknownVolatility() {
    Oil oil = Charge.of(rig(), plant(0.6, 0.2)).oil().orElseThrow();
    assertThat(oil.unlisted()).containsExactly(Charge.REST);
    assertThat(oil.unlistedMoles() / oil.moles()).isCloseTo(0.2, offset(0.01));
  }

  @Test
  void withoutPlantOrMakeUpTheOilIsUnknownAndAskedFor() {
    Charge c = Charge.of(rig(), Tree.EMPTY);
    assertThat(c.oil()).isEmpty();
    assertThat(c.missing()).contains("charge.oil.makeup");
  }

  @Test
  void aPureLiquidIsNotDispersed() {
    Charge c = Charge.of(Rigs.fennel("charge.material = -", "charge.material-mass = -"), Tree.EMPTY);
    assertThat(c.dispersed()).isFalse();
    assertThat(c.uptake()).isEqualTo(Band.of(0));
  }

  @Test
  void aFreeOilLayerTakesItsRoomInTheFlask() { // 100 g of toluene at 862.3 kg/m3 (CRC): 116 mL
    Charge c = Charge.of(Rigs.fennel("charge.material = -", "charge.material-mass = -", "charge.oil.expected = 100 g", "charge.oil.makeup.trans-anethole = -",
        "charge.oil.makeup.estragole = -", "charge.oil.makeup.limonene = -", "charge.oil.makeup.toluene = 100 %"), Tree.EMPTY);
    assertThat(c.displaced().nominal() * 1e6).isCloseTo(116, offset(0.1));
  }
}
