package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Whatever bytes come in: an answer or {@link Unusable} with a place and words, never anything else. Seeds are fixed. */
class BrokenFilesTest {
  private static final Path DATA = Path.of("src/test/resources/describe");
  private static final String[] BITS = {"{", "}", "[", "]", ":", ",", "\"", "'", "\t", "\n", "---\n", "...\n", "&a ", "*a", "!!x ", "<<: ", "? ", "- ", "# ", "%", "|", ">",
      "\\", "\u0000", "\uFEFF", "\u2028", "\u0085", "\uD800", "1e400", ".nan", "~", "null", "true", "@", "`", "x: y\n"};

  @TempDir Path folder;

  private static byte[] broken(byte[] good, Random random) {
    byte[] b = good.clone();
    for (int n = 1 + random.nextInt(3); n > 0; n--) {
      int at = random.nextInt(b.length);
      int to = Math.min(b.length, at + random.nextInt(1 + random.nextInt(40)));
      byte[] bit = random.nextInt(8) == 0 ? new byte[] {(byte) random.nextInt(256)} : BITS[random.nextInt(BITS.length)].getBytes(StandardCharsets.UTF_8);
      byte[] out = new byte[b.length - (to - at) + bit.length];
      System.arraycopy(b, 0, out, 0, at);
      System.arraycopy(bit, 0, out, at, bit.length);
      System.arraycopy(b, to, out, at + bit.length, b.length - to);
      b = out;
    }
    return b;
  }

  private interface Read {
    void of(Path file) throws Unusable;
  }

  private void neverAnythingElse(String example, String name, int times, Read read) throws IOException {
    byte[] good = Files.readAllBytes(DATA.resolve(example));
    int refused = 0;
    for (int seed = 0; seed < times; seed++) {
      Path file = Files.write(folder.resolve(name), broken(good, new Random(seed)));
      try {
        read.of(file);
      } catch (Unusable u) {
        refused++;
        assertThat(u.defects()).as("seed " + seed).isNotEmpty().allSatisfy(d -> {
          assertThat(d.message()).isNotBlank().doesNotContain("Exception").doesNotContain("tools.jackson").doesNotContain("snakeyaml").doesNotContain("\n");
        });
      } catch (RuntimeException | Error e) {
        fail("seed " + seed + ": " + e, e);
      }
    }
    assertThat(refused).as("mutations that were refused").isGreaterThan(times / 4);
  }

  @Test
  void aBrokenYamlRigIsReadOrRefused() throws IOException {
    neverAnythingElse("bench4.rig.yaml", "t.rig.yaml", 4000, RigReader::read);
  }

  @Test
  void aBrokenJsonRigIsReadOrRefused() throws IOException {
    neverAnythingElse("bench4.rig.json", "t.rig.json", 4000, RigReader::read);
  }

  @Test
  void aBrokenPolicyIsReadOrRefused() throws IOException {
    neverAnythingElse("mill.policy.yaml", "t.policy.yaml", 2000, PolicyReader::read);
  }

  /** A log keeps what it can: no line may vanish without being an entry, a header, or listed. */
  @Test
  void aBrokenLogLosesNoLineInSilence() throws IOException {
    byte[] good = Files.readAllBytes(DATA.resolve("bench4.run.jsonl"));
    for (int seed = 0; seed < 4000; seed++) {
      byte[] b = broken(good, new Random(seed));
      try {
        RunLog log = LogReader.read(new ByteArrayInputStream(b), "run");
        long lines = new String(b, StandardCharsets.ISO_8859_1).replace("\u00EF\u00BB\u00BF", "").lines().count();
        long filled = countFilled(b);
        long told = log.entries().size() + log.leftOut().size() + (log.header().isEmpty() ? 0 : 1);
        assertThat(told).as("seed " + seed + " of " + lines).isGreaterThanOrEqualTo(filled - 1).isLessThanOrEqualTo(filled);
      } catch (Unusable u) {
        assertThat(u.defects()).isNotEmpty();
      }
    }
  }

  private static long countFilled(byte[] b) {
    long n = 0;
    int start = 0;
    for (int i = 0; i <= b.length; i++) {
      if (i == b.length || b[i] == '\n') {
        n += new String(b, start, i - start, StandardCharsets.UTF_8).replace("\uFEFF", "").isBlank() ? 0 : 1;
        start = i + 1;
      }
    }
    return n;
  }

  @Test
  void theJsonRigSaysWhatTheYamlRigSays() throws Exception {
    assertThat(RigReader.read(DATA.resolve("bench4.rig.json")).digest()).isEqualTo(RigReader.read(DATA.resolve("bench4.rig.yaml")).digest());
  }
}
