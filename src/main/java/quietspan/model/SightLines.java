package quietspan.model;

import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Geometry to be sampled: the one thing that the planner and the check both read, and the only
 * place where ground time and on-board time convert. Craft and stations are named as in the
 * scenario; implementations are immutable, may be shared between threads, and throw {@link
 * IllegalArgumentException} for an unknown name or an instant outside {@link #known}.
 *
 * <p>One-way light time between craft and ground always means the Earth's centre here; the
 * station's place on the Earth adds at most 21 ms.
 */
public interface SightLines {

  /** Ground receive instants over which everything about this craft can be asked. */
  Interval<GroundInstant> known(String craft);

  /**
   * Downlink one-way light time of the wave received at the Earth's centre at {@code receive} (s).
   */
  double downlinkSeconds(String craft, GroundInstant receive);

  /**
   * Uplink one-way light time of the wave that leaves the Earth's centre at {@code transmit} (s).
   */
  double uplinkSeconds(String craft, GroundInstant transmit);

  /** On-board instant at which the wave received at {@code receive} left the craft. */
  default OnboardInstant onboard(String craft, GroundInstant receive) {
    return new OnboardInstant(receive.utc()).plusSeconds(-downlinkSeconds(craft, receive));
  }

  /** Ground instant at which a wave that leaves the craft at {@code sent} is received: solved. */
  GroundInstant ground(String craft, OnboardInstant sent);

  /** Where the station sees the craft. */
  Look look(String station, String craft, GroundInstant receive);

  /**
   * Direction, in the craft's body frame at the instant the wave left it, from there to the Earth's
   * centre at {@code receive}.
   */
  BodyDirection earth(String craft, GroundInstant receive);

  /** Sun-Earth-probe angle at {@code receive}, the craft where the wave left it (rad). */
  double sepRadians(String craft, GroundInstant receive);

  /** Sun-probe-Earth angle, the craft where the wave left it (rad). */
  double speRadians(String craft, GroundInstant receive);
}
