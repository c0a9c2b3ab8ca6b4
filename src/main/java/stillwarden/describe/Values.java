package stillwarden.describe;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.LinkedHashSet;
import java.util.Set;
import java.util.Optional;
import java.util.regex.Pattern;

/** One written value against what its key may be. */
final class Values {
  private static final Pattern RFC_3339 =
      Pattern.compile("\\d{4}-\\d{2}-\\d{2}T\\d{2}:\\d{2}:\\d{2}(\\.\\d{1,9})?(Z|[+-]\\d{2}:\\d{2})");
  private static final Pattern WHOLE = Pattern.compile("0|-?[1-9][0-9]{0,8}");
  private static final Pattern SIZE = Pattern.compile("(ball )?[1-9][0-9]?(\\.[0-9])?/[1-9][0-9]?( in (ball )?[1-9][0-9]?(\\.[0-9])?/[1-9][0-9]?)?");

  private Values() {}

  /** The value as a datum at {@code path}; shares are read by {@link Shares}. */
  static Datum read(Key key, String path, Node n) throws BadValue {
    if (n.is(Node.Kind.EMPTY)) {
      throw new BadValue(Words.quote(key.path()) + " has no value; leave the key out if it is not known");
    }
    if (!n.isScalar()) {
      throw new BadValue(Words.quote(key.path()) + " takes one value, here is " + n.describe());
    }
    return switch (key.type()) {
      case TRI, CHOICE -> word(path, chosen(key, n), n);
      case QUANTITY -> measured(path, quantity(key, n), n);
      case LEVEL -> level(key, path, n);
      case COUNT -> measured(path, count(key, n), n);
      case TEXT, PART -> word(path, text(key, n), n);
      case TIME -> word(path, time(n.text()), n);
      case DATE -> word(path, date(n.text()), n);
      case UNTIL -> word(path, n.text().contains("T") ? time(n.text()) : date(n.text()), n);
      case SIZE -> word(path, size(n), n);
      case SHARES -> throw new IllegalStateException(path);
    };
  }

  private static Datum word(String path, String word, Node n) {
    return new Datum(path, word, Optional.empty(), n.spot());
  }

  private static Datum measured(String path, Quantity q, Node n) {
    return new Datum(path, q.text(), Optional.of(q), n.spot());
  }

  private static String chosen(Key key, Node n) throws BadValue {
    String w = n.is(Node.Kind.TRUE) ? "yes" : n.is(Node.Kind.FALSE) ? "no" : n.text();
    if (!n.is(Node.Kind.NUMBER) && key.values().contains(w)) {
      return w;
    }
    String wanted = key.type() == Key.Type.TRI ? "`yes` or `no` is wanted" : "one of " + Words.list(key.values()) + " is wanted";
    throw new BadValue(Words.quote(n.text()) + " for " + Words.quote(key.path()) + ": " + wanted + Words.hint(n.text(), key.values()));
  }

  private static Quantity quantity(Key key, Node n) throws BadValue {
    Dimension d = key.dimension().orElseThrow();
    if (n.is(Node.Kind.TRUE) || n.is(Node.Kind.FALSE)) {
      throw new BadValue(Words.quote(n.text()) + " for " + Words.quote(key.path()) + ": a quantity is wanted, for example `" + Units.example(d) + "`");
    }
    try {
      return credible(key, Units.read(n.text(), d, key.codes()));
    } catch (BadValue e) {
      throw new BadValue(Words.quote(key.path()) + ": " + e.getMessage());
    }
  }

  /** Beyond what can be on a bench a number is an entry or unit error, never a reading. */
  private static Quantity credible(Key key, Quantity q) throws BadValue {
    if (q.si() < key.from().orElse(Double.NEGATIVE_INFINITY)) {
      throw new BadValue(Words.quote(q.text()) + " is less than can be; a slip in the number or its unit?");
    }
    if (q.si() > key.to().orElse(Double.POSITIVE_INFINITY)) {
      throw new BadValue(Words.quote(q.text()) + " is more than can be; a slip in the number or its unit?");
    }
    return q;
  }

  private static Datum level(Key key, String path, Node n) throws BadValue {
    if (n.isText() && key.values().contains(n.text())) {
      return word(path, n.text(), n);
    }
    boolean number = !n.text().isEmpty() && "+-.0123456789".indexOf(n.text().charAt(0)) >= 0;
    if (n.is(Node.Kind.NUMBER) || number) {
      return measured(path, quantity(key, n), n);
    }
    throw new BadValue(Words.quote(n.text()) + " for " + Words.quote(key.path()) + ": one of " + Words.list(key.values())
        + " or a quantity is wanted" + Words.hint(n.text(), key.values()));
  }

  private static Quantity count(Key key, Node n) throws BadValue {
    if (!n.is(Node.Kind.NUMBER) || !WHOLE.matcher(n.text()).matches()) {
      throw new BadValue(Words.quote(n.text()) + " for " + Words.quote(key.path()) + ": a bare whole number is wanted");
    }
    return credible(key, new Quantity(Integer.parseInt(n.text()), Dimension.COUNT, n.text()));
  }

  private static String text(Key key, Node n) throws BadValue {
    if (n.isText()) {
      return n.text().strip();
    }
    throw new BadValue(Words.quote(n.text()) + " for " + Words.quote(key.path()) + ": words are wanted"
        + (n.is(Node.Kind.NUMBER) ? "; put it in quotes if it is a name" : ""));
  }

  private static String size(Node n) throws BadValue {
    if (n.isText() && SIZE.matcher(n.text()).matches()) {
      return n.text();
    }
    throw new BadValue(Words.quote(n.text()) + " is no joint size; diameter and length in mm are wanted, for example `24/40`, or `24/29 in 24/40` where the two sides differ");
  }

  /** RFC 3339 with an offset: a clock time without one could be any hour of the day. */
  static OffsetDateTime instant(String text) throws BadValue {
    if (RFC_3339.matcher(text).matches()) {
      try {
        return OffsetDateTime.parse(text);
      } catch (DateTimeException e) {
        throw new BadValue(Words.quote(text) + " is no day or time of the calendar");
      }
    }
    boolean noOffset = RFC_3339.matcher(text + "Z").matches();
    throw new BadValue(Words.quote(text) + (noOffset ? " has no offset; add `Z` or, for example, `+02:00`"
        : " is no time; RFC 3339 with an offset is wanted, for example `2026-04-14T09:02:00Z`"));
  }

  /** Kept as written: the offset of a time is part of what was said. */
  private static String time(String text) throws BadValue {
    instant(text);
    return text;
  }

  private static String date(String text) throws BadValue {
    try {
      return LocalDate.parse(text).toString();
    } catch (DateTimeException e) {
      throw new BadValue(Words.quote(text) + " is no day; year-month-day is wanted, for example `2026-04-14`");
    }
  }

  /** The names of the plant or substance list; empty when this build has none, and then nothing is checked. */
  /** Ids of a list, and for substances the other names that they go by. */
  static List<String> listed(String section) {
    Set<String> out = new LinkedHashSet<>();
    Knowledge.section(section).fields().forEach((id, t) -> {
      out.add(id);
      if (section.equals("substances")) {
        t.text("name").ifPresent(out::add);
        out.addAll(t.words("also"));
      }
    });
    return List.copyOf(out);
  }
}
