package stillwarden.describe;

import java.util.Optional;

/**
 * One word that {@code did} takes.
 *
 * @param value what its value may be; empty where none goes
 * @param valueRequired true when the line says nothing without one
 * @param later true when it belongs to a method or stage that can't be judged yet
 */
public record Deed(String id, Optional<Key> value, boolean valueRequired, boolean later) {}
