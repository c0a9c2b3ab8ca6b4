package stillwarden;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import stillwarden.cli.InProcess;

/** What the README shows is what its commands print; {@code ...} alone may leave lines out. */
class ReadmeTest {
  private static final Pattern BLOCK = Pattern.compile("```(\\w*)\\n(.*?)```", Pattern.DOTALL);
  private static final Pattern CALL = Pattern.compile("bin/stillwarden ([^\\n]+)");

  @Test
  void everyShownAnswerIsPrinted() throws IOException {
    List<String> call = List.of();
    int shown = 0;
    Matcher block = BLOCK.matcher(Files.readString(Path.of("README.md"), StandardCharsets.UTF_8));
    while (block.find()) {
      Matcher command = CALL.matcher(block.group(2));
      if (block.group(1).equals("sh") && command.find()) {
        call = List.of(command.group(1).strip().split(" "));
      } else if (block.group(1).isEmpty()) {
        assertShown(block.group(2), InProcess.run(call.toArray(String[]::new)).out());
        shown++;
      }
    }
    assertThat(shown).isEqualTo(2);
  }

  /** Runs of lines between two {@code ...} must stand in the answer whole and in this order. */
  private static void assertShown(String shown, String printed) {
    int from = 0;
    for (String run : runs(shown)) {
      int at = printed.indexOf(run, from);
      assertThat(at).as("not printed, or not there:\n" + run).isNotNegative();
      from = at + run.length();
    }
  }

  private static List<String> runs(String shown) {
    List<String> out = new ArrayList<>();
    for (String run : shown.split("(?m)^\\.\\.\\.\\n")) {
      if (!run.isBlank()) {
        out.add(run);
      }
    }
    return out;
  }
}
