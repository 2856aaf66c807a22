package quietspan;

import java.util.List;
import java.util.Random;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.extension.Extension;
import org.junit.jupiter.api.extension.ExtensionConfigurationException;
import org.junit.jupiter.api.extension.ExtensionContext;
import org.junit.jupiter.api.extension.ParameterContext;
import org.junit.jupiter.api.extension.ParameterResolver;
import org.junit.jupiter.api.extension.TestExecutionExceptionHandler;
import org.junit.jupiter.api.extension.TestTemplateInvocationContext;
import org.junit.jupiter.api.extension.TestTemplateInvocationContextProvider;

/** Runs a {@link Seeds} method once per seed. */
final class SeedsExtension implements TestTemplateInvocationContextProvider {
  @Override
  public boolean supportsTestTemplate(ExtensionContext context) {
    return context.getRequiredTestMethod().isAnnotationPresent(Seeds.class);
  }

  @Override
  public Stream<TestTemplateInvocationContext> provideTestTemplateInvocationContexts(
      ExtensionContext context) {
    Seeds seeds = context.getRequiredTestMethod().getAnnotation(Seeds.class);
    if (seeds.count() < 1) {
      throw new ExtensionConfigurationException("a seeded test needs at least one seed");
    }
    if (Stream.of(context.getRequiredTestMethod().getParameterTypes())
        .noneMatch(SeedsExtension::carriesSeed)) {
      throw new ExtensionConfigurationException("a seeded test needs a parameter for its seed");
    }
    return context
        .getConfigurationParameter("seed")
        .map(only -> LongStream.of(Long.parseLong(only)))
        .orElseGet(() -> LongStream.range(seeds.from(), seeds.from() + seeds.count()))
        .mapToObj(seed -> new Run(context.getRequiredTestMethod().getName(), seed));
  }

  private static boolean carriesSeed(Class<?> type) {
    return type == long.class
        || type == Random.class
        || type == SplittableRandom.class
        || type == RandomGenerator.class;
  }

  private record Run(String method, long seed) implements TestTemplateInvocationContext {
    @Override
    public String getDisplayName(int invocationIndex) {
      return method + " seed=" + seed;
    }

    @Override
    public List<Extension> getAdditionalExtensions() {
      return List.of(new SeedParameter(seed), new SeedInFailure(seed));
    }
  }

  private record SeedParameter(long seed) implements ParameterResolver {
    @Override
    public boolean supportsParameter(ParameterContext parameter, ExtensionContext context) {
      return carriesSeed(parameter.getParameter().getType());
    }

    @Override
    public Object resolveParameter(ParameterContext parameter, ExtensionContext context) {
      Class<?> type = parameter.getParameter().getType();
      if (type == long.class) {
        return seed;
      }
      SplittableRandom stream = new SplittableRandom(seed);
      // Neighbouring seeds of java.util.Random give nearly the same first number, so mix them
      // first.
      return type == Random.class ? new Random(stream.nextLong()) : stream;
    }
  }

  /** The runner's closing list shows the failure but not the name of the run. */
  private record SeedInFailure(long seed) implements TestExecutionExceptionHandler {
    @Override
    public void handleTestExecutionException(ExtensionContext context, Throwable failure)
        throws Throwable {
      failure.addSuppressed(new SeedOfTheFailure(seed));
      throw failure;
    }
  }

  private static final class SeedOfTheFailure extends Exception {
    private static final long serialVersionUID = 1;

    SeedOfTheFailure(long seed) {
      super("run this seed alone with -Dseed=" + seed, null, false, false);
    }
  }
}
