package stillwarden.describe;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Reads a run log (JSON Lines). A bad line is listed and the rest counts; nothing is repaired or guessed.
 *
 * <p>One instance holds one growing log: {@link #add} takes it line by line, {@link #log} is what it says so far.
 */
public final class LogReader {
  private static final int MOST_BYTES = 64 * 1024 * 1024;
  private static final int MOST_BYTES_A_LINE = 64 * 1024;
  private static final Limits LINE = new Limits(8, 8 * 1024, 100);

  private final String file;
  private final LogLine lines;
  private final Map<String, String> header = new LinkedHashMap<>();
  private final List<Entry> entries = new ArrayList<>();
  private final List<RunLog.LeftOut> leftOut = new ArrayList<>();
  private final Set<String> ids = new LinkedHashSet<>();
  private int number;
  private long bytes;

  public LogReader(String file) {
    this.file = file;
    this.lines = new LogLine();
  }

  /** @throws Unusable when there is no file, no usable line, or a format that this program does not know */
  public static RunLog read(Path path) throws Unusable {
    Spot spot = Spot.of(path.toString());
    if (Files.isDirectory(path)) {
      throw new Unusable(spot, "is a folder; a file is wanted");
    }
    if (!Files.exists(path)) {
      throw new Unusable(spot, "there is no such file");
    }
    try (InputStream in = Files.newInputStream(path)) {
      return read(in, path.toString());
    } catch (IOException e) {
      throw new Unusable(spot, "could not be read");
    }
  }

  /** @param name what messages call the log, for example {@code -} */
  public static RunLog read(InputStream in, String name) throws Unusable {
    LogReader reader = new LogReader(name);
    try {
      reader.all(Source.capped(in, MOST_BYTES, Spot.of(name)));
    } catch (IOException e) {
      throw new Unusable(Spot.of(name), "could not be read");
    }
    return reader.usable();
  }

  /** What has been read so far, as {@link #log}. @throws Unusable when no line of it can be used */
  public RunLog usable() throws Unusable {
    if (entries.isEmpty()) {
      throw nothing();
    }
    return log();
  }

  /**
   * Takes more text of a growing log: whole lines, or the unfinished last one.
   *
   * @throws Unusable when a line names a log format that this program does not know, or the whole gets too large
   */
  public void add(byte[] text) throws Unusable {
    bytes += text.length;
    if (bytes > MOST_BYTES) {
      throw Source.tooLarge(MOST_BYTES, Spot.of(file));
    }
    all(text);
  }

  private Unusable nothing() {
    Defects defects = new Defects();
    defects.add(Spot.of(file), "has no line that can be used");
    leftOut.forEach(l -> defects.add(new Spot(file, l.line(), 0), l.reason()));
    return defects.unusable();
  }

  private void all(byte[] bytes) throws Unusable {
    int start = 0;
    for (int i = 0; i < bytes.length; i++) {
      if (bytes[i] == '\n') {
        add(bytes, start, i, true);
        start = i + 1;
      }
    }
    if (start < bytes.length) {
      add(bytes, start, bytes.length, false);
    }
  }

  private void add(byte[] bytes, int start, int end, boolean ended) throws Unusable {
    byte[] line = new ByteArrayInputStream(bytes, start, Math.min(end - start, MOST_BYTES_A_LINE + 1)).readAllBytes();
    number++;
    if (line.length > MOST_BYTES_A_LINE) {
      leaveOut("the line is longer than 64 KiB", "", !ended);
      return;
    }
    try {
      take(Source.text(line, new Spot(file, number, 0)), ended);
    } catch (Unusable e) {
      if (e.defects().get(0).message().startsWith("`format`")) {
        throw e;
      }
      leaveOut(e.defects().get(0).message(), new String(line, java.nio.charset.StandardCharsets.ISO_8859_1), !ended);
    }
  }

  /**
   * Takes one complete line, without its end.
   *
   * @return the entry, or empty for the header, {@code shown}, a blank line, and a line left out (see {@link #log})
   * @throws Unusable only when the line names a log format that this program does not know
   */
  public Optional<Entry> add(String line) throws Unusable {
    number++;
    if (line.length() > MOST_BYTES_A_LINE) {
      leaveOut("the line is longer than 64 KiB", "", false);
      return Optional.empty();
    }
    return take(number == 1 && line.startsWith("\uFEFF") ? line.substring(1) : line, true);
  }

  /** What has been read so far. */
  public RunLog log() {
    return new RunLog(file, java.util.Collections.unmodifiableMap(new LinkedHashMap<>(header)), List.copyOf(entries), List.copyOf(leftOut));
  }

  private Optional<Entry> take(String raw, boolean ended) throws Unusable {
    String line = raw.strip();
    if (line.isEmpty()) {
      return Optional.empty();
    }
    Defects defects = new Defects();
    Node n;
    try {
      n = JsonSource.read(file, number, line, LINE, defects);
    } catch (Unusable e) {
      leaveOut(ended ? e.defects().get(0).message() : "the last line is torn", line, !ended);
      return Optional.empty();
    }
    if (n.get("format").isPresent()) {
      header(n, defects);
      return Optional.empty();
    }
    return n.get("shown").isPresent() ? Optional.empty() : entry(n, line, defects);
  }

  private Optional<Entry> entry(Node n, String line, Defects defects) {
    Optional<Entry> entry = lines.read(number, n, defects);
    id(n, "id").filter(id -> !ids.add(id)).ifPresent(id -> defects.add(n.spot(), "the id " + Words.quote(id) + " names an earlier line already"));
    id(n, "corrects").filter(id -> !ids.contains(id)).ifPresent(id -> defects.add(n.spot(), "it corrects " + Words.quote(id) + ", but no earlier line has that id"));
    if (!defects.all().isEmpty() || entry.isEmpty()) {
      leaveOut(reasons(defects), line, false);
      return Optional.empty();
    }
    entries.add(entry.get());
    return entry;
  }

  /** Ids of lines that are left out count too: a correction mends just such a line. */
  private static Optional<String> id(Node n, String key) {
    return n.get(key).filter(Node::isText).map(Node::text);
  }

  private static String reasons(Defects defects) {
    return String.join("; ", defects.all().stream().map(Defect::message).toList());
  }

  private void header(Node n, Defects defects) throws Unusable {
    String format = n.get("format").orElseThrow().text();
    if (!format.equals("stillwarden/log/1")) {
      throw new Unusable(new Spot(file, number, 0), "`format` is " + Words.quote(format) + " where `stillwarden/log/1` is wanted");
    }
    Map<String, String> said = lines.header(n, defects);
    if (!entries.isEmpty() || !header.isEmpty()) {
      defects.add(n.spot(), "a log has one header, in its first line");
    }
    if (defects.all().isEmpty()) {
      header.putAll(said);
    } else {
      leaveOut(reasons(defects), "", false);
    }
  }

  private void leaveOut(String reason, String line, boolean torn) {
    leftOut.add(new RunLog.LeftOut(number, reason, lines.about(line), lines.at(line), torn));
  }
}
