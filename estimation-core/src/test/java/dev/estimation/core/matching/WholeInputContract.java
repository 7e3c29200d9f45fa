package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import org.junit.jupiter.params.Parameter;
import org.junit.jupiter.params.ParameterizedClass;
import org.junit.jupiter.params.provider.EnumSource;

/** The contract for matchings over the whole input, whatever a function reads, in both forms. */
@ParameterizedClass
@EnumSource(Form.class)
abstract class WholeInputContract
    implements AffineChecks,
        ZeroVarianceChecks,
        ConductChecks,
        AngleChecks,
        ConditioningChecks,
        WholeInputChecks {
  @Parameter
  Form form;

  @Override
  public Form form() {
    return form;
  }

  /** The same matching, over the inputs that are read. */
  abstract MatchingUnderTest narrow();

  @Override
  public MomentMatching matching(double... inputScales) {
    return narrow().matching(inputScales).overWholeInput();
  }

  @Override
  public MomentMatching overActiveInputs() {
    return narrow().matching(MatchingUnderTest.unitScales(5));
  }

  @Override
  public VectorFunction offered(VectorFunction function) {
    return narrow().offered(function);
  }

  @Override
  public int carried(int active, int whole) {
    return whole;
  }

  @Override
  public int evaluations(int carried) {
    return narrow().evaluations(carried);
  }

  @Override
  public int jacobians(int carried) {
    return narrow().jacobians(carried);
  }

  @Override
  public double spread(int carried) {
    return narrow().spread(carried);
  }

  @Override
  public double amplification(int carried) {
    return narrow().amplification(carried);
  }

  @Override
  public int largestDimension() {
    return narrow().largestDimension();
  }
}
