package stillwarden.order;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.Map;
import org.junit.jupiter.api.Test;

class WordingTest {
  private final Wording words = Wording.english();

  @Test
  void theSwitchIsNamedWhereTheRigSaysItIs() {
    assertThat(words.say("cut-power", "mantle", "", Map.of("power-off", "wall switch left of the hood")))
        .isEqualTo("Switch the heater off at the wall switch left of the hood, not the dial.");
    assertThat(words.say("cut-power", "", "", Map.of())).isEqualTo("Switch the heater off at the wall switch or plug, not the dial.");
  }

  @Test
  void aPartIsCalledByTheUsersNameOrByTheTradesNoun() {
    assertThat(words.say("lower-heat", "bath", "", Map.of())).isEqualTo("Wind the bath down, away from the flask.");
    assertThat(words.say("lower-heat", "", "", Map.of())).isEqualTo("Wind the mantle down, away from the flask.");
  }

  @Test
  void aSharpenedWordingIsTakenAndAnUnknownOneFallsBack() {
    assertThat(words.say("let-cool", "", "flask-dry-hot", Map.of())).isEqualTo("Leave the flask alone until it is hand-warm.");
    assertThat(words.say("let-cool", "", "no-such-hazard", Map.of())).isEqualTo(words.say("let-cool", "", "", Map.of()));
  }

  @Test
  void bansHaveTheirOwnWordsForDeedsAndForActions() {
    assertThat(words.not("open-joint")).isEqualTo("Do not open a joint to look.");
    assertThat(words.not("lower-heat")).isEqualTo("Do not wind the mantle down.");
  }

  @Test
  void whatABanWaitsForIsSaidAsWhatIsSeen() {
    assertThat(words.until("lower-heat")).isEqualTo("air shows between heater and flask");
    assertThat(words.until("vapour-gone")).isEqualTo("vapour gone");
  }

  @Test
  void anIdWithoutWordsIsPutIntoWordsItself() {
    assertThat(words.say("new-deed", "", "", Map.of())).isEqualTo("New deed.");
    assertThat(words.not("new-deed")).isEqualTo("Do not: new deed.");
    assertThat(words.question("some.new-thing")).isEqualTo("Look: some new thing?");
    assertThat(words.doneWhen("new-deed")).isEmpty();
  }

  @Test
  void theTimeToClearIsADuration() {
    assertThat(words.clearsWithin("cut-power")).contains(Duration.ofMinutes(2));
    assertThat(words.clearsWithin("log")).isEmpty();
  }
}
