package dev.estimation.benchmarks.weigh;

import dev.estimation.core.accuracy.ReferenceSettings;
import dev.estimation.core.matching.MomentMatching;
import java.util.ArrayList;
import java.util.Collections;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.atomic.AtomicIntegerArray;
import java.util.concurrent.atomic.AtomicReferenceArray;

/**
 * All chosen points, looked at by several threads: each runs the whole filter, which is cheap, and looks at the points
 * that no other has taken, which is not. What is seen at a point does not depend on who looks.
 */
final class PointWork {
  private final Region region;
  private final CallSchedule schedule;
  private final MomentMatching track;
  private final List<Contender> contenders;
  private final ReferenceSettings settings;
  private final Runnable pointDone;
  private final AtomicIntegerArray taken;
  private final AtomicReferenceArray<PointLook> looks;

  PointWork(
      Region region,
      CallSchedule schedule,
      MomentMatching track,
      List<Contender> contenders,
      ReferenceSettings settings,
      Runnable pointDone) {
    this.region = region;
    this.schedule = schedule;
    this.track = track;
    this.contenders = contenders;
    this.settings = settings;
    this.pointDone = pointDone;
    this.taken = new AtomicIntegerArray(schedule.points());
    this.looks = new AtomicReferenceArray<>(schedule.points());
  }

  /** {@return how the run ended} */
  String run(Workers workers) {
    List<Callable<String>> passes = Collections.nCopies(workers.threads(), this::pass);
    return workers.run(passes).get(0);
  }

  private String pass() {
    return new RunWalk(region, track, schedule, this::visitor).run();
  }

  private RunWalk.Visitor visitor() {
    IdentityHashMap<Carry.Target, Examiner> examiners = new IdentityHashMap<>();
    return (point, carry) -> {
      if (taken.compareAndSet(point, 0, 1)) {
        Examiner examiner = examiners.computeIfAbsent(
            carry.target(), target -> new Examiner(target, contenders, settings));
        looks.set(point, examiner.look(carry));
        pointDone.run();
      }
    };
  }

  /** {@return what was seen at the points of a function that the run came to, in their order} */
  List<PointLook> looks(int function) {
    List<PointLook> result = new ArrayList<>();
    for (int point = 0; point < schedule.points(); point++) {
      if (schedule.functionOfPoint(point) == function && looks.get(point) != null) {
        result.add(looks.get(point));
      }
    }
    return result;
  }
}
