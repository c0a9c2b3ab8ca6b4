package stillwarden.show;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import stillwarden.derive.Estimate;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

class PlanViewTest {
  private static PlanSheet plan() {
    return new PlanSheet("Bench 4, fennel", "2026-04-14T08:50:00Z", numbers(),
        List.of(new PlanSheet.Curve("flask-level", "mL", List.of(0.0, 60.0), List.of(1 / 3.0, 2.0), List.of(3.0, 4.0), List.of(5.0, 6.0))),
        List.of("refill the reservoir 35 min after the first drop"), List.of("heater efficiency 60 to 85 %, a default"), List.of(),
        "The site decides.");
  }

  private static List<Estimate> numbers() {
    List<Estimate> all = new ArrayList<>(Samples.numbers());
    all.add(Estimate.of("coolant-strategy", 0, 0, 0, "", "tempered", "ideal solubility",
        List.of("the oil begins to freeze at 16 °C", "the tap gives 12 °C")));
    all.add(Estimate.absent("foam-class", "", "the plant is not on the list", List.of()));
    return all;
  }

  @Test
  void theJsonHasItsFormatTheNumbersTheWordsAndTheCurves() {
    JsonNode json = new JsonMapper().readTree(PlanView.json(plan()));
    assertThat(json.get("format").stringValue()).isEqualTo("stillwarden/plan/1");
    assertThat(json.get("numbers").get(0).get("value").stringValue()).isEqualTo("98.5432 Cel");
    assertThat(json.get("numbers").get(4).get("value").stringValue()).isEqualTo("tempered");
    assertThat(json.get("numbers").get(4).get("method").stringValue()).contains("the tap gives 12 °C");
    assertThat(json.get("numbers").get(4).has("low")).isFalse();
    assertThat(json.get("numbers").get(5).get("value").isNull()).isTrue();
    JsonNode curve = json.get("curves").get(0);
    assertThat(List.copyOf(curve.propertyNames())).containsExactly("name", "unit", "t", "low", "value", "high");
    assertThat(curve.get("low").get(0).decimalValue()).isEqualByComparingTo("0.333333");
  }

  @Test
  void theTextGroupsTheNumbersAndNamesEveryAssumption() {
    String text = PlanView.text(plan());
    assertThat(text).containsSubsequence("Plan for Bench 4, fennel, as of 08:50:00", "boiling point here: 98.5 °C", "\nWater\n",
        "coolant strategy: tempered, because the oil begins to freeze at 16 °C; the tap gives 12 °C", "\nOther\n", "foam class: no value",
        "refill the reservoir 35 min after the first drop", "heater efficiency 60 to 85 %, a default",
        "pressure from the elevation (boiling point here)", "The site decides.");
  }

  @Test
  void aCurveOfUnequalListsIsRefused() {
    assertThatThrownBy(() -> new PlanSheet.Curve("x", "mL", List.of(0.0), List.of(), List.of(0.0), List.of(0.0)))
        .hasMessageContaining("one length");
  }
}
