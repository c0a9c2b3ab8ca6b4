package stillwarden.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.time.Clock;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The plain call says what the same call through the command line library says; everything else is left to that. */
class QuickTest {
  private record Said(Exit exit, String out, String err) {}

  private interface Way {
    Exit run(Desk desk, String... args);
  }

  private static Said said(Way way, String... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    Desk desk = new Desk(new FakeEngine(), new ByteArrayInputStream(new byte[0]), new PrintStream(out, false, StandardCharsets.UTF_8),
        new PrintStream(err, true, StandardCharsets.UTF_8), Clock.systemUTC());
    Exit exit = way.run(desk, args);
    return new Said(exit, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }

  @ParameterizedTest
  @ValueSource(strings = {"inspect start", "inspect start not-yet", "inspect bad", "inspect start bad --format json", "inspect --format text start",
      "inspect start --policy no-such-file", "inspect --policy no-such-file --format json start"})
  void bothWaysSayTheSame(String line) {
    String[] args = line.split(" ");
    assertThat(Quick.of(args)).isPresent();
    assertThat(said((desk, a) -> Quick.of(a).orElseThrow().run(desk), args)).isEqualTo(said(Stillwarden::run, args));
  }

  @ParameterizedTest
  @ValueSource(strings = {"inspect", "inspect --help", "inspect start --at now", "inspect -x start", "inspect @file", "inspect start --format", "inspect start --format pdf",
      "inspect start --format=json", "inspect --policy a --policy b start", "inspect start --no-color", "advise start log", "inspect --format json", "inspect -- start"})
  void whatIsNotPlainIsLeftToTheLibrary(String line) {
    assertThat(Quick.of(line.split(" "))).isEmpty();
  }

  @Test
  void nothingAtAllIsNotPlain() {
    assertThat(Quick.of()).isEmpty();
    assertThat(Quick.of("inspect", "")).isEmpty();
  }
}
