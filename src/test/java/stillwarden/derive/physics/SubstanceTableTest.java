package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/** The data audit themselves; every defect is reported at once. */
class SubstanceTableTest {
  private static final Set<String> NUMBERS = Set.of("molar-mass", "density", "boiling-point", "melting-point", "heat-of-fusion", "water-solubility",
      "water-in-it", "flash-point", "autoignition", "flammable-limits", "exposure-limit");

  @Test
  void everyNumberHasASourceThatStandsInTheList() {
    Set<String> sources = Knowledge.section("sources").fields().keySet();
    List<String> defects = new ArrayList<>();
    Knowledge.section("substances").fields().forEach((id, t) -> {
      t.fields().forEach((key, v) -> {
        if (NUMBERS.contains(key) && !v.has("unknown") && !sources.contains(v.text("source").orElse(""))) {
          defects.add(id + "." + key);
        }
      });
      t.get("vapour-pressure").items().forEach(v -> {
        if (!sources.contains(v.text("source").orElse(""))) {
          defects.add(id + ".vapour-pressure");
        }
      });
    });
    assertThat(defects).isEmpty();
  }

  @Test
  void everySubstanceReadsAndHasPlausibleNumbers() {
    List<String> defects = new ArrayList<>();
    Substances.all().values().forEach(s -> {
      if (s.molarMass() < 0.05 || s.molarMass() > 0.3 || s.density().filter(d -> d < 600 || d > 1900).isPresent()) {
        defects.add(s.id() + ": molar mass or density");
      }
      if (s.meltingPoint().isPresent() != s.heatOfFusion().isPresent()) {
        defects.add(s.id() + ": melting point without heat of fusion");
      }
      s.equations().stream().filter(v -> !(v.minK() < v.maxK()) || v.formula(v.minK()) >= v.formula(v.maxK())).forEach(v -> defects.add(s.id() + ": equation of " + v.source()));
    });
    assertThat(defects).isEmpty();
  }

  @Test
  void everyEstimateSaysSo() {
    Knowledge.section("substances").fields().forEach((id, t) -> {
      Tree h = t.get("heat-of-fusion");
      if (h.text("source").filter("WALDEN"::equals).isPresent()) {
        assertThat(h.text("note").orElse("")).as(id).contains("estimate");
        assertThat(h.number("low").orElseThrow()).isLessThan(h.number("high").orElseThrow());
      }
    });
  }

  @Test
  void namesAreUnambiguous() {
    Map<String, List<String>> by = new java.util.TreeMap<>();
    Knowledge.section("substances").fields().forEach((id, t) -> {
      Set<String> own = new java.util.TreeSet<>();
      own.add(id.replaceAll("[^a-z0-9]", ""));
      own.add(t.text("name").orElseThrow().toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z0-9]", ""));
      t.words("also").forEach(a -> own.add(a.toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z0-9]", "")));
      own.forEach(n -> by.computeIfAbsent(n, k -> new ArrayList<>()).add(id));
    });
    assertThat(by.values()).allSatisfy(ids -> assertThat(ids).hasSize(1));
  }

  @Test
  void knownDefectsOfThePublishedTablesAreNotShipped() {
    for (String liquid : List.of("terpinen-4-ol", "thujone", "estragole", "carvone")) { // melting points of other substances in the tables
      assertThat(Substances.find(liquid).orElseThrow().meltingPoint()).as(liquid).isEmpty();
    }
    assertThat(Substances.find("beta-caryophyllene").orElseThrow().data().has("boiling-point")).isFalse(); // a value at reduced pressure
    assertThat(Substances.find("methyl salicylate").orElseThrow().waterSolubility().orElseThrow()).isLessThan(1.0); // not 7.4 g/L
    assertThat(Substances.find("naphthalene").orElseThrow().waterSolubility().orElseThrow()).isBetween(0.025, 0.035); // not 0.0063 g/L
    assertThat(Substances.find("1-octanol").orElseThrow().data().get("flammable-limits").number("low").orElseThrow()).isPositive();
  }

  @Test
  void everyLimitHasAUnitASourceAndAMeaningAndIsUsed() throws IOException {
    String code = code();
    Set<String> sources = Knowledge.section("sources").fields().keySet();
    List<String> defects = new ArrayList<>();
    List<String> own = Files.readAllLines(Path.of("rules/limits/physics.yaml")).stream().filter(l -> l.matches("[a-z][a-z0-9-]*:.*")).map(l -> l.substring(0, l.indexOf(':'))).toList();
    assertThat(own).hasSizeGreaterThan(40);
    for (String key : own) {
      Tree t = Knowledge.section("limits").get(key);
      boolean table = !t.items().isEmpty() && t.text().isEmpty();
      String source = t.text("source").orElse("").split("[^A-Z0-9-]")[0];
      if (!table && (!t.has("means") || !sources.contains(source) || t.text("unit").isEmpty())) {
        defects.add(key + ": unit, meaning or source");
      }
      if (!code.contains("\"" + key + "\"")) {
        defects.add(key + ": not used");
      }
    }
    assertThat(defects).isEmpty();
  }

  private static String code() throws IOException {
    try (Stream<Path> files = Files.walk(Path.of("src/main/java/stillwarden/derive/physics"))) {
      StringBuilder all = new StringBuilder();
      for (Path f : files.filter(p -> p.toString().endsWith(".java")).toList()) {
        all.append(Files.readString(f));
      }
      return all.toString();
    }
  }
}
