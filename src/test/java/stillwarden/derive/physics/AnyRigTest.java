package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/** Whatever is stated or left out, every number is a finite band or absent with a reason; seeded, so a failure repeats. */
class AnyRigTest {
  private static final String[] KEYS = {
    "place.elevation = 2500 m", "place.elevation = -", "place.room = 35 Cel", "place.room = -", "place.warm-water = none", "place.warm-water = circulator",
    "charge.material-mass = -", "charge.material-mass = 900 g", "charge.water = -", "charge.water = 5 mL", "charge.water = 950 mL", "charge.oil.expected = -",
    "charge.oil.expected = 300 g", "charge.oil.makeup.trans-anethole = -", "charge.oil.makeup.menthol = 60 %", "charge.oil.makeup.citronellal = 90 %",
    "charge.oil.makeup.vanillin = 70 %", "charge.oil.makeup.dichloromethane = 80 %", "charge.oil.makeup.phenol = 80 %", "charge.oil.makeup.moonshine = 50 %",
    "charge.oil.makeup.camphor = 99 %", "target.distillate = -", "target.distillate = 5 L", "mantle.power = -", "mantle.power = 5 W", "mantle.power = 20000 W",
    "mantle.kind = gas-burner", "regulator.setting = 80 %", "regulator.setting-means = phase", "flask.volume = -", "flask.volume = 50 mL", "flask.volume = 50 L",
    "flask.minimum-level = 900 mL", "reservoir.water = -", "condenser.jacket-length = -", "condenser.cooled-area = -", "condenser.coolant.supply = -",
    "condenser.coolant.supply = 1 Cel", "condenser.coolant.flow = -", "condenser.coolant.flow = 0 L/min", "condenser.coolant.plan = held-off",
    "take-off.side-arm-bore = -", "receiver.volume = -", "receiver.tip-below-liquid = yes"
  };
  private static final Entry[] LINES = {
    Rigs.did(0, "heat-on", "60 %"), Rigs.did(0, "heat-on", "yes"), Rigs.saw(12, "flask-temperature", "60 Cel"), Rigs.saw(20, "first-drop", "yes"),
    Rigs.saw(25, "flask-level", "low"), Rigs.saw(26, "flask-level", "dry"), Rigs.saw(27, "flask-level", "300 mL"), Rigs.saw(28, "receiver-level", "ok"),
    Rigs.saw(30, "receiver-level", "40 mL"), Rigs.saw(31, "receiver-level", "39 mL"), Rigs.saw(32, "receiver-level", "41 mL"), Rigs.did(33, "feed", "50 mL"),
    Rigs.did(33, "feed-slow", "20 mL"), Rigs.did(34, "swap-receiver", "41 mL"), Rigs.saw(35, "reservoir-level", "empty"), Rigs.did(36, "refill-reservoir", "yes"),
    Rigs.saw(37, "heater-power", "200 W"), Rigs.did(38, "cut-power", "yes"), Rigs.did(39, "set-heat", "30 %"), Rigs.saw(40, "flask-level", "not-sure")
  };

  @Test
  void givesFiniteBandsOrReasons() {
    Random random = new Random(20261201);
    for (int i = 0; i < 600; i++) {
      Rig rig = Rigs.fennel(some(random, KEYS, 8).toArray(String[]::new));
      List<Entry> log = new ArrayList<>(some(random, LINES, random.nextInt(10)));
      log.sort(Comparator.comparing(Entry::at));
      Numbers n = Physics.numbers(rig, Policy.NONE, log, log.isEmpty() ? null : Rigs.at(41));
      assertThat(n.list()).as("case %d", i).allSatisfy(e -> {
        assertThat(e.known() || !e.reason().isBlank()).isTrue();
        assertThat(e.known() && !e.unit().equals("Cel") && !e.name().equals("co-boiling-shift") ? e.low() : 0).as(e.name()).isGreaterThanOrEqualTo(0);
      });
      Plan.of(rig, Policy.NONE);
    }
  }

  private static <T> List<T> some(Random random, T[] from, int most) {
    List<T> out = new ArrayList<>();
    for (int i = 0; i < most; i++) {
      T one = from[random.nextInt(from.length)];
      if (!out.contains(one)) {
        out.add(one);
      }
    }
    return out;
  }
}
