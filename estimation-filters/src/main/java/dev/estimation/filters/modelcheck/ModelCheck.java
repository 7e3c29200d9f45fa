package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.SensorModel;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;

/**
 * Examines a motion or sensor model over a region, in one call of a unit test: {@code
 * ModelCheck.over(region).examine(new DepthGauge()).assertClean();}.
 *
 * <p>The model is called at many places of the region: the centre, both ends of every input by itself, the two ends of
 * all together, and places drawn evenly from a seed. Its conduct is looked at first (exceptions, arrays written on or kept, outputs
 * left out, chance, allocation), then its numbers (derivatives, declared structure, seams of angles, noise). The
 * kinds of findings and their criteria are those of {@link FindingKind}. Where conduct makes numbers meaningless they are not
 * looked at, and a note says so. The noise inside a motion runs over three standard deviations.
 *
 * <p>Calls for differences may lie outside the region, by up to half of its half-widths, and angles of the state are also
 * called by their other names and at -pi and pi; what the model throws or gives there is no finding. Nor is a kink or jump
 * inside the region, unless a place lies on it. What only shows between the places is not seen: more places see more.
 * Nor is what only shows when several threads call at once.
 *
 * <p>Cost for a state of five: 110 calls a place, and with a Jacobian 48 more for each input; at 200 places 0.3 s in a fresh
 * JVM and a tenth of that once it is warm. <i>Immutable</i>; a model that is not as free of state as it must be may
 * not be examined by two threads at once.
 */
public final class ModelCheck {
  private static final int PLACES = 200;
  private static final long SEED = 1;
  private static final double SCALE_RATIO = 1e8;

  private final Region region;
  private final int places;
  private final long seed;
  private final double scaleRatio;
  private final Set<FindingKind> accepted;

  private ModelCheck(
      Region region, int places, long seed, double scaleRatio, Set<FindingKind> accepted) {
    this.region = region;
    this.places = places;
    this.seed = seed;
    this.scaleRatio = scaleRatio;
    this.accepted = accepted;
  }

  /**
   * A check at 200 places, seed 1, that accepts no fault.
   *
   * @param region where to examine
   * @return the check
   */
  public static ModelCheck over(Region region) {
    return new ModelCheck(region, PLACES, SEED, SCALE_RATIO, Set.of());
  }

  /**
   * This check at another number of places.
   *
   * @param count 2 or more; fewer than the centre and the ends take the first of these
   * @return a check that does so
   */
  public ModelCheck withPlaces(int count) {
    if (count < 2) {
      throw new IllegalArgumentException("places must be 2 or more, got " + count);
    }
    return new ModelCheck(region, count, seed, scaleRatio, accepted);
  }

  /**
   * This check at other places.
   *
   * @param newSeed any number
   * @return a check that does so
   */
  public ModelCheck withSeed(long newSeed) {
    return new ModelCheck(region, places, newSeed, scaleRatio, accepted);
  }

  /**
   * This check with another limit for {@link FindingKind#UNEQUAL_SCALES}.
   *
   * @param ratio above 1; 1e8 unless said otherwise
   * @return a check that does so
   */
  public ModelCheck withScaleRatio(double ratio) {
    if (!(ratio > 1)) {
      throw new IllegalArgumentException("scale ratio must be > 1, got " + ratio);
    }
    return new ModelCheck(region, places, seed, ratio, accepted);
  }

  /**
   * This check with faults that are known and wanted, for instance {@link FindingKind#ALLOCATION}: they are reported as hints.
   *
   * @param kinds besides those accepted already
   * @return a check that does so
   */
  public ModelCheck accepting(FindingKind... kinds) {
    Set<FindingKind> all = EnumSet.noneOf(FindingKind.class);
    all.addAll(accepted);
    all.addAll(List.of(kinds));
    return new ModelCheck(region, places, seed, scaleRatio, Set.copyOf(all));
  }

  /**
   * Examines a sensor model.
   *
   * @param model called, not kept
   * @return what was found
   * @throws IllegalArgumentException if the region does not have as many given numbers as the model
   */
  public ModelReport examine(SensorModel model) {
    Subject subject = Subject.of(model, region.space());
    return examine(
        examination(subject, region.given(), model.givenDimension(), "given", "withGiven"));
  }

  /**
   * Examines a motion model, whichever way its noise enters. As in a filter, the model called is the one that it gives {@link
   * Motion#forOneThread() for one thread}; it is also held against the model itself.
   *
   * @param model called, not kept
   * @return what was found
   * @throws IllegalArgumentException if the region is of another space, has no steps, or not as many controls as the model
   */
  public ModelReport examine(Motion model) {
    Subject subject = Subject.of(model);
    if (!region.space().equals(subject.state())) {
      throw new IllegalArgumentException("the region must be of the state space " + subject.state()
          + ", got " + region.space() + " (" + subject.title() + ")");
    }
    if (region.step() == null) {
      throw new IllegalArgumentException(
          "the region must have steps (withSteps), got none (" + subject.title() + ")");
    }
    Motion own = model.forOneThread();
    ThreadCopy copy = new ThreadCopy(subject, own == model ? subject : Subject.of(own));
    Examination examination = examination(
        copy.examined(), region.control(), model.controlDimension(), "control", "withControl");
    copy.look(examination);
    return examine(examination);
  }

  private Examination examination(
      Subject subject, Range given, int wanted, String name, String method) {
    if (given.size() != wanted) {
      throw new IllegalArgumentException("the region must have a range of " + wanted + " " + name
          + " numbers (" + method + "), got " + given.size() + " (" + subject.title() + ")");
    }
    List<Arguments> at = new Places(subject, region, given).take(places, seed);
    return new Examination(subject, region, at, new Ledger(accepted));
  }

  private ModelReport examine(Examination examination) {
    lookAtConduct(examination);
    lookAtNumbers(examination);
    return examination.ledger.report(examination.subject.title(), examination.places.size());
  }

  private static void lookAtConduct(Examination examination) {
    // Before all else, while the model is not compiled yet.
    new AllocationCount(examination).look();
    new Conduct(examination).look();
    new CallOrder(examination).look();
  }

  private void lookAtNumbers(Examination examination) {
    Subject subject = examination.subject;
    Structure structure = examination.structure();
    if (examination.isSound(subject.noise())) {
      new NoiseNumbers(examination).look();
    }
    if (structure == null || !examination.isSound(subject.function())) {
      examination.ledger.note("derivatives, inputs, seams and composition were not looked at: "
          + (structure == null ? "structure()" : subject.function().method()) + " is at fault");
      return;
    }
    Influence influence = new Influence(examination);
    influence.look(structure, scaleRatio);
    new LinearInputs(examination).look(structure);
    new OutputSeams(examination).look();
    new InputAngles(examination, influence).look();
    new Derivatives(examination).look(structure);
    new NoiseOverTime(examination).look();
  }
}
