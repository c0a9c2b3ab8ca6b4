package stillwarden.judge;

import java.util.ArrayList;
import java.util.List;
import stillwarden.derive.Sign;
import stillwarden.derive.Standing;

/**
 * What one rule says about one match: rule, hazard, matched signs, statements. Immutable; the {@code propose},
 * {@code forbid} ... methods return a finding with one more statement, so that a consequence reads as a sentence.
 *
 * @param hazard folder name, or a principle's id ({@code g4-tip-before-heat}) for a rule that modifies others
 * @param under for a principle: the hazard whose advice it modifies, from which it takes signal word and urgency; else empty
 * @param signal overrides the hazard page's signal word, or empty
 * @param urgency overrides the hazard page's urgency, or empty
 */
public record Finding(
    String rule, String hazard, Standing standing, List<Sign> facts, List<Statement> statements, String under, String signal, String urgency) {

  public static Finding of(String rule, String hazard, Sign... facts) {
    Standing weakest = Standing.SEEN;
    for (Sign f : facts) {
      weakest = weakest.weaker(f.standing());
    }
    return new Finding(rule, hazard, weakest, List.of(facts), List.of(), "", "", "");
  }

  public Finding propose(String... actions) {
    Finding f = this;
    for (String a : actions) {
      f = f.with(new Statement.Propose(a, "", ""));
    }
    return f;
  }

  /** An action on a named part. */
  public Finding proposeOn(String part, String action) {
    return with(new Statement.Propose(action, part, ""));
  }

  /** An action whose wording is sharpened by an entry {@code action/variant} of the checklists. */
  public Finding proposeAs(String action, String variant) {
    return with(new Statement.Propose(action, "", variant));
  }

  public Finding forbid(String... deeds) {
    Finding f = this;
    for (String d : deeds) {
      f = f.with(new Statement.Forbid(d, ""));
    }
    return f;
  }

  public Finding forbidUntil(String deed, String until) {
    return with(new Statement.Forbid(deed, until));
  }

  public Finding before(String first, String then) {
    return with(new Statement.Before(first, then));
  }

  public Finding ask(String... abouts) {
    Finding f = this;
    for (String a : abouts) {
      f = f.with(new Statement.Ask(a));
    }
    return f;
  }

  public Finding reach(String criterion) {
    return with(new Statement.Reach(criterion));
  }

  public Finding as(String otherSignal, String otherUrgency) {
    return new Finding(rule, hazard, standing, facts, statements, under, otherSignal, otherUrgency);
  }

  /** For a principle: what it modifies; signal word, urgency and facts of the other come along. */
  public Finding modifying(Finding other) {
    List<Sign> all = new ArrayList<>(facts);
    other.facts().stream().filter(f -> !all.contains(f)).forEach(all::add);
    String root = other.under().isEmpty() ? other.hazard() : other.under();
    return new Finding(rule, hazard, standing.weaker(other.standing()), List.copyOf(all), statements, root, other.signal(), other.urgency());
  }

  /** Only its plain bans: a set-up hazard mended cold still forbids. */
  public Finding bansOnly() {
    List<Statement> bans = statements.stream().filter(s -> s instanceof Statement.Forbid).toList();
    return new Finding(rule, hazard, standing, facts, bans, under, signal, urgency);
  }

  /** The same said of the same signs with other evidence. */
  Finding withFacts(List<Sign> others) {
    return new Finding(rule, hazard, standing, List.copyOf(others), statements, under, signal, urgency);
  }

  private Finding with(Statement s) {
    List<Statement> more = new ArrayList<>(statements);
    more.add(s);
    return new Finding(rule, hazard, standing, facts, List.copyOf(more), under, signal, urgency);
  }

  /** Acted on: every matched sign is seen or counted as worst. */
  public boolean isActive() {
    return standing != Standing.POSSIBLE;
  }

  public boolean proposes(String action) {
    return statements.stream().anyMatch(s -> s instanceof Statement.Propose p && p.action().equals(action));
  }

  public boolean reaches() {
    return statements.stream().anyMatch(s -> s instanceof Statement.Reach);
  }
}
