package stillwarden;

import static com.tngtech.archunit.core.domain.JavaCall.Predicates.target;
import static com.tngtech.archunit.core.domain.properties.HasName.Predicates.nameMatching;
import static com.tngtech.archunit.core.domain.properties.HasOwner.Predicates.With.owner;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The order of the packages, and what each may touch. */
class ArchitectureTest {
  /** From the left to the right; a package may use only those on its left. */
  private static final List<String> CHAIN = List.of("describe", "derive", "judge", "order", "show", "watch", "cli");

  /** What the rule compiler makes of the rule text; the judge alone loads it. */
  private static final List<String> COMPILED_RULES = List.of("inspect", "live");

  private static final JavaClasses OURS =
      new ClassFileImporter().withImportOption(new ImportOption.DoNotIncludeTests()).importPackages("stillwarden");

  @Test
  void importsGoOnlyToTheLeft() {
    assertThat(OURS.size()).isGreaterThan(40);
    for (int i = 0; i < CHAIN.size(); i++) {
      String[] right = CHAIN.subList(i + 1, CHAIN.size()).stream().map(p -> "stillwarden." + p + "..").toArray(String[]::new);
      if (right.length > 0) {
        noClasses().that().resideInAPackage("stillwarden." + CHAIN.get(i) + "..")
            .should().dependOnClassesThat().resideInAnyPackage(right).check(OURS);
      }
    }
  }

  @Test
  void everyClassStandsInAPackageOfTheChain() {
    String[] known = Stream.concat(CHAIN.stream(), COMPILED_RULES.stream()).map(p -> "stillwarden." + p + "..").toArray(String[]::new);
    classes().that().resideInAPackage("stillwarden..").should().resideInAnyPackage(known).check(OURS);
  }

  @Test
  void onlyTheJudgeSeesTheRuleEngine() {
    noClasses().that().resideInAnyPackage("stillwarden.describe..", "stillwarden.derive..", "stillwarden.order..", "stillwarden.show..",
            "stillwarden.watch..", "stillwarden.cli..")
        .should().dependOnClassesThat().resideInAnyPackage("org.drools..", "org.kie..").check(OURS);
  }

  /** A live run needs describe, derive, judge and order; how an answer looks is nothing to it. */
  @Test
  void aLiveRunShowsNothing() {
    noClasses().that().resideInAPackage("stillwarden.watch..").should().dependOnClassesThat().resideInAPackage("stillwarden.show..").check(OURS);
  }

  @Test
  void onlyMainEndsTheProcess() {
    noClasses().that().doNotHaveFullyQualifiedName("stillwarden.cli.Main")
        .should().callMethodWhere(target(owner(nameMatching("java\\.lang\\.(System|Runtime)"))).and(target(nameMatching("exit|halt"))))
        .check(OURS);
  }

  @Test
  void onlyTheCommandLineReadsAClock() {
    noClasses().that().resideOutsideOfPackage("stillwarden.cli..")
        .should().callMethodWhere(target(owner(nameMatching("java\\.time\\..*"))).and(target(nameMatching("now|system.*|instant|millis"))))
        .check(OURS);
    noClasses().that().resideOutsideOfPackage("stillwarden.cli..")
        .should().callMethodWhere(target(owner(nameMatching("java\\.lang\\.System"))).and(target(nameMatching("currentTimeMillis|nanoTime"))))
        .check(OURS);
    noClasses().that().resideOutsideOfPackage("stillwarden.cli..")
        .should().dependOnClassesThat().haveFullyQualifiedName("java.util.Date").check(OURS);
  }

  @Test
  void viewsKnowNothingOfTheCommandLineLibrary() {
    noClasses().that().resideOutsideOfPackage("stillwarden.cli..").should().dependOnClassesThat().resideInAPackage("picocli..").check(OURS);
  }
}
