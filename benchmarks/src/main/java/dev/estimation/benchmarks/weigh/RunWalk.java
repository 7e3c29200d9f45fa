package dev.estimation.benchmarks.weigh;

import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.core.matching.MomentMatching;
import java.util.function.Supplier;

/** One pass of a filter over the runs of a region, shown point by point. <i>Confined to one thread.</i> */
final class RunWalk {
  private final Region region;
  private final MomentMatching track;
  private final CallSchedule schedule;
  private final Supplier<Visitor> visitors;
  private int calls;

  /** Someone who is shown operating points. */
  interface Visitor {
    void visit(int point, Carry carry);
  }

  RunWalk(Region region, MomentMatching track, CallSchedule schedule, Supplier<Visitor> visitors) {
    this.region = region;
    this.track = track;
    this.schedule = schedule;
    this.visitors = visitors;
  }

  /** {@return how the first run ended that failed: its steps up to that are shown; or that all is well} */
  String run() {
    String status = RunResult.OK;
    for (int run = 0; run < region.runs().size(); run++) {
      calls = schedule.firstCallOfRun(run);
      Visitor visitor = visitors.get();
      FilterKind tapped = FilterKind.of(new TappedMatching(track, carry -> show(carry, visitor)));
      String ended = new Replayer(region.runs().get(run), tapped).run().status();
      status = status.equals(RunResult.OK) ? ended : status;
    }
    return status;
  }

  private void show(Carry carry, Visitor visitor) {
    int point = schedule.pointOfCall(calls++);
    if (point >= 0) {
      visitor.visit(point, carry);
    }
  }
}
