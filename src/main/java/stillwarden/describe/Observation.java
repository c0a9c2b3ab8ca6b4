package stillwarden.describe;

import java.time.Duration;
import java.util.List;
import java.util.Optional;

/**
 * One word that {@code saw} takes.
 *
 * @param key what its value may be; {@code not-sure} is allowed besides
 * @param look true when it is due again after its shelf life; false for an event, told when it happens
 * @param shelf how long it is fresh, where a fixed time holds
 * @param quarterOf the computed time of which a quarter is the shelf life when smaller, or empty
 * @param part role of the part that {@code part} names, {@code joint}, {@code glass}, {@code any}, or empty for none
 * @param later true when it belongs to a method or stage that can't be judged yet
 * @param reach true when the line may carry {@code reach}
 * @param what words that {@code what} takes; empty where it may not stand
 */
public record Observation(
    String id,
    Key key,
    boolean look,
    Optional<Duration> shelf,
    String quarterOf,
    String part,
    boolean later,
    boolean reach,
    List<String> what) {}
