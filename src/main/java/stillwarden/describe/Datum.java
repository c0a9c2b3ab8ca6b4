package stillwarden.describe;

import java.util.Optional;

/**
 * One value of a file. Absent data have no Datum: nothing here is ever a stand-in for "unknown".
 *
 * @param path where in the file, parts by the user's own names: {@code flask.volume}, {@code place.hood.running}
 * @param text the value's word as written, tri-states as {@code yes} or {@code no}
 * @param measured the quantity, where the key takes one
 */
public record Datum(String path, String text, Optional<Quantity> measured, Spot spot) {}
