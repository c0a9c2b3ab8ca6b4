package stillwarden.show;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Tree;
import stillwarden.order.Explanation;

class RulesViewTest {
  private static final HazardCard CARD = new HazardCard("flask-low-no-reserve", "flask", "WARNING", "minutes",
      "The flask runs low and nothing is left to feed.", "## What goes wrong\nIt runs dry.",
      List.of(new HazardCard.RuleCard("the flask runs low and nothing is left to feed", "Sign(about == \"flask-level\", value == \"low\")",
          List.of("common practice"))));

  @Test
  void theListHasOneLineAHazardUnderItsFamily() {
    assertThat(RulesView.text(List.of(CARD))).contains("\nflask\n", "flask-low-no-reserve ", "WARNING", "minutes");
    assertThat(RulesView.json(List.of(CARD))).contains("\"hazard\": \"flask-low-no-reserve\"", "\"signal\": \"WARNING\"");
  }

  @Test
  void theCardShowsPageConditionAndSource() {
    assertThat(RulesView.text(CARD)).contains("It runs dry.", "Sign(about == \"flask-level\"", "source: common practice");
    assertThat(RulesView.json(CARD)).contains("\"page\": \"## What goes wrong\\nIt runs dry.\"", "\"sources\": [");
  }

  @Test
  void aCitedIdIsResolvedToItsFullReferenceAndKeepsItsPlace() {
    Tree sources = new Tree(Map.of(
        "ISO-2533", Map.of("ref", "ISO 2533, Standard Atmosphere", "edition", "1975", "seen", "memory"),
        "COMMON", Map.of("ref", "common practice", "edition", "-", "seen", "seen")));
    assertThat(HazardCard.reference("ISO-2533 table 1", sources)).isEqualTo("ISO 2533, Standard Atmosphere (1975) table 1, from memory");
    assertThat(HazardCard.reference("COMMON", sources)).isEqualTo("common practice");
    assertThat(HazardCard.reference("ELSEWHERE p. 3", sources)).isEqualTo("ELSEWHERE p. 3");
  }

  @Test
  void withoutALineOfItsOwnAHazardHasTheFirstSentenceOfItsPage() {
    assertThat(HazardCard.firstSentence("## What goes wrong\nThe water is nearly\nused up. Soon it is dry.\n\n## What to do\nStop."))
        .isEqualTo("The water is nearly used up.");
    assertThat(HazardCard.firstSentence("")).isEmpty();
  }

  @Test
  void whyShowsEachConditionWithWhatIsKnown() {
    Explanation e = new Explanation("flask-low-no-reserve", List.of(new Explanation.RuleView("the flask runs low", "could", List.of(
        new Explanation.SignView("flask-level", "low", "low", "yes", "seen 10:52:00 by nk", ""),
        new Explanation.SignView("reservoir-level", "empty", "", "unknown", "", "12 mL")))));
    assertThat(RulesView.why("Bench 4", List.of(e)).replaceAll("\\s+", " ")).contains(
        "the flask runs low: could speak: something it needs is unknown",
        "yes: flask level wanted low, is low (seen 10:52:00 by nk)",
        "unknown: reservoir level wanted empty, is nothing known; margin 12 mL");
    assertThat(RulesView.whyJson("Bench 4", List.of(e))).contains("\"outcome\": \"could\"", "\"is\": null");
  }
}
