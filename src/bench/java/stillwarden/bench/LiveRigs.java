package stillwarden.bench;

import com.sun.management.GarbageCollectionNotificationInfo;
import java.lang.management.GarbageCollectorMXBean;
import java.lang.management.ManagementFactory;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicLong;
import javax.management.NotificationEmitter;
import javax.management.openmbean.CompositeData;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RunLog;
import stillwarden.watch.Watch;

/** A thousand live rigs in turn, each at another place of its run: time, memory, collections. A process of its own. */
public final class LiveRigs {
  private static final int RIGS = 1000;
  private static final int ROUNDS = 40;

  private LiveRigs() {}

  public static void main(String[] args) {
    Rig rig = Material.rig();
    RunLog run = Material.run();
    warm(rig, run);
    long before = heap();
    List<Watch> rigs = new ArrayList<>();
    int[] at = new int[RIGS];
    for (int i = 0; i < RIGS; i++) {
      at[i] = 1 + i * 7 % (run.entries().size() - ROUNDS - 1);
      rigs.add(started(rig, run, at[i]));
    }
    AtomicLong longest = watchCollections();
    long[] nanos = rounds(rigs, at, run.entries());
    double pause = longest.get();
    double each = (heap() - before) / 1024.0 / RIGS;
    rigs.forEach(Watch::close);
    Arrays.sort(nanos);
    double seconds = Arrays.stream(nanos).sum() / 1e9;
    say("round-robin-per-second", nanos.length / seconds);
    say("round-robin-p50-us", nanos[nanos.length / 2] / 1e3);
    say("round-robin-p99-us", nanos[nanos.length / 100 * 99] / 1e3);
    say("kilobytes-a-rig", each);
    say("kilobytes-of-its-log", logSize(run.entries().size()));
    say("longest-collection-ms", pause);
  }

  private static void warm(Rig rig, RunLog run) {
    for (int i = 0; i < 3; i++) {
      try (Watch w = new Watch(rig, Policy.NONE)) {
        run.entries().forEach(w::add);
      }
    }
  }

  private static Watch started(Rig rig, RunLog run, int lines) {
    Watch w = new Watch(rig, Policy.NONE);
    w.log(new RunLog("", Map.of(), run.entries().subList(0, lines), List.of()), Optional.empty());
    return w;
  }

  private static long[] rounds(List<Watch> rigs, int[] at, List<Entry> lines) {
    long[] out = new long[ROUNDS * RIGS];
    int n = 0;
    for (int round = 0; round < ROUNDS; round++) {
      for (int i = 0; i < RIGS; i++) {
        long start = System.nanoTime();
        rigs.get(i).add(lines.get(at[i] + round));
        out[n++] = System.nanoTime() - start;
      }
    }
    return out;
  }

  /** The rigs above share the lines of one log; so many of its own would a rig hold. */
  private static double logSize(int lines) {
    long before = heap();
    List<RunLog> logs = new ArrayList<>();
    for (int i = 0; i < 50; i++) {
      logs.add(Material.run());
    }
    double each = (heap() - before) / 1024.0 / logs.size();
    return each * (logs.get(49).entries().size() / (double) lines);
  }

  private static AtomicLong watchCollections() {
    AtomicLong longest = new AtomicLong();
    for (GarbageCollectorMXBean b : ManagementFactory.getGarbageCollectorMXBeans()) {
      ((NotificationEmitter) b).addNotificationListener((n, x) -> {
        long took = GarbageCollectionNotificationInfo.from((CompositeData) n.getUserData()).getGcInfo().getDuration();
        longest.accumulateAndGet(took, Math::max);
      }, null, null);
    }
    return longest;
  }

  private static long heap() {
    for (int i = 0; i < 4; i++) {
      System.gc();
    }
    return ManagementFactory.getMemoryMXBean().getHeapMemoryUsage().getUsed();
  }

  private static void say(String what, double value) {
    System.out.println(String.format(Locale.ROOT, "%s=%.3f", what, value));
  }
}
