package stillwarden.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;

/** Situations that look alarming and are not: a warden that cries wolf is switched off. */
class NominalTest {
  private static final String UP = "place.elevation";

  @TempDir
  Path folder;

  record Nominal(String title, Map<String, Object> rig, Map<String, Object> policy, List<String> verdicts, String... log) {}

  private static final List<String> CALM = List.of("carry-on");

  private static List<Nominal> situations() {
    return List.of(
        new Nominal("head below 100 degC because the oil helps it boil", Map.of(), Map.of(), CALM, "60 saw head-temperature 98.1 Cel"),
        new Nominal("head at 95.1 degC at 85 kPa", Map.of(UP, "absent", "place.barometer", "85 kPa", "place.barometer-is", "station"), Map.of(), CALM, "60 saw head-temperature 95.1 Cel"),
        new Nominal("milky distillate with droplets", Map.of(), Map.of(), CALM, "60 saw distillate-look milky"),
        new Nominal("warming up, nothing over yet", Map.of(), Map.of(), CALM, "14 saw boiling none", "14 saw drip none", "14 saw head-temperature 25 Cel"),
        new Nominal("a low foam collar that stands still", Map.of(), Map.of(), CALM, "60 saw foam low-and-steady"),
        new Nominal("tempered coolant as declared", Map.of(), Map.of(), CALM, "60 saw coolant-running yes", "60 saw vapour-past-condenser none", "60 saw coolant-supply-temperature 28 Cel"),
        new Nominal("coolant held off as declared", Map.of("condenser.coolant.plan", "held-off"), Map.of("permits.held-off-coolant", "yes"), CALM,
            "20 saw coolant-running no", "60 saw coolant-running no", "60 saw vapour-past-condenser none"),
        new Nominal("a small feed: the head dips 3 K and comes back", Map.of(), Map.of(), CALM,
            "57 saw reservoir-level 200 mL", "57.5 saw head-temperature 98.6 Cel", "58 did feed 10 mL", "58 did close-feed", "58.5 saw head-temperature 95.6 Cel", "58.6 saw path open", "58.7 saw tip clear",
            "59.5 saw head-temperature 98.5 Cel", "60 saw reservoir-level 190 mL"),
        new Nominal("coolant leaves 14 K warmer than it enters", Map.of(), Map.of(), CALM, "60 saw coolant-supply-temperature 28 Cel", "60 saw coolant-outlet-temperature 42 Cel"),
        new Nominal("planned cooling: head falls, drip stops, tip clear", Map.of(), Map.of(), List.of("wind-down", "carry-on"),
            "60 did end-run", "60 saw path open", "60 saw tip clear", "60 did close-feed", "60 did cut-power", "60.2 saw heater-power 0 W", "60.5 did lower-heat", "62 saw boiling none", "62 saw drip none",
            "64 saw head-temperature 80 Cel", "64 saw coolant-running yes", "64 saw vapour-past-condenser none"),
        new Nominal("distillate clear and target reached, everything in order", Map.of("target.distillate", "115 mL"), Map.of(), List.of("wind-down"), "60 saw distillate-look clear"));
  }

  @TestFactory
  Stream<DynamicTest> nothingAboveANotice() {
    return situations().stream().map(n -> DynamicTest.dynamicTest(n.title(), () -> {
      Rig rig = Bench.rig(n.rig(), folder);
      Policy policy = Bench.policy(n.policy(), folder);
      RunLog log = Bench.log(List.of(n.log()), List.of()).orElseThrow();
      assertThat(log.leftOut()).isEmpty();
      Advice a = Advisor.advise(rig, policy, log, Optional.empty());
      assertThat(a.verdict()).as(() -> Told.whole(a)).isIn(n.verdicts());
      // the leisurely order of a planned end is guidance, told as a caution; a hazard may not speak
      List<String> loud = a.actions().stream().filter(x -> !x.signal().equals("NOTICE")).filter(x -> !a.verdict().equals("wind-down") || x.because().stream().anyMatch(b -> !Set.of("shutdown-order", "end-of-run", "end-of-run-other").contains(b.hazard())))
          .map(Advice.Action::act).toList();
      assertThat(loud).as(() -> Told.whole(a)).isEmpty();
    }));
  }

  /** Ninety minutes with all looks every two minutes: no interruption at any step until the target is there. */
  @TestFactory
  Stream<DynamicTest> ninetyMinutes() {
    Map<String, Map<String, Object>> places = new LinkedHashMap<>();
    places.put("at sea level", Map.of(UP, "0 m"));
    places.put("at 250 m", Map.of());
    places.put("at 2200 m", Map.of(UP, "2200 m"));
    return places.entrySet().stream().map(p -> DynamicTest.dynamicTest(p.getKey(), () -> run(p.getKey(), p.getValue())));
  }

  private void run(String name, Map<String, Object> changes) throws Exception {
    double head = name.contains("2200") ? 91.6 : 98.6;
    Map<String, Object> rigChanges = new LinkedHashMap<>(changes);
    rigChanges.put("target.distillate", "200 mL");
    rigChanges.put("receiver.volume", "500 mL");
    Rig rig = Bench.rig(rigChanges, folder);
    RunLog log = calm(head);
    List<String> interruptions = new ArrayList<>();
    for (int minute : IntStream.iterate(2, m -> m + 2).limit(45).toArray()) {
      OffsetDateTime at = Bench.HEAT_ON.plusSeconds(60L * minute).atOffset(ZoneOffset.UTC);
      Advice a = Advisor.advise(rig, Policy.NONE, log, Optional.of(at));
      boolean reached = 3.0 * Math.max(0, minute - 20) >= 200;
      if (!a.verdict().equals(reached ? "wind-down" : "carry-on")) {
        interruptions.add("minute " + minute + ": " + Told.whole(a));
      }
    }
    System.out.println("nominal 90 min " + name + ": 45 steps, " + interruptions.size() + " interruptions");
    assertThat(interruptions).isEmpty();
  }

  private static RunLog calm(double head) throws Exception {
    List<String> own = new ArrayList<>();
    for (int minute = 20; minute <= 90; minute += 2) {
      own.add(minute + " saw head-temperature " + head + " Cel");
    }
    return Bench.log(own, List.of()).orElseThrow();
  }
}
