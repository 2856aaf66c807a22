package quietspan.cli;

import java.lang.reflect.InvocationHandler;
import java.lang.reflect.Proxy;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * Ctrl-C while planning: the first ends the search, which then delivers what it has; the second
 * ends the process. Java has no public way to hear of the signal without dying of it, so the one
 * that every JDK ships is reached by name; where it is missing, Ctrl-C ends the process at once.
 */
final class Interrupts {

  private Interrupts() {}

  /** A flag that the first Ctrl-C sets from now on. */
  static AtomicBoolean listen() {
    AtomicBoolean stop = new AtomicBoolean();
    InvocationHandler onSignal =
        (proxy, method, arguments) -> {
          switch (method.getName()) {
            case "handle" -> {
              if (stop.getAndSet(true)) {
                Runtime.getRuntime().halt(Exit.INTERRUPTED);
              }
              return null;
            }
            case "hashCode" -> {
              return System.identityHashCode(proxy);
            }
            case "equals" -> {
              return proxy == arguments[0];
            }
            default -> {
              return "interrupts";
            }
          }
        };
    try {
      Class<?> signal = Class.forName("sun.misc.Signal");
      Class<?> handler = Class.forName("sun.misc.SignalHandler");
      Object proxy =
          Proxy.newProxyInstance(handler.getClassLoader(), new Class<?>[] {handler}, onSignal);
      signal
          .getMethod("handle", signal, handler)
          .invoke(null, signal.getConstructor(String.class).newInstance("INT"), proxy);
    } catch (ReflectiveOperationException | RuntimeException e) {
      // Without it Ctrl-C does what it always does.
      return stop;
    }
    return stop;
  }
}
