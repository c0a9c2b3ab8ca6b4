package stillwarden.derive;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.BiConsumer;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/**
 * The plant list audits itself. Every test gathers what is wrong over all plants and reports it together.
 *
 * <p>Shares are mass fractions; {@code solids-volume} is mL a gram of material as weighed, {@code water-uptake}
 * kg a kg.
 */
class PlantListTest {
  private static final Tree PLANTS = Knowledge.section("plants");
  private static final Tree SUBSTANCES = Knowledge.section("substances");

  private static final Set<String> KEYS = Set.of("name", "also", "identified", "oil-share", "makeup", "makeup-source",
      "foams", "foams-source", "water-uptake", "solids-volume", "boils-smoothly", "oil-density", "burns", "toxic",
      "gives-toxic-gas", "reacts-with-water", "solidifies", "cautions", "cautions-source");
  private static final Set<String> MAY = Set.of("excluded", "unknown-volatility");
  private static final Set<String> YES_NO = Set.of("yes", "no");
  private static final Map<String, Set<String>> WORDS = Map.of("identified", YES_NO, "boils-smoothly", YES_NO,
      "burns", YES_NO, "toxic", YES_NO, "gives-toxic-gas", YES_NO, "reacts-with-water", YES_NO,
      "foams", Set.of("no", "some", "strongly"), "oil-density", Set.of("light", "heavy", "near", "unknown"));

  /** Our proposal: a tenth of a poison makes the oil one; of camphor three tenths (its limit in air is 2 ppm). */
  private static final Map<String, Double> POISONS =
      Map.of("thujone", 0.1, "pulegone", 0.1, "safrole", 0.1, "camphor", 0.3);

  @Test
  void theListNamesWhatLaboratoriesDistilAndWhatTheyMustNot() {
    assertThat(PLANTS.fields()).hasSizeGreaterThanOrEqualTo(55)
        .containsKeys("fennel-seed", "aniseed", "caraway-seed", "clove-bud", "orange-peel", "lavender-flower", "hops");
    assertThat(PLANTS.fields().entrySet().stream().filter(e -> e.getValue().has("excluded")).map(Map.Entry::getKey))
        .contains("bitter-almond", "apricot-kernel", "peach-kernel", "cherry-laurel-leaf", "mustard-seed", "wormseed");
  }

  @Test
  void everyKeyStandsAndNoOther() {
    assertThat(problems((plant, wrong) -> {
      Set<String> missing = new HashSet<>(KEYS);
      missing.removeAll(plant.fields().keySet());
      Set<String> strange = new HashSet<>(plant.fields().keySet());
      strange.removeAll(KEYS);
      strange.removeAll(MAY);
      missing.forEach(k -> wrong.add("lacks " + k));
      strange.forEach(k -> wrong.add("has an unknown key " + k));
    })).isEmpty();
  }

  @Test
  void everyWordIsOneOfItsChoices() {
    assertThat(problems((plant, wrong) -> WORDS.forEach((key, choices) -> {
      if (!choices.contains(plant.text(key).orElse(""))) {
        wrong.add(key + " is `" + plant.text(key).orElse("") + "`");
      }
    }))).isEmpty();
  }

  @Test
  void bandsAreOrderedAndInTheirRange() {
    assertThat(problems((plant, wrong) -> {
      band(plant.get("oil-share"), 0.25, "oil-share", wrong);
      band(plant.get("water-uptake"), 10, "water-uptake", wrong);
      band(plant.get("solids-volume"), 3, "solids-volume", wrong);
      plant.get("makeup").fields().forEach((name, share) -> band(share, 1, name, wrong));
      plant.get("makeup").fields().forEach((name, share) -> nominal(share, name, wrong));
    })).isEmpty();
  }

  @Test
  void anOilNeverHoldsMoreThanItself() {
    assertThat(problems((plant, wrong) -> {
      if (sum(plant, "nominal") > 1 + 1e-9 || sum(plant, "low") > 1 + 1e-9) {
        wrong.add("nominal shares come to " + sum(plant, "nominal") + ", low ones to " + sum(plant, "low"));
      }
    })).isEmpty();
  }

  @Test
  void everyNumberAndWordOfCautionHasASource() {
    assertThat(problems((plant, wrong) -> {
      for (String key : List.of("oil-share", "water-uptake", "solids-volume")) {
        if (plant.get(key).text("source").orElse("").isBlank()) {
          wrong.add(key + " has no source");
        }
      }
      for (String key : List.of("makeup-source", "foams-source", "cautions-source")) {
        if (plant.text(key).orElse("").isBlank()) {
          wrong.add(key + " is empty");
        }
      }
    })).isEmpty();
  }

  @Test
  void anExcludedPlantSaysWhyAndIsPoisonousAndOnlyItMayLackAnOil() {
    assertThat(problems((plant, wrong) -> {
      boolean excluded = plant.has("excluded");
      if (excluded && (plant.text("excluded").orElse("").length() < 20 || !says(plant, "toxic", "yes"))) {
        wrong.add("is excluded without a reason, or without being poisonous");
      }
      if (!excluded && (plant.get("makeup").fields().isEmpty() || says(plant, "oil-density", "unknown"))) {
        wrong.add("has no known oil and is not excluded");
      }
    })).isEmpty();
  }

  @Test
  void whatGivesAToxicGasIsToxicAndExcluded() {
    assertThat(problems((plant, wrong) -> {
      if (says(plant, "gives-toxic-gas", "yes") && (!says(plant, "toxic", "yes") || !plant.has("excluded"))) {
        wrong.add("gives a toxic gas but is not both toxic and excluded");
      }
    })).isEmpty();
  }

  @Test
  void anOilRichInAKnownPoisonIsCalledToxic() {
    assertThat(problems((plant, wrong) -> POISONS.forEach((poison, share) -> {
      double high = plant.get("makeup").get(poison).number("high").orElse(0);
      if (high >= share && !says(plant, "toxic", "yes")) {
        wrong.add("holds up to " + high + " " + poison + " and is not called toxic");
      }
    }))).isEmpty();
  }

  @Test
  void everyPartOfAnOilIsAKnownSubstanceOrSaidToBeUnknown() {
    Map<String, Tree> known = substances();
    assertThat(problems((plant, wrong) -> {
      List<String> unknown = plant.words("unknown-volatility");
      Set<String> parts = plant.get("makeup").fields().keySet();
      unknown.stream().filter(u -> !parts.contains(u)).forEach(u -> wrong.add("lists " + u + ", which is no part"));
      if (!known.isEmpty()) {
        parts.stream().filter(p -> known.containsKey(p) == unknown.contains(p))
            .forEach(p -> wrong.add(p + (unknown.contains(p) ? " has data after all" : " is not known")));
      }
    })).isEmpty();
  }

  /** Only where three fifths of the oil have a known density: the mean of those parts against water's 1000 kg/m3. */
  @Test
  void theOilFloatsOrSinksAsItsPartsDo() {
    Map<String, Tree> known = substances();
    assertThat(problems((plant, wrong) -> {
      OptionalDouble mean = density(plant, known);
      String said = plant.text("oil-density").orElse("");
      boolean fits = mean.isEmpty() || switch (said) {
        case "light" -> mean.getAsDouble() < 960;
        case "heavy" -> mean.getAsDouble() > 1000;
        default -> mean.getAsDouble() > 930 && mean.getAsDouble() < 1030;
      };
      if (!fits) {
        wrong.add("is said to be " + said + ", its parts mean " + Math.round(mean.getAsDouble()) + " kg/m3");
      }
    })).isEmpty();
  }

  @Test
  void oneNameMeansOnePlant() {
    Map<String, String> owner = new HashMap<>();
    List<String> twice = new ArrayList<>();
    PLANTS.fields().forEach((id, plant) -> {
      Set<String> names = new HashSet<>(plant.words("also"));
      names.add(plant.text("name").orElse(""));
      names.add(id.replace('-', ' '));
      names.stream().map(n -> n.toLowerCase(Locale.ROOT)).distinct().forEach(n -> {
        String other = owner.put(n, id);
        if (other != null) {
          twice.add(n + " is " + other + " and " + id);
        }
      });
    });
    assertThat(twice).isEmpty();
  }

  @Test
  void cautionsAreShortSentencesThatPromiseNothing() {
    assertThat(problems((plant, wrong) -> {
      List<String> cautions = plant.words("cautions");
      if (cautions.isEmpty()) {
        wrong.add("has no caution");
      }
      cautions.stream().filter(c -> c.length() > 130 || !c.endsWith(".") || c.toLowerCase(Locale.ROOT).contains("safe"))
          .forEach(c -> wrong.add("says: " + c));
    })).isEmpty();
  }

  @Test
  void everyFileIsBundledAndSaysWhereTheOilCatchesFire() throws IOException {
    try (var files = Files.list(Path.of("rules", "plants"))) {
      for (Path file : files.sorted().toList()) {
        assertThat(PLANTS.fields()).containsKey(file.getFileName().toString().replace(".yaml", ""));
        assertThat(Files.readString(file)).as(file.toString()).contains("# flash point: ");
      }
    }
  }

  private static List<String> problems(BiConsumer<Tree, List<String>> check) {
    List<String> all = new ArrayList<>();
    PLANTS.fields().forEach((id, plant) -> {
      List<String> wrong = new ArrayList<>();
      check.accept(plant, wrong);
      wrong.forEach(w -> all.add(id + " " + w));
    });
    return all;
  }

  /** A missing end counts as wrong: every comparison with it is false. */
  private static void band(Tree band, double most, String name, List<String> wrong) {
    double low = band.number("low").orElse(Double.NaN);
    double high = band.number("high").orElse(Double.NaN);
    if (!(0 <= low && low < high && high <= most)) {
      wrong.add(name + " runs from " + low + " to " + high);
    }
  }

  private static void nominal(Tree share, String name, List<String> wrong) {
    double nominal = share.number("nominal").orElse(Double.NaN);
    if (!(share.number("low").orElse(Double.NaN) <= nominal && nominal <= share.number("high").orElse(Double.NaN))) {
      wrong.add(name + " has its nominal share outside its band");
    }
  }

  private static double sum(Tree plant, String end) {
    return plant.get("makeup").fields().values().stream().mapToDouble(s -> s.number(end).orElse(0)).sum();
  }

  private static boolean says(Tree plant, String key, String word) {
    return plant.text(key).filter(word::equals).isPresent();
  }

  /** Every name a substance goes by. */
  private static Map<String, Tree> substances() {
    Map<String, Tree> out = new HashMap<>();
    SUBSTANCES.fields().forEach((id, substance) -> {
      out.put(id, substance);
      substance.text("name").ifPresent(n -> out.put(n, substance));
      substance.words("also").forEach(n -> out.put(n, substance));
    });
    return out;
  }

  private static OptionalDouble density(Tree plant, Map<String, Tree> known) {
    double mass = 0;
    double volume = 0;
    for (Map.Entry<String, Tree> part : plant.get("makeup").fields().entrySet()) {
      OptionalDouble d = known.getOrDefault(part.getKey(), Tree.EMPTY).get("density").number("value");
      double share = part.getValue().number("nominal").orElse(0);
      mass += d.isPresent() ? share : 0;
      volume += d.isPresent() ? share / d.getAsDouble() : 0;
    }
    return mass >= 0.6 ? OptionalDouble.of(mass / volume) : OptionalDouble.empty();
  }
}
