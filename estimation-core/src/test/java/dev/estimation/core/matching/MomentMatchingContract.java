package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Form;
import org.junit.jupiter.params.Parameter;
import org.junit.jupiter.params.ParameterizedClass;
import org.junit.jupiter.params.provider.EnumSource;

/** What every matching owes, in both forms. A new one gets all of it by a subclass of a few lines. */
@ParameterizedClass
@EnumSource(Form.class)
abstract class MomentMatchingContract
    implements AffineChecks,
        ZeroVarianceChecks,
        ActiveInputChecks,
        ConductChecks,
        AngleChecks,
        RotationChecks,
        ConditioningChecks {
  @Parameter
  Form form;

  @Override
  public Form form() {
    return form;
  }
}
