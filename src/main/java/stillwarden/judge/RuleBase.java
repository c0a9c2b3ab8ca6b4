package stillwarden.judge;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.drools.core.impl.RuleBaseFactory;
import org.drools.model.Model;
import org.drools.modelcompiler.KieBaseBuilder;
import org.kie.api.KieBase;
import org.kie.api.definition.KiePackage;
import org.kie.api.definition.rule.Rule;
import org.kie.api.runtime.KieSession;

/**
 * The compiled rules. They are turned into classes when the project is built; nothing here reads rule text, and no
 * rule compiler is on the run-time class path.
 */
final class RuleBase {
  private static final String MODELS = "/META-INF/kie/stillwarden/stillwarden/drools-model";

  private final KieBase base;

  private RuleBase(KieBase base) {
    this.base = base;
  }

  /** Set-up rules only: what `inspect` needs. */
  static RuleBase inspect() {
    return Inspect.BASE;
  }

  /** Every rule: set-up, run and principles. */
  static RuleBase all() {
    return All.BASE;
  }

  /** Some of the rules alone, to measure them; each call builds a base of its own. */
  static RuleBase only(Set<String> names) {
    RuleBase some = load(List.of("stillwarden."));
    Set<String> left = new HashSet<>(names);
    for (KiePackage p : some.base.getKiePackages()) {
      p.getRules().stream().map(Rule::getName).filter(n -> !left.remove(n)).toList().forEach(n -> some.base.removeRule(p.getName(), n));
    }
    if (!left.isEmpty()) {
      throw new IllegalArgumentException("no rule " + left);
    }
    return some;
  }

  private static final class Inspect {
    static final RuleBase BASE = load(List.of("stillwarden.inspect."));
  }

  private static final class All {
    static final RuleBase BASE = load(List.of("stillwarden."));
  }

  KieSession newSession() {
    return base.newKieSession();
  }

  int ruleCount() {
    int n = 0;
    for (KiePackage p : base.getKiePackages()) {
      n += p.getRules().size();
    }
    return n;
  }

  private static RuleBase load(List<String> prefixes) {
    System.setProperty("slf4j.provider", "org.slf4j.helpers.NOP_FallbackServiceProvider");
    System.setProperty("slf4j.internal.verbosity", "ERROR");
    List<Model> models = new ArrayList<>();
    for (String name : modelNames()) {
      if (prefixes.stream().anyMatch(name::startsWith)) {
        models.add(instance(name));
      }
    }
    return new RuleBase(KieBaseBuilder.createKieBaseFromModel(models, RuleBaseFactory.newKnowledgeBaseConfiguration()));
  }

  private static List<String> modelNames() {
    try (InputStream in = RuleBase.class.getResourceAsStream(MODELS)) {
      if (in == null) {
        throw new IllegalStateException("no compiled rules: was the project built with Maven?");
      }
      // the first line is the engine's version
      return new String(in.readAllBytes(), StandardCharsets.UTF_8).lines().skip(1).map(String::strip).toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Model instance(String className) {
    try {
      return (Model) Class.forName(className).getDeclaredConstructor().newInstance();
    } catch (ReflectiveOperationException e) {
      throw new IllegalStateException("compiled rules are damaged: " + className, e);
    }
  }
}
