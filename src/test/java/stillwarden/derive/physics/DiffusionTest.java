package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;

class DiffusionTest {
  private static List<Entry> run(String... looks) {
    List<Entry> log = new ArrayList<>(List.of(Rigs.did(0, "heat-on", "60 %"), Rigs.saw(20, "first-drop", "yes"), Rigs.saw(30, "receiver-level", "40 mL"),
        Rigs.saw(40, "receiver-level", "80 mL"), Rigs.saw(50, "receiver-level", "120 mL")));
    for (int i = 0; i < looks.length; i++) {
      log.add(Rigs.saw(50 + i, "distillate-look", looks[i]));
    }
    return log;
  }

  @Test
  void isTheWaterOverWhenItStayedClearAgainstTheIdeal() { // 120 mL at minute 50
    double ideal = Physics.numbers(Rigs.fennel(), Policy.NONE, List.of(), null).get("water-needed-ideal").nominal();
    assertThat(Diffusion.fitted(Rigs.fennel(), Policy.NONE, run("clear", "clear", "clear")).orElseThrow()).isCloseTo(120 / ideal, offset(0.05));
  }

  @Test
  void oneClearLookAmongMilkyOnesIsNoEnd() {
    assertThat(Diffusion.fitted(Rigs.fennel(), Policy.NONE, run("clear", "milky", "clear", "clear"))).isEmpty();
  }

  @Test
  void withoutTheOilThereIsNothingToCompareWith() {
    assertThat(Diffusion.fitted(Rigs.fennel("charge.oil.expected = -"), Policy.NONE, run("clear", "clear", "clear"))).isEmpty();
  }
}
