package stillwarden.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class PlainTest {
  @Test
  void messagesAreLowerCaseWithTheUsersWordInBackticks() {
    assertThat(Plain.words("Unknown option: '--foo'")).isEqualTo("unknown option: `--foo`");
  }

  @Test
  void theNearestWordHasTheFewestLettersToChange() {
    assertThat(Plain.nearest("flask-dry", List.of("hood-off", "flask-dry-hot", "flask-low"))).contains("flask-low");
    assertThat(Plain.nearest("tip-imersed", List.of("tip-immersed", "tip-clear"))).contains("tip-immersed");
    assertThat(Plain.nearest("x", List.of())).isEmpty();
  }
}
