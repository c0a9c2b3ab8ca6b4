package stillwarden.derive.physics;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;

/**
 * What the computation found besides the numbers; absent means unknown. SI units.
 *
 * @param atmosphere with the conflict between barometer and elevation, where there is one
 * @param oil composition, by rig or plant list
 * @param immiscible verdict on the two-liquid model
 * @param hardlyVolatile constituents under about 5 mmHg at water's boiling point here
 * @param volatilityUnknown constituents nobody has an equation for
 * @param condenser what the condenser can do against what it must do
 * @param coolant strategy with its reasons and alternatives
 * @param liquidusNow temperature at which the oil condensing now begins to freeze, K (before the run: at its start)
 * @param liquidusHighest the highest along the run, K
 * @param freezesInTakeOff the room is colder than the condensing oil's freezing temperature
 * @param minimumLevel of the flask, water and solids, m3
 * @param flaskLevel reservoirLevel receiverLevel as they are computed to stand now, m3; nominal is the worse end after a word
 * @param collected distillate over so far, m3
 * @param leakSuspected more water gone than the power could have boiled: what it could mean
 * @param feedRecovery after the last cold feed: until when a weak boil is explained
 * @param feedStopsBoil the last feed was so much that boiling must stop
 * @param boilsFrom when boiling is computed or was seen to begin
 * @param coolsToHandWarm time that a flask left standing takes to hand-warm, at the slow end
 * @param coolsToQuiet s that it takes to fall as far under its boiling point as the site asks before anything is opened
 * @param jacketWarmsIn time in which a full still jacket reaches the oil's freezing temperature, s
 * @param waterBudget what is short and by how much; empty when enough
 * @param overfull the flask against its fill limit; empty when within it or when the foam class is unknown
 * @param receiverTooSmall against the planned distillate
 * @param mantle fit of heater to flask: true fits
 * @param foams foam class, by rig or plant list
 * @param fillLimit share of the flask allowed for this foam class
 * @param charge with its own notes on what was defaulted
 */
public record SideFacts(
    Atmosphere atmosphere,
    Optional<Oil> oil,
    Optional<Immiscibility> immiscible,
    List<String> hardlyVolatile,
    List<String> volatilityUnknown,
    Optional<CondenserVerdict> condenser,
    Optional<CoolantChoice> coolant,
    Optional<Band> liquidusNow,
    Optional<Band> liquidusHighest,
    Optional<Boolean> freezesInTakeOff,
    Optional<Double> minimumLevel,
    Optional<Band> flaskLevel,
    Optional<Band> reservoirLevel,
    Optional<Band> receiverLevel,
    Optional<Band> collected,
    Optional<String> leakSuspected,
    Optional<Instant> feedRecovery,
    boolean feedStopsBoil,
    Optional<Instant> boilsFrom,
    Optional<Duration> coolsToHandWarm,
    Optional<Band> coolsToQuiet,
    Optional<Band> jacketWarmsIn,
    Optional<Shortage> waterBudget,
    Optional<Shortage> overfull,
    Optional<Shortage> receiverTooSmall,
    Optional<Fit> mantle,
    Optional<String> foams,
    Optional<Double> fillLimit,
    Charge charge) {

  /** Something too small, and the two ways to mend it. */
  public record Shortage(String what, List<String> alternatives) {}

  /** Fits or not, and why. */
  public record Fit(boolean fits, String why) {}

  /**
   * @param margin capacity over duty less one
   * @param enough whether that is the site's margin
   * @param alternatives what would make it enough
   */
  public record CondenserVerdict(double margin, boolean enough, List<String> alternatives) {}
}
