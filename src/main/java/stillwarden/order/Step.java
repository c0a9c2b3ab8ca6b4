package stillwarden.order;

import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import stillwarden.judge.Finding;

/** One deed on its way into the answer: everything that asks for it, merged. Mutable inside {@code order} only. */
final class Step {
  final Deeds.Deed deed;
  final String part;
  final List<Finding> reasons = new ArrayList<>();
  final Set<String> variants = new LinkedHashSet<>();
  String iff = "";
  boolean done;
  Instant doneAt;
  String behind = "";

  Step(Deeds.Deed deed, String part) {
    this.deed = deed;
    this.part = part;
  }

  String id() {
    return deed.id();
  }

  Signal signal() {
    return reasons.stream().map(Hazards::signal).reduce(Signal.NOTICE, Signal::worse);
  }

  @Override
  public String toString() {
    return part.isEmpty() ? id() : id() + "(" + part + ")";
  }
}
