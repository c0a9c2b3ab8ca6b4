package stillwarden.derive;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Stream;
import stillwarden.describe.Joint;
import stillwarden.describe.Part;
import stillwarden.describe.Port;
import stillwarden.describe.Rig;

/**
 * Which part does what, decided by kind and, where a kind can do two jobs, by the joints.
 *
 * @param parts by role, in file order; several parts of one role are all listed
 * @param missing roles of the in-flask method that no part has and that nobody said are absent
 * @param absent roles that the file says there is none of ({@code kind: none})
 * @param others parts with no role here: an unknown kind, a spare funnel, a jack under neither heater nor receiver
 */
public record Roles(Map<Role, List<Part>> parts, List<Role> missing, List<Role> absent, List<Part> others) {
  private static final Set<String> BOILS = Set.of("boiling-aid", "minimum-level");
  private static final Set<String> RECEIVES =
      Set.of("held", "gas-tight", "mouth", "tip-at", "vent-at", "tip-below-liquid", "tip-above-rim", "can-be-lowered", "tare");

  public Roles {
    parts = Map.copyOf(parts);
    missing = List.copyOf(missing);
    absent = List.copyOf(absent);
    others = List.copyOf(others);
  }

  public static Roles of(Rig rig) {
    return new Sorter(rig).sort();
  }

  public List<Part> all(Role role) {
    return parts.getOrDefault(role, List.of());
  }

  /** The part of a role, or empty where there is none or more than one. */
  public Optional<Part> one(Role role) {
    return all(role).size() == 1 ? Optional.of(all(role).get(0)) : Optional.empty();
  }

  /** The role of a part by its name. */
  public Optional<Role> of(String partName) {
    return parts.keySet().stream().filter(r -> all(r).stream().anyMatch(p -> p.name().equals(partName))).findFirst();
  }

  /** Works one rig out; thrown away afterwards. */
  private static final class Sorter {
    private final Rig rig;
    private final Map<Role, List<Part>> found = new EnumMap<>(Role.class);
    private final Set<Role> absent = EnumSet.noneOf(Role.class);
    private final List<Part> others = new ArrayList<>();

    Sorter(Rig rig) {
      this.rig = rig;
    }

    Roles sort() {
      rig.parts().values().forEach(this::byKind);
      flasks();
      funnels();
      jacks();
      absent.removeAll(found.keySet());
      List<Role> missing = Role.IN_FLASK.stream().filter(r -> !found.containsKey(r) && !absent.contains(r)).toList();
      return new Roles(found, missing, List.copyOf(absent), others);
    }

    private void byKind(Part p) {
      if (p.kind().equals("none")) {
        Role.ofName(p.name()).ifPresentOrElse(absent::add, () -> others.add(p));
      } else {
        Role.ofKind(p.kind()).ifPresentOrElse(r -> give(r, p), () -> others.add(p));
      }
    }

    private void give(Role role, Part p) {
      found.computeIfAbsent(role, r -> new ArrayList<>()).add(p);
    }

    private List<Part> take(Role role) {
      List<Part> all = found.remove(role);
      return all == null ? List.of() : all;
    }

    /** A round-bottom flask boils or receives: the joints tell, then its keys, then what is left over. */
    private void flasks() {
      List<Part> open = new ArrayList<>(take(Role.FLASK));
      settle(open, Role.FLASK, p -> leadsTo(p, Set.of("foot")));
      settle(open, Role.RECEIVER, p -> leadsTo(p, Set.of("outlet", "lower")));
      boolean jointed = found.containsKey(Role.FLASK);
      settle(open, Role.FLASK, p -> !jointed && any(p, BOILS));
      settle(open, Role.RECEIVER, p -> any(p, RECEIVES));
      // with a boiling flask found, any other stands by as a receiver; with none, nobody can say which of them boils
      settle(open, found.containsKey(Role.FLASK) ? Role.RECEIVER : Role.FLASK, p -> true);
    }

    private void settle(List<Part> open, Role role, Predicate<Part> test) {
      List<Part> hits = open.stream().filter(test).toList();
      hits.forEach(p -> give(role, p));
      open.removeAll(hits);
    }

    private static boolean any(Part p, Set<String> keys) {
      return keys.stream().anyMatch(p.keys()::containsKey);
    }

    /** Follows the joints from a flask, through parts without a role of their own, to the first port of one of these names. */
    private boolean leadsTo(Part p, Set<String> ports) {
      Set<String> seen = new LinkedHashSet<>(Set.of(p.name()));
      Deque<String> queue = new ArrayDeque<>(seen);
      while (!queue.isEmpty()) {
        String at = queue.remove();
        for (Joint j : rig.joints()) {
          Port far = j.a().part().equals(at) ? j.b() : j.b().part().equals(at) ? j.a() : null;
          if (far != null && ports.contains(far.port())) {
            return true;
          }
          if (far != null && plain(far.part()) && seen.add(far.part())) {
            queue.add(far.part());
          }
        }
      }
      return false;
    }

    private boolean plain(String part) {
      return others.stream().anyMatch(o -> o.name().equals(part));
    }

    /** A funnel in a joint is the reservoir; another one on the bench waits for the work-up. */
    private void funnels() {
      List<Part> all = take(Role.RESERVOIR);
      boolean someJoined = all.stream().anyMatch(this::joined);
      for (Part p : all) {
        if (!someJoined || joined(p)) {
          give(Role.RESERVOIR, p);
        } else {
          others.add(p);
        }
      }
    }

    private boolean joined(Part p) {
      return rig.joints().stream().anyMatch(j -> j.a().part().equals(p.name()) || j.b().part().equals(p.name()));
    }

    private void jacks() {
      List<Part> open = new ArrayList<>(take(Role.JACK));
      settle(open, Role.JACK, j -> carries(j, Role.HEATER));
      settle(open, Role.RECEIVER_JACK, j -> carries(j, Role.RECEIVER));
      boolean heaterMayStandOnIt = !found.containsKey(Role.JACK) && standing(Role.HEATER).allMatch("jack"::equals);
      settle(open, Role.JACK, j -> heaterMayStandOnIt);
      others.addAll(open);
    }

    private boolean carries(Part jack, Role what) {
      return standing(what).anyMatch(jack.name()::equals);
    }

    private Stream<String> standing(Role what) {
      return found.getOrDefault(what, List.of()).stream().flatMap(p -> p.word("stands-on").stream());
    }
  }
}
