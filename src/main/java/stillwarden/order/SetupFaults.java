package stillwarden.order;

import java.util.ArrayList;
import java.util.List;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.derive.Standing;
import stillwarden.judge.Finding;
import stillwarden.judge.Judgement;

/** Set-up hazards that still stand while energy is in become one sign, judged in a second pass. */
final class SetupFaults {
  private SetupFaults() {}

  static List<Sign> with(Situation s, Judgement first) {
    List<Sign> out = new ArrayList<>(s.signs());
    if (s.time().live()) {
      List<Finding> faults = first.findings().stream().filter(f -> f.isActive() && Verdicts.gate(f) && Hazards.signal(f) != Signal.NOTICE).toList();
      out.add(sign("grave", faults.stream().filter(f -> Hazards.signal(f) != Signal.CAUTION).toList()));
      out.add(sign("mild", faults.stream().filter(f -> Hazards.signal(f) == Signal.CAUTION).toList()));
    }
    return out.stream().filter(x -> !x.evidence().isEmpty()).toList();
  }

  private static Sign sign(String value, List<Finding> faults) {
    List<String> why = faults.stream().map(f -> f.hazard() + ": " + f.facts().get(f.facts().size() - 1).evidence()).distinct().toList();
    return new Sign("setup-fault", "", value, Standing.SEEN, String.join("; ", why), null, List.of());
  }
}
