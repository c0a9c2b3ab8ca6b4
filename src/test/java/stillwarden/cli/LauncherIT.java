package stillwarden.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.ArrayList;
import java.util.List;
import java.util.jar.JarFile;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The packaged folder as a user has it: copied elsewhere, called from anywhere. */
class LauncherIT {
  private static final Path BUILT = Path.of("target", "stillwarden").toAbsolutePath();

  @TempDir private Path temp;
  private Path installed;

  private record Ran(int status, String out, String err) {}

  @BeforeEach
  void install() throws IOException {
    installed = temp.resolve("a folder with spaces");
    try (Stream<Path> files = Files.walk(BUILT)) {
      for (Path from : files.filter(f -> !f.startsWith(BUILT.resolve("cache"))).toList()) {
        Files.copy(from, installed.resolve(BUILT.relativize(from).toString()), StandardCopyOption.COPY_ATTRIBUTES);
      }
    }
  }

  private ProcessBuilder command(Path launcher, String... args) {
    List<String> line = new ArrayList<>(List.of(launcher.toString()));
    line.addAll(List.of(args));
    ProcessBuilder builder = new ProcessBuilder(line).directory(temp.toFile());
    builder.environment().put("JAVA_HOME", System.getProperty("java.home"));
    return builder;
  }

  private Ran run(ProcessBuilder builder) throws IOException, InterruptedException {
    Path out = Files.createTempFile(temp, "out", "");
    Path err = Files.createTempFile(temp, "err", "");
    Process p = builder.redirectOutput(out.toFile()).redirectError(err.toFile()).start();
    return new Ran(p.waitFor(), Files.readString(out), Files.readString(err));
  }

  private Path launcher() {
    return installed.resolve("bin/stillwarden");
  }

  private List<Path> cache() throws IOException {
    Path cache = installed.resolve("cache");
    if (!Files.isDirectory(cache)) {
      return List.of();
    }
    try (Stream<Path> files = Files.list(cache)) {
      return files.toList();
    }
  }

  private Path rig() throws IOException {
    return Files.writeString(temp.resolve("my rig.rig.yaml"), "format: stillwarden/rig/1\nname: Bench\nmethod: in-flask\n");
  }

  @Test
  void itRunsThroughARelativeAndAnAbsoluteLinkFromAnotherDirectory() throws Exception {
    Path first = Files.createSymbolicLink(temp.resolve("one"), temp.relativize(launcher()));
    Path second = Files.createSymbolicLink(temp.resolve("two"), first.toAbsolutePath());
    Ran ran = run(command(second, "--version"));
    assertThat(ran).isEqualTo(new Ran(0, "stillwarden 0.1.0\n", ""));
  }

  @Test
  void itPassesStatusAndArgumentsWithSpaces() throws Exception {
    Ran ran = run(command(launcher(), "inspect", "no such file.yaml"));
    assertThat(ran.status()).isEqualTo(2);
    assertThat(ran.out()).isEmpty();
    assertThat(ran.err()).startsWith("no such file.yaml").doesNotContain("Exception", "WARN");
  }

  @Test
  void nothingIsLearntFromARunThatDidNotJudge() throws Exception {
    run(command(launcher(), "inspect", "--help"));
    run(command(launcher(), "inspect", "nothing"));
    assertThat(cache()).isEmpty();
  }

  @Test
  void twoFirstRunsAtOnceLeaveOneArchiveAndSayTheSame() throws Exception {
    String rig = rig().toString();
    Process[] both = {command(launcher(), "inspect", rig).start(), command(launcher(), "inspect", rig).start()};
    List<String> said = new ArrayList<>();
    for (Process p : both) {
      said.add(new String(p.getInputStream().readAllBytes(), StandardCharsets.UTF_8)
          + new String(p.getErrorStream().readAllBytes(), StandardCharsets.UTF_8) + p.waitFor());
    }
    Ran later = run(command(launcher(), "inspect", rig));
    assertThat(said).containsOnly(later.out() + later.err() + later.status());
    assertThat(later.status()).isEqualTo(1);
    assertThat(cache()).hasSize(1).allSatisfy(f -> assertThat(f.getFileName().toString()).matches("classes-[0-9.]+\\.jsa"));
  }

  @Test
  void aDamagedArchiveIsSilentlyDoneWithout() throws Exception {
    Path cache = Files.createDirectories(installed.resolve("cache"));
    Files.writeString(cache.resolve("classes-" + System.getProperty("java.version") + ".jsa"), "no archive");
    assertThat(run(command(launcher(), "--version"))).isEqualTo(new Ran(0, "stillwarden 0.1.0\n", ""));
    assertThat(run(command(launcher(), "inspect", "nothing")).err()).hasLineCount(1);
  }

  @Test
  void whereNoArchiveCanBeWrittenNothingIsSaidAboutIt() throws Exception {
    Files.writeString(installed.resolve("cache"), "a file where the folder would be");
    Ran ran = run(command(launcher(), "inspect", "nothing"));
    assertThat(ran.status()).isEqualTo(2);
    assertThat(ran.err()).startsWith("nothing").hasLineCount(1);
  }

  @Test
  void anOldJavaOrAWrongJavaHomeIsTwoInOneLine() throws Exception {
    Path home = Files.createDirectories(temp.resolve("old java/bin")).getParent();
    Path java = Files.writeString(home.resolve("bin/java"), "#!/bin/sh\nexit 1\n");
    Files.setPosixFilePermissions(java, PosixFilePermissions.fromString("rwxr-xr-x"));
    Files.writeString(home.resolve("release"), "IMPLEMENTOR=\"x\"\nJAVA_VERSION=\"11.0.2\"\n");
    assertThat(withJavaHome(home)).isEqualTo(new Ran(2, "", "stillwarden: `" + java + "` is Java 11.0.2; want Java 17 or newer\n"));
    Files.writeString(home.resolve("release"), "JAVA_VERSION=\"1.8.0_292\"\n");
    assertThat(withJavaHome(home).err()).contains("is Java 1.8.0_292; want Java 17 or newer");
    Ran missing = withJavaHome(temp.resolve("nowhere"));
    assertThat(missing.status()).isEqualTo(2);
    assertThat(missing.err()).contains("there is no bin/java in it").hasLineCount(1);
  }

  private Ran withJavaHome(Path home) throws IOException, InterruptedException {
    ProcessBuilder builder = command(launcher(), "--version");
    builder.environment().put("JAVA_HOME", home.toString());
    return run(builder);
  }

  @Test
  void noRuleCompilerIsOnTheRunTimeClassPath() throws IOException {
    try (Stream<Path> jars = Files.list(BUILT.resolve("lib"))) {
      List<String> names = jars.map(j -> j.getFileName().toString()).toList();
      assertThat(names).hasSizeBetween(20, 45).contains("stillwarden.jar");
      assertThat(names).noneMatch(n -> n.matches("(?i).*(ecj|antlr|javaparser|mvel|xstream|drools-engine|junit|archunit).*"));
    }
  }

  @Test
  void theJarNamesEveryOtherJarAndHoldsCompiledRulesOnly() throws IOException {
    try (JarFile jar = new JarFile(BUILT.resolve("lib/stillwarden.jar").toFile())) {
      assertThat(jar.getManifest().getMainAttributes().getValue("Class-Path").split(" "))
          .allSatisfy(j -> assertThat(BUILT.resolve("lib").resolve(j)).exists());
      assertThat(jar.stream().map(e -> e.getName()).filter(n -> n.endsWith(".drl"))).isEmpty();
    }
  }
}
