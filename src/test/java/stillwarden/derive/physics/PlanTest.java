package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.util.List;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Policy;

class PlanTest {
  private static Plan.Curve curve(Plan p, String name) {
    return p.curves().stream().filter(c -> c.name().equals(name)).findFirst().orElseThrow();
  }

  private static double last(double[] a) {
    return a[a.length - 1];
  }

  @Test
  void theCurvesCoverWhatThePageDraws() {
    Plan p = Plan.of(Rigs.fennel(), Policy.NONE);
    assertThat(p.curves().stream().map(Plan.Curve::name)).contains("distillate", "flask-level", "reservoir-level", "receiver-level", "head-temperature",
        "oil-collected", "freezing-point-of-condensate", "share-of-condensing-oil.limonene");
  }

  @Test
  void everyCurveHasItsBandAndRisingTime() {
    for (Plan.Curve c : Plan.of(Rigs.fennel(), Policy.NONE).curves()) {
      for (int i = 0; i < c.minutes().length; i++) {
        assertThat(c.value()[i]).as(c.name()).isBetween(c.low()[i] - 1e-9, c.high()[i] + 1e-9);
        if (i > 0) {
          assertThat(c.minutes()[i]).isGreaterThan(c.minutes()[i - 1]);
        }
      }
    }
  }

  @Test
  void theRunIsDrawnToItsTarget() {
    Plan p = Plan.of(Rigs.fennel(), Policy.NONE);
    assertThat(last(curve(p, "distillate").value())).isCloseTo(150, offset(0.01));
    assertThat(last(curve(p, "distillate").minutes())).isCloseTo(p.numbers().get("time-to-target").nominal(), offset(0.01));
  }

  @Test
  void waterIsKept() { // what left flask and reservoir is the water in the distillate
    Plan p = Plan.of(Rigs.fennel(), Policy.NONE);
    double gone = curve(p, "flask-level").value()[0] + curve(p, "reservoir-level").value()[0] - last(curve(p, "flask-level").value()) - last(curve(p, "reservoir-level").value());
    assertThat(gone).isBetween(140.0, 150.0);
  }

  @Test
  void theFlaskIsHeldUpByTheReservoirAndThenFalls() {
    Plan p = Plan.of(Rigs.fennel("target.distillate = 350 mL"), Policy.NONE);
    Plan.Curve flask = curve(p, "flask-level");
    double empty = p.ends().stream().filter(e -> e.what().equals("reservoir")).findFirst().orElseThrow().minutes();
    for (int i = 0; i < flask.minutes().length; i++) {
      if (flask.minutes()[i] <= empty) {
        assertThat(flask.value()[i]).isCloseTo(flask.value()[0], offset(0.01));
      }
    }
    assertThat(last(flask.value())).isLessThan(flask.value()[0] - 100);
  }

  @Test
  void theRunNeverGoesBelowTheMinimumLevel() {
    Plan p = Plan.of(Rigs.fennel("target.distillate = 900 mL"), Policy.NONE);
    assertThat(last(curve(p, "flask-level").value())).isCloseTo(150, offset(0.1));
  }

  @Test
  void endsComeInOrder() {
    List<Plan.End> ends = Plan.of(Rigs.fennel(), Policy.NONE).ends();
    assertThat(ends).extracting(Plan.End::minutes).isSorted();
    assertThat(ends).extracting(Plan.End::what).contains("target", "oil-over", "reservoir", "minimum-level", "full-receiver");
  }

  @Test
  void withoutHeatThereAreNumbersButNoCurves() {
    Plan p = Plan.of(Rigs.of(List.of("place.elevation = 250 m")), Policy.NONE);
    assertThat(p.curves()).isEmpty();
    assertThat(p.numbers().get("pressure-here").known()).isTrue();
  }
}
