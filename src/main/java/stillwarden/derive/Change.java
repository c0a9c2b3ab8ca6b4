package stillwarden.derive;

/** One change of the rig that would meet a failing item: the rig path, the value, and why. */
public record Change(String about, String to, String why) {}
