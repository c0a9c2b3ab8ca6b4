package stillwarden.describe;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What one key of a file, or the value of one log word, may be.
 *
 * @param path {@code place.hood.running}; of a part without the part's name: {@code coolant.supply}
 * @param values the closed words from calm to worst; for {@code TRI} both of yes and no in that order; for {@code PART}
 *     the words allowed besides names of parts; empty where any text or quantity goes
 * @param codes units that this key takes; empty for all of its dimension
 * @param from least credible SI value
 * @param to greatest credible SI value
 * @param wears true for what wears, moves or is worn today: never inherited by {@code based-on}
 * @param list {@code plants} or {@code substances} where names come from that list, else empty
 */
public record Key(
    String path,
    Type type,
    List<String> values,
    Optional<Dimension> dimension,
    List<String> codes,
    OptionalDouble from,
    OptionalDouble to,
    boolean wears,
    String list,
    String means) {

  /** Kinds of value. {@code LEVEL} is a word of {@code values} or a quantity; {@code UNTIL} a date or an instant. */
  public enum Type {
    TRI,
    CHOICE,
    QUANTITY,
    LEVEL,
    COUNT,
    TEXT,
    TIME,
    DATE,
    UNTIL,
    PART,
    SHARES,
    SIZE
  }

  public Key {
    values = List.copyOf(values);
    codes = List.copyOf(codes);
  }

  /** True where an unknown can only be one of {@link #values}. */
  public boolean closed() {
    return type == Type.TRI || type == Type.CHOICE;
  }
}
