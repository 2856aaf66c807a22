package quietspan.planning.simulation;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.time.OnboardInstant;

/** Records one store: a point wherever the slope of a class changes, and the totals. */
final class Trace {

  private final int craft;
  private final int classes;
  private final OnboardInstant origin;
  private final List<StorePoint> points = new ArrayList<>();
  private final long[] slope;
  private final long start;
  private long generated;
  private long received;
  private long sent;
  private long down;
  private long lost;

  Trace(int craft, int classes, OnboardInstant origin, long start) {
    this.craft = craft;
    this.classes = classes;
    this.origin = origin;
    this.slope = new long[classes];
    this.start = start;
  }

  void pass(Stretch stretch, Flow flow, long second, long seconds) {
    int from = craft * classes;
    if (points.isEmpty() || !Arrays.equals(slope, 0, classes, flow.change, from, from + classes)) {
      System.arraycopy(flow.change, from, slope, 0, classes);
      point(flow, second);
    }
    generated += stretch.generatedByCraft[craft] * seconds;
    received += flow.sum(flow.received, craft) * seconds;
    sent += flow.sum(flow.sent, craft) * seconds;
    down += flow.sum(flow.down, craft) * seconds;
    lost += flow.sum(flow.lost, craft) * seconds;
  }

  private void point(Flow flow, long second) {
    List<Long> byClass = new ArrayList<>(classes);
    for (int i = craft * classes; i < (craft + 1) * classes; i++) {
      byClass.add(flow.held[i]);
    }
    points.add(new StorePoint(origin.epochSecond() + second, flow.heldBy(craft), byClass));
  }

  StoreTrace finish(String name, Flow flow, long second, long highest) {
    point(flow, second);
    return new StoreTrace(
        name, points, start, generated, received, sent, down, lost, flow.heldBy(craft), highest);
  }
}
