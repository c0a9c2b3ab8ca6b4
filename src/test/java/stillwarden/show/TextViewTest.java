package stillwarden.show;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import stillwarden.order.Advice;

class TextViewTest {
  static List<Advice> answers() {
    return Samples.all();
  }

  private static String[] lines(Advice advice) {
    return TextView.of(advice).split("\n");
  }

  @Test
  void theFirstLineIsTheVerdictAndTheFirstDeed() {
    assertThat(lines(Samples.stop())[0]).isEqualTo("STOP: Switch the heater off at the wall switch left of the hood, not the dial.");
    assertThat(lines(Samples.carryOn())[0]).isEqualTo("CARRY ON: nothing is due.");
  }

  @Test
  void inSetUpTheFirstLineNamesTheFirstThingThatWouldChangeTheVerdict() {
    Advice notYet = Samples.notYet();
    List<Advice.Action> actions = List.of(Samples.action(1, "do-not-start", "Do not switch the heat on yet.", "WARNING", null),
        notYet.actions().get(0));
    Advice both = new Advice(notYet.rig(), notYet.at(), notYet.stage(), notYet.verdict(), actions, 0, List.of(), List.of(), List.of(),
        List.of(), List.of(), List.of(), 39, 41, List.of(), notYet.defersTo());
    assertThat(lines(both)[0]).isEqualTo("NOT YET: Clip every joint that gravity does not hold.");
    assertThat(TextView.of(both)).contains("1 WARNING  Do not switch the heat on yet.");
  }

  @Test
  void temperaturesAreReadInDegreesWhateverTheSentenceSays() {
    assertThat(TextView.of(Samples.notYet())).contains("condenser.coolant.supply to 28 °C").doesNotContain(" Cel");
  }

  @Test
  void aStartSaysNoMoreThanWhatWasLookedAtAndWhoDecides() {
    String[] lines = lines(Samples.start());
    assertThat(lines[0]).isEqualTo("nothing found against starting: 41 of 41 looked at");
    assertThat(lines[lines.length - 1]).contains("decide");
  }

  @Test
  void theFirstViewHasThreeDeedsAndTheRestFollow() {
    String text = TextView.of(Samples.stop());
    String first = text.substring(text.indexOf("\nDo\n"), text.indexOf("\nThen\n"));
    assertThat(first).contains(" 1 WARNING ", " 2 WARNING ", " 3 WARNING ").doesNotContain(" 4 WARNING ");
    assertThat(text).contains("2 more after these");
  }

  @Test
  void theSectionsComeInTheOrderInWhichTheyAreNeeded() {
    assertThat(TextView.of(Samples.stop())).containsSubsequence(
        "\nDo\n", "\nThen\n", "\nDo not\n", "\nLook at\n", "\nWhy\n", "\nNumbers\n", "\nLeft out\n", "\nWaivers in force\n", "decide.");
  }

  @Test
  void timesAreClockTimesInTheOffsetOfTheLog() {
    assertThat(TextView.of(Samples.stop())).contains("as of 10:52:05", "not the dial. [now]", "[by 10:53:05]", "[by 10:54:05]");
  }

  @Test
  void aDeedThatDependsOnAnUnknownSaysSoAndALoggedOneAsksForALook() {
    assertThat(TextView.of(Samples.stop()))
        .contains("If boiling has stopped: Add water from the reservoir drop by drop.")
        .contains("Logged as done. Look whether it is: drops fall singly.");
  }

  @Test
  void aBanWithAnEndSaysWhatIsSeenThen() {
    assertThat(TextView.of(Samples.stop()).replaceAll("\\s+", " "))
        .contains("Do not open a joint to look. -")
        .contains("Do not add water from the reservoir. Not before: the wait is over");
  }

  @Test
  void everyReasonStandsOnceWithTheDeedsThatRestOnIt() {
    assertThat(TextView.of(Samples.stop()))
        .containsOnlyOnce("(1, 2, 3, 4) the flask runs low and nothing is left to feed [flask-low-no-reserve]")
        .contains("flask level low, seen 10:52:00 by nk", "source: common practice");
  }

  @Test
  void numbersAreInTheUnitsOfTheBench() {
    assertThat(TextView.of(Samples.stop())).contains("boiling point here: 98.5 °C (98.5 °C to 98.6 °C)",
        "time to minimum level: 12 min (9 min to 17 min)", "water available: 610 mL\n",
        "condenser capacity: no value: the jacket length is not stated");
  }

  @ParameterizedTest
  @MethodSource("answers")
  void noAnswerSaysSafeAndNoLineIsTooWide(Advice advice) {
    assertThat(TextView.of(advice)).doesNotContainPattern("(?i)\\bsafe\\b");
    assertThat(lines(advice)).allSatisfy(l -> assertThat(l.length()).isLessThanOrEqualTo(100));
  }
}
